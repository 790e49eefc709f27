import { goalQuantities } from '../../../../shared/optimiseDesign.ts';
import type { Goal } from '../../../../shared/optimiseDesign.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { leastReflectanceFor, needsLight } from '../model/goalLight.ts';
import { goalLabels } from '../model/goalWords.ts';
import { drawnLayers, layerWords } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { FieldIssue } from './FieldIssue.tsx';
import { NumberField } from './NumberField.tsx';

type Props = {
  goal: Goal;
  path: 'goal' | 'second';
  document: StackDocument;
  materials: readonly NamedMaterial[];
  onChange: (goal: Goal) => void;
};

/** One goal: the quantity, the layer it is about, the reflectance below which films do not count. */
export function GoalFields({ goal, path, document, materials, onChange }: Props) {
  const layers = drawnLayers(document.layers);
  const { quantity, layerId, leastReflectance } = goal;
  return (
    <div className="flex flex-wrap items-start gap-3">
      <ChoiceField
        label={path === 'goal' ? 'Goal' : 'Second goal'}
        path={`${path}.quantity`}
        value={quantity}
        options={goalQuantities.map((name) => ({ value: name, label: goalLabels[name] }))}
        onChange={(next) => {
          const first = layers[0]?.id;
          onChange({
            quantity: next,
            ...leastReflectanceFor(goal, next),
            ...(next === 'insensitivity' && first !== undefined ? { layerId: layerId ?? first } : {}),
          });
        }}
      />
      {layerId !== undefined && (
        <ChoiceField
          label="Layer that must matter least"
          path={`${path}.layerId`}
          value={layerId}
          options={layers.map(({ id }) => ({ value: id, label: layerWords(document, id, materials) }))}
          onChange={(next) => onChange({ ...goal, layerId: next })}
        />
      )}
      <NumberField
        label="Least reflectance"
        path={`${path}.leastReflectance`}
        value={leastReflectance ?? 0}
        step={0.01}
        className="w-full sm:w-96"
        hint={
          needsLight(quantity)
            ? 'Films that reflect less are left out, because their angles say little: 0.01 is common practice, no source; 0 leaves none out.'
            : 'Films that reflect less are left out; 0 leaves none out.'
        }
        onChange={(next) => {
          const { leastReflectance: _least, ...rest } = goal;
          onChange(next === 0 ? rest : { ...rest, leastReflectance: next });
        }}
      />
      <FieldIssue path={path} />
    </div>
  );
}
