import type { ReactNode } from 'react';
import { Quantity } from '../../../components/Quantity.tsx';

/** A line of the panel: what it is, and its controls at the right. */
export function Row({ label, children }: { label: ReactNode; children: ReactNode }) {
  return (
    <div className="flex min-h-7 flex-wrap items-center justify-between gap-x-2">
      <span className="text-muted">{label}</span>
      <span className="inline-flex flex-wrap items-center gap-1">{children}</span>
    </div>
  );
}

type Props = {
  label: string;
  unit: string;
  value: number;
  min?: number;
  max?: number;
  step?: number;
  onChange: (value: number) => void;
};

/** A number of the panel, on the ground that says it can be changed. */
export function SampleQuantity({ min = 0, step = 0.1, ...rest }: Props) {
  return <Quantity {...rest} min={min} step={step} className="[&>span:first-child]:bg-paper" />;
}

type CheckProps = { label: string; checked: boolean; onChange: (checked: boolean) => void };

/** A setting that is on or off. */
export function Check({ label, checked, onChange }: CheckProps) {
  return (
    <label className="inline-flex w-fit items-center gap-2">
      <input
        type="checkbox"
        checked={checked}
        onChange={(event) => onChange(event.target.checked)}
        className="accent-accent"
      />
      {label}
    </label>
  );
}
