import type { ReactNode } from 'react';
import { controlLook } from '../../../components/controlLook.ts';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { useIssue } from '../hooks/issueContext.ts';

type Props = {
  label: string;
  path: string;
  value: string;
  hint?: ReactNode;
  placeholder?: string;
  maxLength: number;
  /** More than one makes it a box of several lines. */
  lines?: number;
  /** For what is typed as code. */
  plain?: boolean;
  className?: string;
  onChange: (value: string) => void;
};

/** A text of the form, with what the API finds wrong at its path. */
export function TextField({
  label,
  path,
  hint,
  lines = 1,
  plain = false,
  className,
  onChange,
  ...rest
}: Props) {
  const error = useIssue(path);
  const look = plain ? 'font-mono' : '';
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(control) =>
        lines > 1 ? (
          <textarea
            {...control}
            {...rest}
            rows={lines}
            className={`${controlLook} ${look} resize-y`}
            onChange={(event) => onChange(event.target.value)}
          />
        ) : (
          <TextInput
            {...control}
            {...rest}
            autoComplete="off"
            spellCheck={!plain}
            className={look}
            onChange={(event) => onChange(event.target.value)}
          />
        )
      }
    </Field>
  );
}
