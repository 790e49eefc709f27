import type { Design } from '../../../../shared/design.ts';
import { DeleteButton } from '../../../components/DeleteButton.tsx';
import { useDeleteDesign } from '../api/changeDesign.ts';

export function DeleteDesign({ design, onDeleted }: { design: Design; onDeleted: () => void }) {
  return (
    <DeleteButton
      title={`Delete the design “${design.name}”?`}
      description="Its answer is gone and its share links stop to open. The stack and growth cards made from it stay."
      action="Delete design"
      remove={useDeleteDesign(design)}
      onDeleted={onDeleted}
    />
  );
}
