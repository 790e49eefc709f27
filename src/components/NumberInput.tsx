import type { ControlProps } from './Field.tsx';
import { controlLook } from './controlLook.ts';
import { useNumberDraft } from './useNumberDraft.ts';
import type { NumberRules } from './useNumberDraft.ts';

type NumberInputProps = NumberRules &
  Partial<ControlProps> & { unit?: string; disabled?: boolean; className?: string };

/** A number in a form: the same typing rules as Quantity in the box of a form field. */
export function NumberInput({ unit, disabled, className = '', ...props }: NumberInputProps) {
  const { id, 'aria-describedby': describedBy, 'aria-invalid': invalid, ...rules } = props;
  const { text, problem, inputProps } = useNumberDraft(rules);
  const problemId = id ? `${id}-problem` : undefined;
  return (
    <span className={`inline-flex flex-col gap-1 ${className}`}>
      <span className="relative inline-flex items-center">
        <input
          {...inputProps}
          id={id}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          role="spinbutton"
          disabled={disabled}
          aria-valuenow={rules.value}
          aria-valuemin={rules.min}
          aria-valuemax={rules.max}
          aria-invalid={problem ? true : invalid}
          aria-describedby={
            [describedBy, problem ? problemId : undefined].filter(Boolean).join(' ') || undefined
          }
          value={text}
          className={`${controlLook} ${unit ? 'pr-10' : ''}`}
        />
        {unit ? (
          <span className="pointer-events-none absolute right-3 text-note text-muted">{unit}</span>
        ) : null}
      </span>
      {problem ? (
        <span id={problemId} role="alert" className="text-note text-danger">
          {problem}
        </span>
      ) : null}
    </span>
  );
}
