import { X } from 'lucide-react';
import type { CapCandidate } from '../../../../shared/capDesign.ts';
import { IconButton } from '../../../components/Button.tsx';
import { NumberInput } from '../../../components/NumberInput.tsx';
import { mediumWords } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { FieldIssue } from './FieldIssue.tsx';
import { NumberField } from './NumberField.tsx';
import { TextField } from './TextField.tsx';

type Props = {
  candidate: CapCandidate;
  path: string;
  materials: readonly NamedMaterial[];
  onChange: (candidate: CapCandidate) => void;
  onRemove: () => void;
};

type CapLayer = CapCandidate['layers'][number];

/** One candidate: its name, and of each layer how thick it must be to protect and by which source. */
export function CandidateFields({ candidate, path, materials, onChange, onRemove }: Props) {
  const { label, layers } = candidate;
  const changeLayer = (position: number, part: Partial<CapLayer>) =>
    onChange({
      ...candidate,
      layers: layers.map((one, at) => (at === position ? { ...one, ...part } : one)),
    });
  const sweep = (position: number) =>
    onChange({
      ...candidate,
      layers: layers.map((one, at) => ({
        ...one,
        fixedNm: at === position ? null : (one.fixedNm ?? one.leastNm),
      })),
    });
  return (
    <div
      role="group"
      aria-label={`Candidate ${label}`}
      className="relative flex flex-col gap-2 border-l-2 border-line pr-9 pl-3"
    >
      <TextField
        label="Name of the candidate"
        path={`${path}.label`}
        value={label}
        className="max-w-60"
        onChange={(next) => onChange({ ...candidate, label: next })}
      />
      {layers.map((layer, position) => {
        const at = `${path}.layers[${position}]`;
        const name = mediumWords(layer.medium, materials);
        return (
          <div key={position} role="group" aria-label={name} className="flex flex-wrap items-start gap-3">
            <div className="w-28 pt-6">
              <span className="font-semibold">{name}</span>
              {layers.length > 1 && (
                <div className="text-note text-muted">{position === 0 ? 'upper' : 'lower'}</div>
              )}
            </div>
            <NumberField
              label="Protects from"
              path={`${at}.leastNm`}
              value={layer.leastNm}
              unit="nm"
              step={0.1}
              onChange={(leastNm) => changeLayer(position, { leastNm })}
            />
            <TextField
              label="Source"
              path={`${at}.leastSource`}
              value={layer.leastSource}
              className="min-w-52 flex-1"
              onChange={(leastSource) => changeLayer(position, { leastSource })}
            />
            {layers.length > 1 && (
              <div className="flex w-44 flex-col gap-1">
                <label className="flex items-center gap-1.5 text-note font-semibold">
                  <input
                    type="radio"
                    name={`swept-${candidate.id}`}
                    checked={layer.fixedNm === null}
                    onChange={() => sweep(position)}
                  />
                  thickness swept
                </label>
                {layer.fixedNm !== null && (
                  <NumberInput
                    id={`fixed-${candidate.id}`}
                    aria-describedby={`fixed-words-${candidate.id}`}
                    value={layer.fixedNm}
                    step={0.1}
                    unit="nm"
                    onChange={(fixedNm) => changeLayer(position, { fixedNm })}
                  />
                )}
                {layer.fixedNm !== null && (
                  <label
                    htmlFor={`fixed-${candidate.id}`}
                    id={`fixed-words-${candidate.id}`}
                    className="text-note text-muted"
                  >
                    fixed thickness of {name}
                  </label>
                )}
                <FieldIssue path={`${at}.fixedNm`} />
              </div>
            )}
            <FieldIssue path={`${at}.medium.material`} />
            <FieldIssue path={`${at}.medium`} />
          </div>
        );
      })}
      <FieldIssue path={`${path}.layers`} />
      <IconButton label={`Remove ${label}`} className="absolute -top-1 right-0" onClick={onRemove}>
        <X aria-hidden="true" className="size-4" />
      </IconButton>
    </div>
  );
}
