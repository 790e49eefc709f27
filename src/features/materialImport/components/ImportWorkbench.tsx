import { useQuery } from '@tanstack/react-query';
import type { Material, MaterialSummary } from '../../../../shared/material.ts';
import { Button } from '../../../components/Button.tsx';
import { ErrorState } from '../../../components/ErrorState.tsx';
import { LoadingState } from '../../../components/LoadingState.tsx';
import { importQuery } from '../api/importTable.ts';
import { ExportedImport } from './ExportedImport.tsx';
import { ImportStep, StepList } from './ImportStep.tsx';
import { MappedImport } from './MappedImport.tsx';
import { TableStep } from './TableStep.tsx';

type ImportWorkbenchProps = {
  groupId: string;
  /** The import that the address names; null before a table was sent. */
  importId: string | null;
  onImport: (importId: string | null) => void;
  target: Material | null;
  materials: readonly MaterialSummary[];
  loadMaterial: (id: string, version: number) => Promise<Material>;
  onKept: (material: Material) => void;
};

const notYet = { columns: 'waiting', signs: 'waiting', result: 'waiting', keep: 'waiting' } as const;

/** The five steps on one page. What was answered stays, whatever is refused and wherever one goes back to. */
export function ImportWorkbench(props: ImportWorkbenchProps) {
  const { groupId, importId, onImport, target, materials, loadMaterial, onKept } = props;
  const query = useQuery({ ...importQuery(importId ?? ''), enabled: importId !== null });
  const sent = importId === null ? null : (query.data ?? null);
  if (importId !== null && sent === null) {
    return query.isError ? (
      <div className="flex flex-col items-start gap-3">
        <ErrorState
          title="This import could not be loaded"
          error={query.error}
          onRetry={() => void query.refetch()}
        />
        <Button onClick={() => onImport(null)}>Begin with another table</Button>
      </div>
    ) : (
      <LoadingState label="Loading the import" />
    );
  }
  const ready = sent?.state === 'ready';
  const tableStep = (
    <ImportStep key="table" id="table" state={ready ? 'done' : 'open'}>
      <TableStep
        groupId={groupId}
        sent={sent}
        onSent={({ id }) => onImport(id)}
        onAnother={() => onImport(null)}
      />
    </ImportStep>
  );
  if (ready && sent.exported) {
    return (
      <ExportedImport
        key={sent.id}
        groupId={groupId}
        importId={sent.id}
        exported={sent.exported}
        tableStep={tableStep}
        onKept={onKept}
      />
    );
  }
  if (ready && sent.table) {
    return (
      <MappedImport
        key={sent.id}
        groupId={groupId}
        importId={sent.id}
        table={sent.table}
        tableStep={tableStep}
        target={target}
        materials={materials}
        loadMaterial={loadMaterial}
        onKept={onKept}
      />
    );
  }
  return (
    <>
      <StepList states={{ table: 'open', ...notYet }} />
      <div className="flex flex-col gap-4">
        {tableStep}
        <ImportStep id="columns" state="waiting" waitsFor="shown once the table is read" />
        <ImportStep id="signs" state="waiting" waitsFor="asked once the columns are known" />
        <ImportStep id="result" state="waiting" waitsFor="shown once the signs are known" />
        <ImportStep id="keep" state="waiting" waitsFor="asked once there is a result" />
      </div>
    </>
  );
}
