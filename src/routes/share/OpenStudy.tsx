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
          renderBelow={(item) => <SharedSources item={item} token={token} study={study} />}
          nameOf={itemNames(runNames, designNames)}
        />
        <DecisionSection decision={document.decision} decided={decided} />
      </div>
    </Page>
  );
}

type ItemProps = Props & { item: Exclude<StudyItem, { kind: 'note' }> };

function SharedItem({ item, token, study }: ItemProps) {
  const dataPath = itemPath(item, token);
  if (item.kind === 'run') {
    const run = study.runs.find(({ id }) => id === item.runId)?.run;
    return run ? (
      <PinnedRun run={run} dataPath={dataPath} view={item.view} href={null} />
    ) : (
      <Gone what="run" />
    );
  }
  const design = study.designs.find(({ id }) => id === item.designId)?.design;
  return design ? (
    <PinnedDesign design={design} dataPath={dataPath} view={item.view} href={null} />
  ) : (
    <Gone what="design" />
  );
}

function SharedSources({ item, token, study }: ItemProps) {
  const path = itemPath(item, token);
  if (item.kind === 'run') {
    const run = study.runs.find(({ id }) => id === item.runId)?.run;
    return run ? (
      <RestsOn>
        <RunProvenance run={run} />
        <RunDownloads path={path} hasData />
      </RestsOn>
    ) : null;
  }
  const design = study.designs.find(({ id }) => id === item.designId)?.design;
  return design ? (
    <RestsOn>
      <RunProvenance run={design} />
      <DesignFiles path={path} />
    </RestsOn>
  ) : null;
}

function itemPath(item: ItemProps['item'], token: string): string {
  const below = item.kind === 'run' ? `runs/${item.runId}` : `designs/${item.designId}`;
  return `${sharedPath(token)}/${below}`;
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
