import type { StackMedium } from '../../../../shared/stack.ts';
import { mediumOfPart, withPart } from '../model/sampleParts.ts';
import type { PickMedium } from './pickMedium.ts';
import { Row, SampleQuantity } from './SampleQuantity.tsx';

type Props = {
  mixture: NonNullable<StackMedium['mixture']>;
  nameOf: (medium: StackMedium) => string;
  pickMedium: PickMedium;
  onChange: (medium: StackMedium) => void;
};

const models = {
  bruggeman: 'Bruggeman, both alike',
  'maxwell-garnett': 'spheres of the second in the first',
};

/** Two media mixed far below the wavelength: which, how much of the second, by which model. */
export function MixtureForm({ mixture, nameOf, pickMedium, onChange }: Props) {
  const [first, second] = mixture.parts;
  return (
    <div className="flex flex-col gap-1 border-l-2 border-line pl-3">
      <Row label="Mixture of">
        {([first, second] as const).map((part, index) => (
          <span key={index} className="inline-flex items-center gap-1">
            {index === 1 && 'and'}
            {pickMedium({
              medium: mediumOfPart(part),
              label: `part ${index + 1} of the mixture`,
              onChange: (medium) => onChange({ mixture: withPart(mixture, index === 0 ? 0 : 1, medium) }),
            })}
          </span>
        ))}
      </Row>
      <Row label={`${nameOf(mediumOfPart(second))} by volume`}>
        <SampleQuantity
          label="volume fraction of the second part"
          unit="%"
          max={100}
          step={5}
          value={Number((100 * mixture.fraction).toPrecision(6))}
          onChange={(percent) => onChange({ mixture: { ...mixture, fraction: percent / 100 } })}
        />
      </Row>
      <Row label="Model">
        <select
          aria-label="Model of the mixture"
          value={mixture.model}
          onChange={(event) =>
            onChange({
              mixture: {
                ...mixture,
                model: event.target.value === 'bruggeman' ? 'bruggeman' : 'maxwell-garnett',
              },
            })
          }
          className="h-7 max-w-56 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-ink"
        >
          {Object.entries(models).map(([model, label]) => (
            <option key={model} value={model}>
              {label}
            </option>
          ))}
        </select>
      </Row>
      <button
        type="button"
        className="w-fit rounded-box text-accent hover:underline"
        onClick={() => onChange(mediumOfPart(first))}
      >
        {nameOf(mediumOfPart(first))} alone
      </button>
    </div>
  );
}
