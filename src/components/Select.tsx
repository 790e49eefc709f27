import { ChevronDown } from 'lucide-react';
import type { ComponentProps } from 'react';
import { controlLook } from './controlLook.ts';

type Option<Value extends string> = { value: Value; label: string; disabled?: boolean };

type SelectProps<Value extends string> = Omit<ComponentProps<'select'>, 'value' | 'onChange' | 'children'> & {
  value: Value;
  options: readonly Option<Value>[];
  onValueChange: (value: Value) => void;
};

/** A native select: it works with every keyboard, screen reader and phone. */
export function Select<Value extends string>({
  value,
  options,
  onValueChange,
  className = '',
  ...rest
}: SelectProps<Value>) {
  return (
    <span className={`relative inline-flex ${className}`}>
      <select
        {...rest}
        value={value}
        className={`${controlLook} appearance-none pr-8`}
        onChange={(event) => {
          const chosen = options.find((option) => option.value === event.target.value);
          if (chosen) onValueChange(chosen.value);
        }}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
      </select>
      <ChevronDown
        aria-hidden="true"
        className="pointer-events-none absolute top-1/2 right-2.5 size-4 -translate-y-1/2 text-muted"
      />
    </span>
  );
}
