import type { StackMedium } from '../../../../shared/stack.ts';
import { plain } from '../model/sampleParts.ts';
import { Row, SampleQuantity } from './SampleQuantity.tsx';

type Props = {
  medium: StackMedium;
  name: string;
  onChange: (medium: StackMedium, edit: string) => void;
};

/** How the axes of a crystal or of a free tensor are turned: about z, then the new y, then the new z. */
export function AxesRow({ medium, name, onChange }: Props) {
  const angles = medium.orientationDeg ?? [0, 0, 0];
  return (
    <Row label="Axes turned (z, y, z)">
      {([0, 1, 2] as const).map((index) => (
        <SampleQuantity
          key={index}
          label={`turn ${index + 1} of the axes of ${name}`}
          unit="°"
          min={-360}
          max={360}
          step={1}
          value={Number(plain(angles[index]))}
          onChange={(value) => {
            const next: [number, number, number] = [...angles];
            next[index] = value;
            const { orientationDeg: _before, ...unturned } = medium;
            const turned = next.some((angle) => angle !== 0);
            onChange(turned ? { ...unturned, orientationDeg: next } : unturned, `turn ${index}`);
          }}
        />
      ))}
    </Row>
  );
}
