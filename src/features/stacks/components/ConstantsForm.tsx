import { toComplex } from '../../../../shared/complex.ts';
import type { Complex } from '../../../../shared/complex.ts';
import type { StackMedium } from '../../../../shared/stack.ts';
import { Field } from '../../../components/Field.tsx';
import { NumberInput } from '../../../components/NumberInput.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { isSampled } from '../model/media.ts';

type Props = {
  medium: StackMedium;
  /** An incident medium neither absorbs nor is magnetic. */
  lossless: boolean;
  onChange: (medium: StackMedium) => void;
};

/** Constants typed in for one layer: N = n + ik, and Q where the medium is magnetic. */
export function ConstantsForm({ medium, lossless, onChange }: Props) {
  const typed = typedConstants(medium);
  const [n, k] = typed.index;
  const [re, im] = typed.voigt;
  const change = (index: Complex, voigt: Complex, label = typed.label) => {
    const magnetic = voigt[0] !== 0 || voigt[1] !== 0;
    onChange({ index, ...(magnetic ? { voigt } : {}), ...(label ? { label } : {}) });
  };
  return (
    <div className="flex flex-col gap-3">
      <Field label="Name on the drawing">
        {(control) => (
          <TextInput
            {...control}
            value={typed.label}
            maxLength={24}
            placeholder="such as Co, annealed"
            onChange={(event) => change([n, k], [re, im], event.target.value)}
          />
        )}
      </Field>
      <div className="grid grid-cols-2 gap-2">
        <Field label="n">
          {(control) => (
            // N = 0 is no medium; n alone may be 0 in a metal.
            <NumberInput
              {...control}
              value={n}
              min={k > 0 ? 0 : 1e-6}
              step={0.01}
              onChange={(next) => change([next, k], [re, im])}
            />
          )}
        </Field>
        {!lossless && (
          <Field label="k">
            {(control) => (
              <NumberInput
                {...control}
                value={k}
                min={0}
                step={0.01}
                onChange={(next) => change([n, next], [re, im])}
              />
            )}
          </Field>
        )}
        {!lossless && (
          <>
            <Field label="Re Q">
              {(control) => (
                <NumberInput
                  {...control}
                  value={re}
                  step={0.001}
                  onChange={(next) => change([n, k], [next, im])}
                />
              )}
            </Field>
            <Field label="Im Q">
              {(control) => (
                <NumberInput
                  {...control}
                  value={im}
                  step={0.001}
                  onChange={(next) => change([n, k], [re, next])}
                />
              )}
            </Field>
          </>
        )}
      </div>
      <p className="text-note text-muted">
        N = n + ik at every wavelength, k ≥ 0.{' '}
        {lossless ? '' : 'For m = +z, ε_xy = iQN². Q = 0 is not magnetic.'}
      </p>
    </div>
  );
}

function typedConstants(medium: StackMedium): { index: Complex; voigt: Complex; label: string } {
  const { index, voigt, label = '' } = medium;
  return {
    index: index === undefined || isSampled(index) ? [1.5, 0] : toComplex(index),
    voigt: voigt === undefined || isSampled(voigt) ? [0, 0] : toComplex(voigt),
    label,
  };
}
