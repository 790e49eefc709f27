type LoadingStateProps = {
  /** What is being loaded, for screen readers: "Loading stacks". */
  label: string;
  rows?: number;
};

/** Grey lines where the content will stand. */
export function LoadingState({ label, rows = 4 }: LoadingStateProps) {
  return (
    <div role="status" className="flex flex-col gap-3 py-2">
      <span className="sr-only">{label}</span>
      {Array.from({ length: rows }, (_, row) => (
        <div
          key={row}
          aria-hidden="true"
          className="h-5 animate-pulse rounded-box bg-line"
          style={{ width: `${92 - ((row * 17) % 40)}%` }}
        />
      ))}
    </div>
  );
}
