import { CircleCheck, FlaskConical, Spline, TriangleAlert } from 'lucide-react';
import type { Confidence } from '../../../../shared/materialSource.ts';

const marks = {
  measured: { Icon: CircleCheck, look: 'border-edge text-ink' },
  fitted: { Icon: Spline, look: 'border-edge text-ink' },
  'from memory': { Icon: TriangleAlert, look: 'border-warn text-warn' },
  'invented for the demo': { Icon: FlaskConical, look: 'border-warn text-warn' },
} as const;

/** How far a constant can be trusted, as a word with a sign of its own. */
export function ConfidenceMark({ of }: { of: Confidence }) {
  const { Icon, look } = marks[of];
  return (
    <span
      className={`inline-flex items-center gap-1 rounded-box border px-1.5 text-small whitespace-nowrap ${look}`}
    >
      <Icon aria-hidden="true" className="size-3" />
      {of}
    </span>
  );
}
