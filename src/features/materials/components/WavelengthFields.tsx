import { useState } from 'react';
import { TextInput } from '../../../components/TextInput.tsx';
import { parseNumber } from '../../../lib/parseNumber.ts';
import type { MaterialFilter } from '../model/materialFilter.ts';

type Ends = Pick<MaterialFilter, 'fromNm' | 'toNm'>;

/** The wavelengths that n and k must cover; either may stay empty. */
export function WavelengthFields({
  filter,
  onChange,
}: {
  filter: Ends;
  onChange: (change: Partial<Ends>) => void;
}) {
  return (
    <fieldset className="flex flex-col gap-1">
      <legend className="float-left text-note font-semibold">Covers (nm)</legend>
      <span className="flex items-center gap-1.5">
        <WavelengthInput
          label="Covers from, nm"
          placeholder="from"
          value={filter.fromNm}
          onChange={(fromNm) => onChange({ fromNm })}
        />
        <span aria-hidden="true" className="text-muted">
          –
        </span>
        <WavelengthInput
          label="Covers to, nm"
          placeholder="to"
          value={filter.toNm}
          onChange={(toNm) => onChange({ toNm })}
        />
      </span>
    </fieldset>
  );
}

type InputProps = {
  label: string;
  placeholder: string;
  value: number | null;
  onChange: (value: number | null) => void;
};

/** A wavelength or nothing. What cannot be one is marked and not asked for. */
function WavelengthInput({ label, placeholder, value, onChange }: InputProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const plain = value === null ? '' : String(value);
  const text = draft ?? plain;
  const typed = parseNumber(text);
  const wrong = text.trim() !== '' && (typed === null || typed <= 0);
  const take = (next: string) => {
    setDraft(next);
    const number = parseNumber(next);
    onChange(number !== null && number > 0 ? number : null);
  };
  return (
    <TextInput
      aria-label={label}
      aria-invalid={wrong || undefined}
      title={wrong ? 'Must be a wavelength in nm, above 0' : undefined}
      inputMode="decimal"
      autoComplete="off"
      placeholder={placeholder}
      className="w-20!"
      value={text}
      onChange={(event) => take(event.target.value)}
      onBlur={() => setDraft(null)}
    />
  );
}
