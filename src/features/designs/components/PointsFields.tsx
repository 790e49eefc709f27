import { Plus, X } from 'lucide-react';
import type { DesignPoint } from '../../../../shared/designPoint.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import type { WorkingPoint } from '../../../../shared/stack.ts';
import { Button, IconButton } from '../../../components/Button.tsx';
import { geometryNames, geometryOf, magnetizationOf, pointWords } from '../model/pointWords.ts';
import { newPoint } from '../model/startInput.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { FieldIssue } from './FieldIssue.tsx';
import { FormSection } from './FormSection.tsx';
import { NumberField } from './NumberField.tsx';
import { TextField } from './TextField.tsx';

type Props = { points: readonly DesignPoint[]; onChange: (points: DesignPoint[]) => void };

/** Where the film will be read: up to six working points. */
export function PointsFields({ points, onChange }: Props) {
  const last = points[points.length - 1];
  return (
    <FormSection title="Working points" hint="With several, the demands hold at each and the weakest counts.">
      {points.map((point, position) => (
        <div
          key={point.id}
          role="group"
          aria-label={`Working point ${position + 1}`}
          className="relative pr-9"
        >
          <PointFields
            point={point}
            path={`points[${position}]`}
            onChange={(next) => onChange(points.map((one, at) => (at === position ? next : one)))}
          />
          {points.length > 1 && (
            <IconButton
              label={`Remove working point ${position + 1}`}
              className="absolute top-6 right-0"
              onClick={() => onChange(points.filter((_, at) => at !== position))}
            >
              <X aria-hidden="true" className="size-4" />
            </IconButton>
          )}
        </div>
      ))}
      <FieldIssue path="points" />
      {last && points.length < LIMITS.designPoints && (
        <Button
          className="self-start py-1!"
          icon={<Plus aria-hidden="true" className="size-4" />}
          onClick={() => onChange([...points, newPoint(last.workingPoint)])}
        >
          Working point
        </Button>
      )}
    </FormSection>
  );
}

type PointProps = { point: DesignPoint; path: string; onChange: (point: DesignPoint) => void };

function PointFields({ point, path, onChange }: PointProps) {
  const { label, workingPoint } = point;
  const geometry = geometryOf(workingPoint.magnetization);
  // A name that was made from the numbers follows them; one that somebody typed stays.
  const move = (change: Partial<WorkingPoint>) => {
    const next = { ...workingPoint, ...change };
    onChange({
      ...point,
      workingPoint: next,
      label: label === pointWords(workingPoint) ? pointWords(next) : label,
    });
  };
  const at = `${path}.workingPoint`;
  return (
    <div className="flex flex-wrap items-start gap-3">
      <NumberField
        label="Wavelength"
        path={`${at}.wavelengthNm`}
        value={workingPoint.wavelengthNm}
        unit="nm"
        onChange={(wavelengthNm) => move({ wavelengthNm })}
      />
      <NumberField
        label="Angle"
        path={`${at}.angleDeg`}
        value={workingPoint.angleDeg}
        unit="°"
        className="w-24"
        onChange={(angleDeg) => move({ angleDeg })}
      />
      <ChoiceField
        label="Light"
        path={`${at}.input`}
        value={workingPoint.input}
        options={[
          { value: 'p', label: 'p' },
          { value: 's', label: 's' },
        ]}
        onChange={(input) => move({ input })}
      />
      <ChoiceField
        label="Magnetization"
        path={`${at}.magnetization`}
        value={geometry}
        options={geometryNames
          .filter((name) => name !== 'another direction' || name === geometry)
          .map((name) => ({ value: name, label: name }))}
        onChange={(name) => {
          const magnetization = magnetizationOf(name);
          if (magnetization) move({ magnetization });
        }}
      />
      <TextField
        label="Name"
        path={`${path}.label`}
        value={label}
        className="min-w-52 flex-1"
        onChange={(next) => onChange({ ...point, label: next })}
      />
    </div>
  );
}
