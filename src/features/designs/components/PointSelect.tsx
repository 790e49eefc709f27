import type { DesignPoint } from '../../../../shared/designPoint.ts';
import { Select } from '../../../components/Select.tsx';

type Props = { points: readonly DesignPoint[]; value: string; onChange: (pointId: string) => void };

/** Which working point is shown; nothing to choose where there is one. */
export function PointSelect({ points, value, onChange }: Props) {
  if (points.length < 2) return <span className="text-note text-muted">{points[0]?.label}</span>;
  return (
    <Select
      aria-label="Working point shown"
      value={value}
      options={points.map(({ id, label }) => ({ value: id, label }))}
      onValueChange={onChange}
    />
  );
}
