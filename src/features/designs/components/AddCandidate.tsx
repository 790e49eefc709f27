import { Plus } from 'lucide-react';
import { useState } from 'react';
import type { CapCandidate } from '../../../../shared/capDesign.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { Button } from '../../../components/Button.tsx';
import { formatFormula } from '../../../lib/format.ts';
import { newCandidate } from '../model/capCandidates.ts';
import type { PickMaterial } from '../model/pickMaterial.ts';

type Props = { pickMaterial: PickMaterial; onAdd: (candidate: CapCandidate) => void };

/** Adds a cap of one material or of two, each found in the library; the upper one first. */
export function AddCandidate({ pickMaterial, onAdd }: Props) {
  const [layers, setLayers] = useState<1 | 2 | null>(null);
  const [upper, setUpper] = useState<MaterialSummary | null>(null);
  const close = () => {
    setLayers(null);
    setUpper(null);
  };
  const choose = (material: MaterialSummary) => {
    if (layers === 2 && upper === null) return setUpper(material);
    onAdd(newCandidate(upper ? [upper, material] : [material]));
    close();
  };
  if (layers === null) {
    return (
      <div className="flex flex-wrap gap-1.5">
        {([1, 2] as const).map((count) => (
          <Button
            key={count}
            className="py-1!"
            icon={<Plus aria-hidden="true" className="size-4" />}
            onClick={() => setLayers(count)}
          >
            {count === 1 ? 'Cap of one layer' : 'Cap of two layers'}
          </Button>
        ))}
      </div>
    );
  }
  const wanted =
    layers === 1
      ? 'Material of the cap'
      : upper === null
        ? 'Upper layer, which light meets first and whose thickness is swept'
        : `Lower layer under ${formatFormula(upper.formula)}, of fixed thickness`;
  return (
    <div role="group" aria-label="New candidate" className="rounded-card border border-line p-3">
      <div className="mb-2 flex items-center justify-between gap-3">
        <p className="font-semibold">{wanted}</p>
        <Button tone="plain" className="py-1!" onClick={close}>
          Cancel
        </Button>
      </div>
      {/* The second search begins empty. */}
      <div key={upper?.id ?? 'first'}>{pickMaterial(choose)}</div>
    </div>
  );
}
