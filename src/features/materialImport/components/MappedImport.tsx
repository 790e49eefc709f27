import { useCallback, useMemo } from 'react';
import type { ReactNode } from 'react';
import type { Material, MaterialSummary } from '../../../../shared/material.ts';
import type { ImportTable } from '../../../../shared/materialImport.ts';
import { LoadingState } from '../../../components/LoadingState.tsx';
import { useKeepImported } from '../api/keepImported.ts';
import { useConversion } from '../hooks/useConversion.ts';
import { useImportDraft } from '../hooks/useImportDraft.ts';
import { answersThatStay, isOfTensor } from '../model/neededHabits.ts';
import { keepRequest } from '../model/keepRequest.ts';
import type { NamingForm } from '../model/naming.ts';
import { ColumnStep } from './ColumnStep.tsx';
import { ConversionResult } from './ConversionResult.tsx';
import { HabitQuestions } from './HabitQuestions.tsx';
import { ImportStep, StepList } from './ImportStep.tsx';
import type { StepState } from './ImportStep.tsx';
import { KeepForm } from './KeepForm.tsx';
import { MappingRefusal } from './MappingRefusal.tsx';

type MappedImportProps = {
  groupId: string;
  importId: string;
  table: ImportTable;
  /** The first step, which is done. */
  tableStep: ReactNode;
  /** The material that gets a new version; null for a new material. */
  target: Material | null;
  materials: readonly MaterialSummary[];
  loadMaterial: (id: string, version: number) => Promise<Material>;
  onKept: (material: Material) => void;
};

/** From a table that was read to constants that are kept: columns, signs, result, name and source. */
export function MappedImport(props: MappedImportProps) {
  const { groupId, importId, table, tableStep, target, materials, loadMaterial, onKept } = props;
  const { draft, change, forget } = useImportDraft(importId, table);
  // A new version takes N from the material that it is of.
  const plan = useMemo(
    () =>
      target ? { ...draft.plan, indexOf: { material: target.id, version: target.version } } : draft.plan,
    [draft.plan, target],
  );
  const conversion = useConversion(importId, { plan, answers: draft.answers });
  const { problems, needed, unanswered, mapping, preview, stale } = conversion;
  const keep = useKeepImported((material) => {
    forget();
    onKept(material);
  });
  const changeNaming = useCallback((naming: NamingForm) => change({ naming }), [change]);
  const onKeep = async (form: NamingForm, refuse: (error: unknown) => void) => {
    if (mapping === null) return;
    try {
      const indexFrom = mapping.indexOf
        ? await loadMaterial(mapping.indexOf.material, mapping.indexOf.version)
        : null;
      await keep.mutateAsync(keepRequest({ groupId, importId, mapping, form, target, indexFrom }));
    } catch (error) {
      refuse(error);
    }
  };
  const columns: StepState = problems.length > 0 ? 'open' : 'done';
  const signs = columns === 'done' ? (unanswered.length > 0 ? 'open' : 'done') : 'waiting';
  const result = signs === 'done' ? (preview.data ? 'done' : 'open') : 'waiting';
  const kept = result === 'done' ? 'open' : 'waiting';
  return (
    <>
      <StepList states={{ table: 'done', columns, signs, result, keep: kept }} />
      <div className="flex flex-col gap-4">
        {tableStep}
        <ImportStep id="columns" state={columns}>
          <ColumnStep
            table={table}
            plan={plan}
            problems={problems}
            target={target}
            materials={materials}
            onPlan={(next) => change({ plan: next, answers: answersThatStay(draft, next) })}
          />
        </ImportStep>
        <ImportStep id="signs" state={signs} waitsFor="asked once the columns are known">
          <HabitQuestions
            needed={needed}
            ofTensor={isOfTensor(plan)}
            answers={draft.answers}
            onAnswer={(answer) => change({ answers: { ...draft.answers, ...answer } })}
          />
        </ImportStep>
        <ImportStep id="result" state={result} waitsFor={waitingFor(unanswered.length)}>
          {preview.data ? (
            <ConversionResult table={table} plan={plan} preview={preview.data} stale={stale} />
          ) : preview.isError ? (
            <MappingRefusal error={preview.error} onRetry={() => void preview.refetch()} />
          ) : (
            <LoadingState label="Converting the table" />
          )}
        </ImportStep>
        <ImportStep id="keep" state={kept} waitsFor="asked once there is a result">
          <KeepForm
            key={`${mapping?.index === null} ${mapping?.voigt === null}`}
            asked={{
              name: target === null,
              indexSource: mapping?.index != null,
              voigtSource: mapping?.voigt != null,
            }}
            action={target ? `Make version ${target.version + 1}` : 'Create material'}
            values={draft.naming}
            onChange={changeNaming}
            busy={keep.isPending}
            onKeep={onKeep}
          />
        </ImportStep>
      </div>
    </>
  );
}

function waitingFor(unanswered: number): string {
  if (unanswered === 0) return 'shown once the columns are known';
  return unanswered === 1 ? 'one question is still open' : `${unanswered} questions are still open`;
}
