import { useId } from 'react';
import { useNumberDraft } from './useNumberDraft.ts';
import type { NumberRules } from './useNumberDraft.ts';

type QuantityProps = NumberRules & {
  /** The name a screen reader says, such as "thickness of Pt, layer 1". */
  label: string;
  unit?: string;
  /** For people who may look but not change: the same box without the edit. */
  readOnly?: boolean | undefined;
  /** A problem known elsewhere, such as an issue the server found at this number. */
  error?: string | undefined;
  size?: 'body' | 'large';
  className?: string;
};

/** A number in a soft box, edited where it stands, with its quieter unit. The wheel never changes it. */
export function Quantity({
  label,
  unit,
  readOnly,
  error,
  size = 'body',
  className = '',
  ...rules
}: QuantityProps) {
  const messageId = useId();
  const { text, problem, inputProps } = useNumberDraft(rules);
  const message = problem ?? error;
  const type = size === 'large' ? 'text-lead' : 'text-body';
  return (
    <span className={`relative inline-flex ${className}`}>
      <span
        className={`inline-flex items-baseline gap-1 rounded-box bg-paper/85 px-2 py-[3px] ${type} ${
          readOnly
            ? ''
            : 'ring-1 ring-transparent hover:ring-edge focus-within:ring-2 focus-within:ring-accent'
        } ${message ? 'ring-2 ring-danger!' : ''}`}
      >
        {readOnly ? (
          <span>
            <span className="sr-only">{label} </span>
            {text}
          </span>
        ) : (
          <input
            {...inputProps}
            type="text"
            inputMode="decimal"
            autoComplete="off"
            role="spinbutton"
            aria-label={unit ? `${label} (${unit})` : label}
            aria-valuenow={rules.value}
            aria-valuemin={rules.min}
            aria-valuemax={rules.max}
            aria-invalid={message ? true : undefined}
            aria-describedby={message ? messageId : undefined}
            value={text}
            // One character more than the text, so that the caret behind the last digit stays in sight.
            style={{ width: `${Math.max(3, text.length + 1)}ch` }}
            className="border-0 bg-transparent p-0 text-right text-ink outline-none"
          />
        )}
        {unit ? <span className="text-note text-muted">{unit}</span> : null}
      </span>
      {message ? (
        <span
          id={messageId}
          role="alert"
          className="absolute top-full right-0 z-20 mt-1 w-max max-w-64 rounded-box border border-danger bg-panel px-2 py-1 text-small text-danger shadow-float"
        >
          {message}
        </span>
      ) : null}
    </span>
  );
}
