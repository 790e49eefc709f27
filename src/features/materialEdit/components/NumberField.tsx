import type { ReactNode } from 'react';
import { Field } from '../../../components/Field.tsx';
import { NumberInput } from '../../../components/NumberInput.tsx';
import { useIssue } from '../hooks/issueContext.ts';

type Props = {
  label: string;
  /** Where the API names this value; what it finds wrong there is shown here. */
  path: string;
  value: number;
  unit?: string;
  step?: number;
  hint?: ReactNode;
  className?: string;
  onChange: (value: number) => void;
};

/** A number of the form. Every number is taken as typed; whether it makes sense is said by the API's own rules. */
export function NumberField({ label, path, hint, className = 'w-32', step = 0.01, ...rest }: Props) {
  const error = useIssue(path);
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(control) => <NumberInput {...control} {...rest} step={step} />}
    </Field>
  );
}
