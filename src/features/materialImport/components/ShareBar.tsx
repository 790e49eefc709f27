type ShareBarProps = {
  label: string;
  /** 0..1 */
  share: number;
};

/** How far something of a short while has come. */
export function ShareBar({ label, share }: ShareBarProps) {
  const percent = Math.round(share * 100);
  return (
    <div className="flex flex-col gap-1">
      <span className="flex justify-between gap-3">
        <span className="font-medium">{label}</span>
        <span className="text-note text-muted">{percent} %</span>
      </span>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
        className="h-1.5 overflow-hidden rounded-full bg-line"
      >
        <div className="h-full rounded-full bg-accent transition-[width]" style={{ width: `${percent}%` }} />
      </div>
    </div>
  );
}
