import type { Study } from '../../../shared/study.ts';
import { Page } from '../../components/Page.tsx';
import { DecisionSection } from '../../features/studies/components/DecisionSection.tsx';
import { StudyItemList } from '../../features/studies/components/StudyItemList.tsx';
import { StudyVersions } from '../../features/studies/components/StudyVersions.tsx';
import { rowsOf } from '../../features/studies/model/rows.ts';
import { MemberItem } from './MemberItem.tsx';
import { StudyLine } from './StudyLine.tsx';
import { itemNames, useChoices } from './useChoices.ts';

/** A study for members who may look and not change. */
export function StudyReader({ study }: { study: Study }) {
  const { runs, designs } = useChoices(study.groupId);
  const { question, items, decision } = study.document;
  return (
    <Page title={study.title} subtitle={<StudyLine study={study} />}>
      <div className="flex max-w-[900px] flex-col gap-7">
        <p className="max-w-prose text-lead whitespace-pre-line">{question}</p>
        <StudyItemList
          rows={rowsOf(items)}
          onRows={undefined}
          renderPinned={(item) => <MemberItem item={item} />}
          nameOf={itemNames(runs, designs)}
        />
        <DecisionSection decision={decision} decided={study.decided} />
        <StudyVersions studyId={study.id} version={study.version} />
      </div>
    </Page>
  );
}
