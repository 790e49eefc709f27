import type { StackDocument } from '../../../../shared/stack.ts';
import { withSpread } from '../model/sampleParts.ts';
import type { EditFilm } from '../model/sampleParts.ts';
import { Row, SampleQuantity } from './SampleQuantity.tsx';

/** What light and film are not sharp in: standard deviations of a stated distribution. */
export function SpreadForm({ document, edit }: { document: StackDocument; edit: EditFilm }) {
  const {
    shape = 'normal',
    thicknessPercent = 0,
    divergenceDeg = 0,
    bandwidthNm = 0,
  } = document.spread ?? {};
  const change = (part: Parameters<typeof withSpread>[1], name: string) =>
    edit((now) => withSpread(now, part), name);
  return (
    <div className="flex flex-col gap-1 border-t border-line pt-2">
      <Row label="Spread, standard deviations">
        <select
          aria-label="Distribution of the spreads"
          value={shape}
          onChange={(event) =>
            change({ shape: event.target.value === 'uniform' ? 'uniform' : 'normal' }, 'spread shape')
          }
          className="h-7 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-ink"
        >
          <option value="normal">normal</option>
          <option value="uniform">uniform</option>
        </select>
      </Row>
      <Row label="Thickness, all layers together">
        <SampleQuantity
          label="spread of the thickness"
          unit="%"
          max={30}
          step={1}
          value={thicknessPercent}
          onChange={(value) => change({ thicknessPercent: value }, 'spread thickness')}
        />
      </Row>
      <Row label="Beam divergence">
        <SampleQuantity
          label="spread of the angle of incidence"
          unit="°"
          max={10}
          value={divergenceDeg}
          onChange={(value) => change({ divergenceDeg: value }, 'spread divergence')}
        />
      </Row>
      <Row label="Bandwidth">
        <SampleQuantity
          label="spread of the wavelength"
          unit="nm"
          max={200}
          step={1}
          value={bandwidthNm}
          onChange={(value) => change({ bandwidthNm: value }, 'spread bandwidth')}
        />
      </Row>
    </div>
  );
}
