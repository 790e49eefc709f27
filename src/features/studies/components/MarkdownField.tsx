import { useState } from 'react';
import { Field } from '../../../components/Field.tsx';
import { controlLook } from '../../../components/controlLook.ts';
import { Markdown } from './Markdown.tsx';

type Props = {
  label: string;
  value: string;
  onChange: (text: string) => void;
  maxLength: number;
  rows?: number;
  hint?: string;
  error?: string | undefined;
};

/** Markdown as it is typed, and as it will be read. */
export function MarkdownField({ label, value, onChange, maxLength, rows = 4, hint, error }: Props) {
  const [previewed, setPreviewed] = useState(false);
  return (
    <div>
      {previewed ? (
        <section aria-label={`${label}, preview`}>
          <p aria-hidden="true" className="mb-1 text-note font-semibold">
            {label}
          </p>
          <div className="rounded-control border border-line px-3 py-2">
            {value.trim() === '' ? (
              <p className="text-muted">Nothing written yet.</p>
            ) : (
              <Markdown text={value} />
            )}
          </div>
        </section>
      ) : (
        <Field label={label} hint={hint} error={error}>
          {(control) => (
            <textarea
              {...control}
              value={value}
              rows={rows}
              maxLength={maxLength}
              onChange={(event) => onChange(event.target.value)}
              className={`${controlLook} field-sizing-content min-h-20`}
            />
          )}
        </Field>
      )}
      <button
        type="button"
        aria-pressed={previewed}
        onClick={() => setPreviewed(!previewed)}
        className="mt-1 rounded-control px-2 py-0.5 text-note text-accent hover:bg-accent-soft"
      >
        {previewed ? 'Write on' : 'Preview'}
        <span className="sr-only"> {label}</span>
      </button>
    </div>
  );
}
