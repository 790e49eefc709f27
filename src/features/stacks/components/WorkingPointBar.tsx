import { ChevronDown } from 'lucide-react';
import { memo } from 'react';
import type { ReactNode } from 'react';
import type { WorkingMagnetization, WorkingPoint } from '../../../../shared/stack.ts';
import { Quantity } from '../../../components/Quantity.tsx';
import { describeWorkingM } from '../model/magnetization.ts';
import { DirectionForm } from './DirectionForm.tsx';
import { Popup } from './Popup.tsx';

type Props = {
  point: WorkingPoint;
  /** Problems the server found at the wavelength or the angle. */
  problems: { wavelengthNm?: string | undefined; angleDeg?: string | undefined };
  onChange: (change: Partial<WorkingPoint>) => void;
};

/** Where the readings strip stands: light, angle, input and magnetization, each changed where it is printed. */
export const WorkingPointBar = memo(function WorkingPointBar({ point, problems, onChange }: Props) {
  return (
    <div role="group" aria-label="Working point" className="flex flex-wrap items-center gap-2">
      <Chip name="light">
        <Quantity
          label="wavelength"
          unit="nm"
          value={point.wavelengthNm}
          min={1}
          step={1}
          error={problems.wavelengthNm}
          onChange={(wavelengthNm) => onChange({ wavelengthNm })}
          className="font-semibold"
        />
      </Chip>
      <Chip name="angle">
        <Quantity
          label="angle of incidence"
          unit="°"
          value={point.angleDeg}
          min={0}
          max={90}
          below
          step={1}
          error={problems.angleDeg}
          onChange={(angleDeg) => onChange({ angleDeg })}
          className="font-semibold"
        />
      </Chip>
      <Chip name="input">
        <span role="group" aria-label="Input polarization" className="inline-flex gap-0.5">
          {(['p', 's'] as const).map((input) => (
            <button
              key={input}
              type="button"
              aria-pressed={point.input === input}
              aria-label={`${input} light`}
              onClick={() => onChange({ input })}
              className="rounded-box px-2 py-[3px] text-muted hover:text-ink aria-pressed:bg-accent-soft aria-pressed:font-semibold aria-pressed:text-accent"
            >
              {input}
            </button>
          ))}
        </span>
      </Chip>
      <Chip name="magnetization">
        <Popup
          label="Magnetization of the working point"
          trigger={
            <button
              type="button"
              aria-label={`Magnetization: ${describeWorkingM(point.magnetization)}`}
              className="inline-flex items-center gap-1 rounded-box px-1.5 py-[3px] font-semibold ring-1 ring-transparent hover:ring-edge aria-expanded:ring-2 aria-expanded:ring-accent"
            >
              {describeWorkingM(point.magnetization)}
              <ChevronDown size={13} aria-hidden className="text-muted" />
            </button>
          }
        >
          <MagnetizationChoice
            magnetization={point.magnetization}
            onChange={(magnetization) => onChange({ magnetization })}
          />
        </Popup>
      </Chip>
    </div>
  );
});

function Chip({ name, children }: { name: string; children: ReactNode }) {
  return (
    <span className="inline-flex items-center gap-1 rounded-control border border-line bg-panel py-[3px] pr-1 pl-2.5">
      <span className="text-[13.5px] text-muted">{name}</span>
      {children}
    </span>
  );
}

const modes = [
  { mode: 'drawn', label: 'As drawn', hint: 'each layer with its own m' },
  { mode: 'reversed', label: 'Reversed', hint: 'every m turned round, fixed layers excepted' },
  { mode: 'direction', label: 'One direction', hint: 'in every magnetic layer that is not fixed' },
] as const;

type ChoiceProps = {
  magnetization: WorkingMagnetization;
  onChange: (magnetization: WorkingMagnetization) => void;
};

function MagnetizationChoice({ magnetization, onChange }: ChoiceProps) {
  const choose = (mode: WorkingMagnetization['mode']) =>
    onChange(mode === 'direction' ? { mode, m: [0, 0, 1] } : { mode });
  return (
    <div className="flex flex-col gap-2">
      <fieldset className="flex flex-col gap-1">
        <legend className="sr-only">Whose magnetization the readings are for</legend>
        {modes.map(({ mode, label, hint }) => (
          <label
            key={mode}
            className="flex cursor-pointer items-baseline gap-2 rounded-box px-1.5 py-1 hover:bg-accent-soft"
          >
            <input
              type="radio"
              name="working magnetization"
              checked={magnetization.mode === mode}
              onChange={() => choose(mode)}
              className="accent-accent"
            />
            <span>
              {label} <span className="text-note text-muted">{hint}</span>
            </span>
          </label>
        ))}
      </fieldset>
      {magnetization.mode === 'direction' && (
        <div className="border-t border-line pt-3">
          <DirectionForm
            m={magnetization.m}
            label="every magnetic layer that is not fixed"
            onChange={(m) => onChange({ mode: 'direction', m })}
          />
        </div>
      )}
    </div>
  );
}
