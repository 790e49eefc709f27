/** The mark of the product: polarization before and after, an upright stroke and a tilted one. */
export function Mark({ size = 24 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 24 24" aria-hidden="true">
      <line x1="7" y1="3" x2="7" y2="21" stroke="var(--muted)" strokeWidth="2.2" strokeLinecap="round" />
      <line
        x1="12"
        y1="3.5"
        x2="18"
        y2="20.5"
        stroke="var(--accent)"
        strokeWidth="2.6"
        strokeLinecap="round"
      />
    </svg>
  );
}
