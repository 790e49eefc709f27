import { useId } from 'react';
import type { ReactNode } from 'react';

/** What a control needs so that its label, hint and error belong to it. */
export type ControlProps = {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
};

type FieldProps = {
  label: string;
  hint?: ReactNode;
  /** What is wrong and what to do about it; shown under the control. */
  error?: string | undefined;
  className?: string;
  children: (control: ControlProps) => ReactNode;
};

/** Schemas write "must be ..." after a path; at the field the sentence starts with a capital. */
function asSentence(message: string): string {
  return message.charAt(0).toUpperCase() + message.slice(1);
}

export function Field({ label, hint, error, className = '', children }: FieldProps) {
  const id = useId();
  const hintId = `${id}-hint`;
  const errorId = `${id}-error`;
  const described = [hint ? hintId : null, error ? errorId : null].filter(Boolean).join(' ');
  return (
    <div className={`flex flex-col gap-1 ${className}`}>
      <label htmlFor={id} className="text-note font-semibold">
        {label}
      </label>
      {children({
        id,
        'aria-describedby': described || undefined,
        'aria-invalid': error ? true : undefined,
      })}
      {hint ? (
        <div id={hintId} className="text-note text-muted">
          {hint}
        </div>
      ) : null}
      {error ? (
        <div id={errorId} className="text-note text-danger">
          <span aria-hidden="true">▲ </span>
          {asSentence(error)}
        </div>
      ) : null}
    </div>
  );
}

/** What a form says above its button when the failure belongs to no single field. */
export function FormError({ message }: { message: string | undefined }) {
  return (
    <div
      role="alert"
      className={
        message
          ? 'rounded-control bg-danger-soft px-3 py-2 text-note whitespace-pre-line text-danger'
          : 'hidden'
      }
    >
      {message}
    </div>
  );
}
