import type { CapDesign } from '../../../../shared/capDesign.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import { drawnLayers, layerWords } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import type { PickMaterial } from '../model/pickMaterial.ts';
import { AddCandidate } from './AddCandidate.tsx';
import { CandidateFields } from './CandidateFields.tsx';
import { DemandFields } from './DemandFields.tsx';
import { FieldIssue } from './FieldIssue.tsx';
import { FormSection } from './FormSection.tsx';
import { NumberField } from './NumberField.tsx';
import { PointsFields } from './PointsFields.tsx';
import { ToleranceFields } from './ToleranceFields.tsx';

type Props = {
  input: CapDesign;
  materials: readonly NamedMaterial[];
  pickMaterial: PickMaterial;
  onChange: (input: CapDesign) => void;
};

/** The question of the cap chooser. */
export function CapForm({ input, materials, pickMaterial, onChange }: Props) {
  const { document, candidates, range, replaces } = input;
  const change = (part: Partial<CapDesign>) => onChange({ ...input, ...part });
  const topLayers = document.layers.slice(0, 4).filter((item) => !('layers' in item));
  const media = [
    ...candidates.flatMap(({ layers }) => layers.map(({ medium }) => medium)),
    ...drawnLayers(document.layers)
      .filter(({ id }) => !replaces.includes(id))
      .map(({ medium }) => medium),
  ];
  return (
    <>
      <FormSection
        title="Present cap"
        hint="The candidates take the place of these layers; with none ticked they come on top of the film."
      >
        <div className="flex flex-wrap gap-x-5 gap-y-1">
          {topLayers.map(({ id }) => (
            <label key={id} className="flex items-center gap-2">
              <input
                type="checkbox"
                checked={replaces.includes(id)}
                onChange={({ target }) =>
                  change({
                    replaces: topLayers
                      .map((one) => one.id)
                      .filter((one) => (one === id ? target.checked : replaces.includes(one))),
                  })
                }
              />
              {layerWords(document, id, materials)}
            </label>
          ))}
        </div>
        <FieldIssue path="replaces" />
        {replaces.map((id, position) => (
          <FieldIssue key={id} path={`replaces[${position}]`} />
        ))}
      </FormSection>
      <FormSection
        title="Candidates"
        hint="The thickness from which each protects is a starting value: put in yours, with its source."
      >
        {candidates.map((candidate, position) => (
          <CandidateFields
            key={candidate.id}
            candidate={candidate}
            path={`candidates[${position}]`}
            materials={materials}
            onChange={(next) =>
              change({ candidates: candidates.map((one, at) => (at === position ? next : one)) })
            }
            onRemove={() => change({ candidates: candidates.filter((_, at) => at !== position) })}
          />
        ))}
        <FieldIssue path="candidates" />
        {candidates.length < LIMITS.capCandidates && (
          <AddCandidate
            pickMaterial={pickMaterial}
            onAdd={(candidate) => change({ candidates: [...candidates, candidate] })}
          />
        )}
      </FormSection>
      <FormSection title="Thickness range">
        <div className="flex flex-wrap items-start gap-3">
          <NumberField
            label="From"
            path="range.fromNm"
            value={range.fromNm}
            unit="nm"
            onChange={(fromNm) => change({ range: { ...range, fromNm } })}
          />
          <NumberField
            label="To"
            path="range.toNm"
            value={range.toNm}
            unit="nm"
            onChange={(toNm) => change({ range: { ...range, toNm } })}
          />
          <NumberField
            label="Points"
            path="range.points"
            value={range.points}
            whole
            step={10}
            onChange={(points) => change({ range: { ...range, points } })}
          />
        </div>
      </FormSection>
      <PointsFields points={input.points} onChange={(points) => change({ points })} />
      <DemandFields signal={input.signal} demands={input.demands} withSlope onChange={change} />
      <ToleranceFields
        tolerance={input.tolerance}
        media={media}
        materials={materials}
        onChange={(tolerance) => change({ tolerance })}
      />
      <FormSection title="Yield">
        <NumberField
          label="Least share of the films that must meet all demands"
          path="leastYield"
          value={input.leastYield}
          scale={100}
          unit="%"
          className="max-w-80"
          onChange={(leastYield) => change({ leastYield })}
        />
      </FormSection>
    </>
  );
}
