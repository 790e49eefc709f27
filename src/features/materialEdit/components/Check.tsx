type Props = { label: string; checked: boolean; onChange: (checked: boolean) => void };

/** A setting that is on or off. */
export function Check({ label, checked, onChange }: Props) {
  return (
    <label className="inline-flex w-fit items-center gap-2">
      <input
        type="checkbox"
        className="size-4 shrink-0 accent-accent"
        checked={checked}
        onChange={(event) => onChange(event.target.checked)}
      />
      {label}
    </label>
  );
}
