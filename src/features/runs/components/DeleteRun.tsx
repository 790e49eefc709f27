import type { Run } from '../../../../shared/run.ts';
import { DeleteButton } from '../../../components/DeleteButton.tsx';
import { useDeleteRun } from '../api/changeRun.ts';

export function DeleteRun({ run, onDeleted }: { run: Run; onDeleted: () => void }) {
  return (
    <DeleteButton
      title={`Delete the run “${run.name}”?`}
      description="Its values are gone and its share links stop to open. The stack stays."
      action="Delete run"
      remove={useDeleteRun(run)}
      onDeleted={onDeleted}
    />
  );
}
