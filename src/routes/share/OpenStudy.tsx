import type { ReactNode } from 'react';
import type { SharedStudy, StudyItem } from '../../../shared/study.ts';
import { Page } from '../../components/Page.tsx';
import { RunDownloads } from '../../features/runs/components/RunDownloads.tsx';
import { RunProvenance } from '../../features/runs/components/RunProvenance.tsx';
import { sharedPath } from '../../features/sharing/api/sharedRun.ts';
import { DecisionSection } from '../../features/studies/components/DecisionSection.tsx';
import { StudyItemList } from '../../features/studies/components/StudyItemList.tsx';
import { rowsOf } from '../../features/studies/model/rows.ts';
import { formatDateTime } from '../../lib/format.ts';
import { PinnedDesign } from '../study/PinnedDesign.tsx';
import { PinnedRun } from '../study/PinnedRun.tsx';
import { itemNames } from '../study/useChoices.ts';
import { DesignFiles } from './DesignFiles.tsx';

type Props = { token: string; study: SharedStudy };

/** A shared study: question, notes, live plots, decision, and what every number in it rests on. */
export function OpenStudy({ token, study }: Props) {
  const { title, document, decided, updatedAt } = study;
  const runNames = study.runs.map(({ id, run }) => ({ id, name: run.name }));
  const designNames = study.designs.map(({ id, design }) => ({ id, name: design.name }));
  return (
    <Page title={title} subtitle={`Shared study, as it was saved ${formatDateTime(updatedAt)}.`} width="text">
      <div className="flex flex-col gap-7">
        <p className="max-w-prose text-lead whitespace-pre-line">{document.question}</p>
        <StudyItemList
          rows={rowsOf(document.items)}
          onRows={undefined}
          renderPinned={(item) => <SharedItem item={item} token={token} study={study} />}
          nameOf={itemNames(runNames, designNames)}
        />
        <DecisionSection decision={document.decision} decided={decided} />
      </div>
    </Page>
  );
}

type ItemProps = Props & { item: Exclude<StudyItem, { kind: 'note' }> };

function SharedItem({ item, token, study }: ItemProps) {
  if (item.kind === 'run') {
    const run = study.runs.find(({ id }) => id === item.runId)?.run;
    if (!run) return <Gone what="run" />;
    const path = `${sharedPath(token)}/runs/${item.runId}`;
    return (
      <>
        <PinnedRun run={run} dataPath={path} view={item.view} href={null} />
        <RestsOn>
          <RunProvenance run={run} />
          <RunDownloads path={path} hasData />
        </RestsOn>
      </>
    );
  }
  const design = study.designs.find(({ id }) => id === item.designId)?.design;
  if (!design) return <Gone what="design" />;
  const path = `${sharedPath(token)}/designs/${item.designId}`;
  return (
    <>
      <PinnedDesign design={design} dataPath={path} view={item.view} href={null} />
      <RestsOn>
        <RunProvenance run={design} />
        <DesignFiles path={path} />
      </RestsOn>
    </>
  );
}

function RestsOn({ children }: { children: ReactNode }) {
  return (
    <details className="mt-3">
      <summary className="text-accent">Assumptions, sources and files</summary>
      <div className="mt-3 flex flex-col gap-6">{children}</div>
    </details>
  );
}

function Gone({ what }: { what: string }) {
  return <p className="text-muted">This {what} was deleted by the group.</p>;
}
