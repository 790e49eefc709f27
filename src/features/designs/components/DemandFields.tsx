import type { Demands, SignalName } from '../../../../shared/designPoint.ts';
import { signalNames } from '../../../../shared/designPoint.ts';
import { demandLooks, demandNames } from '../model/demands.ts';
import type { DemandName } from '../model/demands.ts';
import { axisLabel, signalQuantities } from '../model/quantities.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { FormSection } from './FormSection.tsx';
import { NumberField } from './NumberField.tsx';

type Props = {
  signal: SignalName;
  demands: Demands;
  /** Whether the change per nm of a swept layer can be demanded. */
  withSlope: boolean;
  onChange: (change: { signal?: SignalName; demands?: Demands }) => void;
};

/** What counts as the signal, and what must hold at every working point. */
export function DemandFields({ signal, demands, withSlope, onChange }: Props) {
  return (
    <FormSection title="Signal and demands" hint="A demand that is not ticked is not made.">
      <ChoiceField
        label="Signal"
        path="signal"
        value={signal}
        options={signalNames.map((name) => ({ value: name, label: axisLabel(signalQuantities[name]) }))}
        className="self-start"
        onChange={(chosen) => onChange({ signal: chosen })}
      />
      <div className="grid gap-x-6 gap-y-3 sm:grid-cols-2 lg:grid-cols-3">
        {demandNames
          .filter((name) => withSlope || name !== 'mostSlopePercentPerNm')
          .map((name) => (
            <DemandField
              key={name}
              name={name}
              value={demands[name]}
              onChange={(value) => {
                const { [name]: _before, ...others } = demands;
                onChange({ demands: value === undefined ? others : { ...others, [name]: value } });
              }}
            />
          ))}
      </div>
    </FormSection>
  );
}

type FieldProps = {
  name: DemandName;
  value: number | undefined;
  onChange: (value: number | undefined) => void;
};

function DemandField({ name, value, onChange }: FieldProps) {
  const { label, bound, unit, scale, start, step } = demandLooks[name];
  return (
    <div>
      <label className="flex items-center gap-2">
        <input
          type="checkbox"
          checked={value !== undefined}
          onChange={(event) => onChange(event.target.checked ? start / scale : undefined)}
        />
        {label} {bound}
      </label>
      {value !== undefined && (
        <NumberField
          label={`${label} ${bound}`}
          path={`demands.${name}`}
          value={value}
          scale={scale}
          step={step}
          className="mt-1 ml-6 w-40 [&>label]:sr-only"
          onChange={onChange}
          {...(unit ? { hint: unit } : {})}
        />
      )}
    </div>
  );
}
