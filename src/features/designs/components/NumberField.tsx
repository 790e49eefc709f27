import type { ReactNode } from 'react';
import { Field } from '../../../components/Field.tsx';
import { NumberInput } from '../../../components/NumberInput.tsx';
import { useIssue } from '../hooks/issueContext.ts';

type Props = {
  label: string;
  /** Where the API names this value; what it finds wrong there is shown here. */
  path: string;
  value: number;
  /** From the value of the API to the one on screen, such as 1000 for mdeg. */
  scale?: number;
  unit?: string;
  step?: number;
  whole?: boolean;
  hint?: ReactNode;
  className?: string;
  onChange: (value: number) => void;
};

/** A number of the question. Every number is taken as typed; whether it makes sense is said by the API's own rules. */
export function NumberField(props: Props) {
  const { label, path, value, scale = 1, hint, className = 'w-32', step = 1, onChange, ...rest } = props;
  const error = useIssue(path);
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(control) => (
        <NumberInput
          {...control}
          {...rest}
          step={step}
          // 0.0123 deg * 1000 is 12.299999999999999 mdeg in doubles.
          value={Number((value * scale).toPrecision(12))}
          onChange={(shown) => onChange(shown / scale)}
        />
      )}
    </Field>
  );
}
