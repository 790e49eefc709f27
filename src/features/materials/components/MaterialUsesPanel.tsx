import { useQuery } from '@tanstack/react-query';
import { QueryGate } from '../../../components/QueryGate.tsx';
import { materialUsesQuery } from '../api/materialUses.ts';
import { UseList } from './UseList.tsx';

/** Where a material is used, of the reader's groups. */
export function MaterialUsesPanel({ materialId }: { materialId: string }) {
  const uses = useQuery(materialUsesQuery(materialId));
  return (
    <QueryGate query={uses} what="uses">
      {(data) => <UseList uses={data} />}
    </QueryGate>
  );
}
