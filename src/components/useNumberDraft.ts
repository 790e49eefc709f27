import { useState } from 'react';
import type { FocusEvent, KeyboardEvent } from 'react';
import { formatPlain } from '../lib/format.ts';
import { parseNumber } from '../lib/parseNumber.ts';

export type NumberRules = {
  value: number;
  onChange: (value: number) => void;
  min?: number | undefined;
  max?: number | undefined;
  /** True where `max` itself is refused, as 90 deg is for the angle of incidence. */
  below?: boolean | undefined;
  whole?: boolean | undefined;
  /** What an arrow key adds; Shift makes it ten times as much, Alt a tenth. */
  step?: number | undefined;
  format?: ((value: number) => string) | undefined;
};

/** Why a typed text is refused, or the number it stands for. */
function judge(text: string, { min, max, below, whole }: NumberRules): number | string {
  const value = parseNumber(text);
  if (value === null) return text.trim() === '' ? 'Type a number' : 'This is not a number';
  if (whole && !Number.isInteger(value)) return 'Must be a whole number';
  if (min !== undefined && value < min) return `Must be at least ${formatPlain(min)}`;
  if (max !== undefined && below && value >= max) return `Must be less than ${formatPlain(max)}`;
  if (max !== undefined && value > max) return `Must be at most ${formatPlain(max)}`;
  return value;
}

/** Adds without the binary noise of 0.1 + 0.2. */
function stepped(value: number, by: number): number {
  return Number((value + by).toPrecision(12));
}

/**
 * A number being typed. Every keystroke that makes a permitted number is passed on at once; one that does not is
 * kept as text with the reason. Escape goes back to the value at focus, arrows step, leaving the field drops a
 * refused text but keeps saying why it was refused until the field is entered again.
 */
export function useNumberDraft(rules: NumberRules) {
  const { value, onChange, min, max, below, step = 1, format = formatPlain } = rules;
  const [draft, setDraft] = useState<string | null>(null);
  const [atFocus, setAtFocus] = useState(value);
  const [problem, setProblem] = useState<string | null>(null);

  const take = (text: string) => {
    setDraft(text);
    const verdict = judge(text, rules);
    setProblem(typeof verdict === 'string' ? verdict : null);
    if (typeof verdict === 'number' && verdict !== value) onChange(verdict);
  };

  const stepBy = (amount: number) => {
    let next = stepped(value, amount);
    if (min !== undefined) next = Math.max(min, next);
    if (max !== undefined && (below ? next >= max : next > max)) next = below ? value : max;
    take(formatPlain(next));
  };

  return {
    text: draft ?? format(value),
    problem,
    inputProps: {
      onFocus: (event: FocusEvent<HTMLInputElement>) => {
        setAtFocus(value);
        setProblem(null);
        setDraft(formatPlain(value));
        event.currentTarget.select();
      },
      onBlur: () => {
        setDraft(null);
      },
      onChange: (event: { target: HTMLInputElement }) => take(event.target.value),
      onKeyDown: (event: KeyboardEvent<HTMLInputElement>) => {
        const direction = event.key === 'ArrowUp' ? 1 : event.key === 'ArrowDown' ? -1 : 0;
        if (direction !== 0) {
          event.preventDefault();
          const factor = event.shiftKey ? 10 : event.altKey && !rules.whole ? 0.1 : 1;
          stepBy(direction * step * factor);
        } else if (event.key === 'Escape' && draft !== null && draft !== formatPlain(atFocus)) {
          // Only an Escape that had something to undo is ours; a dialog around may use the next one.
          event.stopPropagation();
          take(formatPlain(atFocus));
        } else if (event.key === 'Enter') {
          event.currentTarget.select();
        }
      },
    },
  };
}
