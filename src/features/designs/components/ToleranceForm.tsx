import type { ToleranceDesign } from '../../../../shared/toleranceDesign.ts';
import { drawnLayers } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { DemandFields } from './DemandFields.tsx';
import { PointsFields } from './PointsFields.tsx';
import { ToleranceFields } from './ToleranceFields.tsx';

type Props = {
  input: ToleranceDesign;
  materials: readonly NamedMaterial[];
  onChange: (input: ToleranceDesign) => void;
};

/** The question of tolerance: how far the film may be off, and what it must still do. */
export function ToleranceForm({ input, materials, onChange }: Props) {
  const change = (part: Partial<ToleranceDesign>) => onChange({ ...input, ...part });
  return (
    <>
      <PointsFields points={input.points} onChange={(points) => change({ points })} />
      <DemandFields
        signal={input.signal}
        demands={input.demands}
        withSlope={false}
        onChange={({ signal = input.signal, demands }) => {
          if (demands === undefined) return change({ signal });
          const { mostSlopePercentPerNm: _slope, ...made } = demands;
          change({ signal, demands: made });
        }}
      />
      <ToleranceFields
        tolerance={input.tolerance}
        media={drawnLayers(input.document.layers).map(({ medium }) => medium)}
        materials={materials}
        onChange={(tolerance) => change({ tolerance })}
      />
    </>
  );
}
