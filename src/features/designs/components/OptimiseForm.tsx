import { LIMITS } from '../../../../shared/limits.ts';
import type { OptimiseDesign } from '../../../../shared/optimiseDesign.ts';
import { newGoal } from '../model/goalLight.ts';
import { drawnLayers, layerWords } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { newVariable } from '../model/startInput.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { FieldIssue } from './FieldIssue.tsx';
import { FormSection } from './FormSection.tsx';
import { GoalFields } from './GoalFields.tsx';
import { NumberField } from './NumberField.tsx';
import { PointsFields } from './PointsFields.tsx';

type Props = {
  input: OptimiseDesign;
  materials: readonly NamedMaterial[];
  onChange: (input: OptimiseDesign) => void;
};

/** The question of a search: which layers may change and how far, and what is sought. */
export function OptimiseForm({ input, materials, onChange }: Props) {
  const { document, variables, second } = input;
  const change = (part: Partial<OptimiseDesign>) => onChange({ ...input, ...part });
  return (
    <>
      <FormSection
        title="Layers to vary"
        hint={`One to ${LIMITS.designVariables}; the others stay as drawn.`}
      >
        {drawnLayers(document.layers).map((layer) => {
          const position = variables.findIndex(({ layerId }) => layerId === layer.id);
          const variable = variables[position];
          const name = layerWords(document, layer.id, materials);
          const bound = (part: { fromNm?: number; toNm?: number }) =>
            change({ variables: variables.map((one, at) => (at === position ? { ...one, ...part } : one)) });
          return (
            <div key={layer.id} role="group" aria-label={name} className="flex flex-wrap items-start gap-3">
              <label className="flex w-56 items-center gap-2 py-2">
                <input
                  type="checkbox"
                  checked={variable !== undefined}
                  onChange={({ target }) =>
                    change({
                      variables: target.checked
                        ? [...variables, newVariable(layer)]
                        : variables.filter(({ layerId }) => layerId !== layer.id),
                    })
                  }
                />
                {name}
              </label>
              {variable && (
                <>
                  <NumberField
                    label="From"
                    path={`variables[${position}].fromNm`}
                    value={variable.fromNm}
                    unit="nm"
                    onChange={(fromNm) => bound({ fromNm })}
                  />
                  <NumberField
                    label="To"
                    path={`variables[${position}].toNm`}
                    value={variable.toNm}
                    unit="nm"
                    onChange={(toNm) => bound({ toNm })}
                  />
                  <FieldIssue path={`variables[${position}].layerId`} />
                </>
              )}
            </div>
          );
        })}
        <FieldIssue path="variables" />
      </FormSection>
      <FormSection title="Goal" hint="A second goal gives the set of films of which none is better in both.">
        <GoalFields
          goal={input.goal}
          path="goal"
          document={document}
          materials={materials}
          onChange={(goal) => change({ goal })}
        />
        <label className="flex items-center gap-2">
          <input
            type="checkbox"
            checked={second !== undefined}
            onChange={({ target }) => {
              const { second: _second, ...rest } = input;
              onChange(target.checked ? { ...rest, second: newGoal('zero ellipticity') } : rest);
            }}
          />
          a second goal
        </label>
        {second && (
          <GoalFields
            goal={second}
            path="second"
            document={document}
            materials={materials}
            onChange={(goal) => change({ second: goal })}
          />
        )}
      </FormSection>
      <PointsFields points={input.points} onChange={(points) => change({ points })} />
      <FormSection title="Search">
        <div className="flex flex-wrap items-start gap-3">
          <ChoiceField
            label="Effort"
            path="effort"
            value={input.effort}
            options={[
              { value: 'quick', label: 'quick' },
              { value: 'normal', label: 'normal' },
              { value: 'thorough', label: 'thorough' },
            ]}
            onChange={(effort) => change({ effort })}
          />
          <NumberField
            label="Seed"
            path="seed"
            value={input.seed}
            whole
            hint="The same seed repeats the search"
            onChange={(seed) => change({ seed })}
          />
        </div>
      </FormSection>
    </>
  );
}
