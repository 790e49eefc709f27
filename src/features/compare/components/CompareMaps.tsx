import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { ReadingName } from '../../../../shared/run.ts';
import { colourDomain, extremesOf } from '../../../components/plot/map/mapRange.ts';
import type { Extremes } from '../../../components/plot/map/mapRange.ts';
import { MapPlot } from '../../../components/plot/map/MapPlot.tsx';
import type { MapData } from '../../../components/plot/map/mapTypes.ts';
import { useMapLook } from '../../../components/plot/map/useMapLook.ts';
import { PlotButton } from '../../../components/plot/PlotToolbar.tsx';
import type { PlotAxis } from '../../../components/plot/plotTypes.ts';
import { oneReading } from '../../../components/plot/readingSeries.ts';
import { fileNameOf, saveFile } from '../../../components/plot/saveFile.ts';
import { formatCount, formatNumber } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { placeOnAxis } from '../../../lib/placeOnAxis.ts';
import { mapsCsv } from '../model/comparedCsv.ts';
import { lookOf } from '../model/comparedCurves.ts';
import type { Relation } from '../model/curveDifference.ts';
import { relateMaps } from '../model/mapDifference.ts';
import type { ComparedMap } from '../model/mapDifference.ts';
import { relationColours } from '../model/relationColours.ts';
import { pairName } from '../model/slicePairs.ts';
import { RelationSelect } from './RelationSelect.tsx';

type Props = {
  base: ComparedMap;
  others: readonly ComparedMap[];
  /** Which of the others is shown beside the reference. */
  shown: ComparedMap;
  onShown: (runId: string) => void;
  axes: { x: PlotAxis; y: PlotAxis };
  reading: ReadingName;
  relation: Relation;
  /** At what the maps and families are taken, in words. */
  held: readonly string[];
  unit: AngleUnit;
  height: number;
  onRelation: (relation: Relation) => void;
  /** Reading and unit. */
  controls: ReactNode;
  /** The SVG renderer is for tests: jsdom has no canvas. */
  renderer?: 'canvas' | 'svg';
};

/** Two maps beside each other on one colour scale, and below what the one is against the other. All move together. */
export function CompareMaps(props: Props) {
  const { base, others, shown, onShown, axes, reading, relation, held, unit, height } = props;
  const { onRelation, controls, renderer = 'canvas' } = props;
  const look = useMapLook();
  const left = useMemo(() => scaledMap(base, reading, unit), [base, reading, unit]);
  const right = useMemo(() => scaledMap(shown, reading, unit), [shown, reading, unit]);
  const colours = useMemo(
    () => colourDomain(together([left, right].map((one) => one && extremesOf(one.data)))),
    [left, right],
  );
  const related = useMemo(() => {
    const map = relateMaps(base, shown, reading, relation);
    const drawn = relation === 'ratio' ? map : { ...map, values: inUnit(map.values, reading, unit) };
    const reference = inUnit(base.data.values, reading, unit);
    return { data: drawn, colours: relationColours(relation, drawn.values, reference) };
  }, [base, shown, reading, relation, unit]);
  const marker = useMemo(() => {
    const { axes: swept, of } = base.slice;
    const [x, y] = swept.map(({ axis }) => placeOnAxis(axis, of.run.document));
    return { x: x ?? null, y: y ?? null };
  }, [base]);
  const name = pairName({ base: base.slice, other: shown.slice }, relation);
  const value = useMemo(
    () =>
      left && {
        ...left.value,
        name,
        axis: relation === 'ratio' ? ratioAxis : { ...left.value.axis, most: Infinity },
      },
    [left, name, relation],
  );
  if (!left || !right || !value) return null;
  const shared = { xAxis: axes.x, yAxis: axes.y, look, marker, renderer };
  const letter = base.slice.of.letter;
  const saveCsv = () =>
    saveFile(
      fileNameOf(`compare ${reading} ${relation}`, 'csv'),
      mapsCsv(base, others, { reading, relation, unit, held }),
      'text/csv',
    );
  return (
    <div className="card px-4 pt-2 pb-2">
      <div className="mb-1 flex flex-wrap items-center gap-1">
        {controls}
        {others.length > 1 && <OtherSelect others={others} shown={shown} onShown={onShown} />}
        <span className="ml-auto">
          <PlotButton label="Download all compared maps as CSV" onClick={saveCsv}>
            CSV of all
          </PlotButton>
        </span>
      </div>
      <div className="grid grid-cols-1 gap-x-6 gap-y-3 lg:grid-cols-2">
        {[left, right].map((one, index) => (
          <MapPlot
            key={index === 0 ? 'reference' : 'other'}
            {...shared}
            data={one.data}
            value={one.value}
            colours={colours}
            height={height}
            withCut={false}
            fileName={`compare ${one.value.name}`}
            controls={
              <span className="text-note">
                <span className="font-semibold">{one.value.name}</span>
                {index > 0 && ` on the grid of ${letter}`}
              </span>
            }
          />
        ))}
      </div>
      <div className="mt-2 border-t border-line pt-2">
        <MapPlot
          {...shared}
          data={related.data}
          value={value}
          colours={related.colours}
          height={height}
          fileName={`compare ${reading} ${relation}`}
          controls={<RelationSelect value={relation} onChange={onRelation} letter={letter} />}
        />
        {related.colours.beyond > 0 && (
          <p className="text-small text-muted">
            The colours end at ratios of {formatNumber(related.colours.low)} and{' '}
            {formatNumber(related.colours.high)}; {formatCount(related.colours.beyond)} points lie beyond.
          </p>
        )}
      </div>
    </div>
  );
}

const ratioAxis: PlotAxis = { label: 'ratio', include: [1], format: (value) => formatNumber(value) };

function inUnit(values: ArrayLike<number>, reading: ReadingName, unit: AngleUnit): ArrayLike<number> {
  return oneReading(reading, values, unit, false)?.values ?? values;
}

function scaledMap({ slice, data }: ComparedMap, reading: ReadingName, unit: AngleUnit) {
  const one = oneReading(reading, data.values, unit, false);
  if (!one) return null;
  const scaled: MapData = { ...data, values: one.values };
  const { name: title } = lookOf(slice, reading);
  return { data: scaled, value: { ...one.look, name: `${title}: ${one.look.name}`, axis: one.axis } };
}

/** The ends of several maps; their places mean nothing then. */
function together(all: readonly (Extremes | null)[]): Extremes | null {
  const there = all.flatMap((one) => one ?? []);
  const [first] = there;
  if (!first) return null;
  return there.reduce(
    ({ least, most }, one) => ({
      least: one.least.value < least.value ? one.least : least,
      most: one.most.value > most.value ? one.most : most,
    }),
    first,
  );
}

type OtherProps = Pick<Props, 'others' | 'shown' | 'onShown'>;

function OtherSelect({ others, shown, onShown }: OtherProps) {
  return (
    <select
      aria-label="Map beside the reference"
      value={shown.slice.of.run.id}
      onChange={(event) => onShown(event.target.value)}
      className="h-7 max-w-full field-sizing-content rounded-box border border-line bg-panel px-1.5 text-note text-ink"
    >
      {others.map(({ slice: { of, phrases } }) => (
        <option key={of.run.id} value={of.run.id}>
          {`${of.letter} ${phrases.join(', ')}`}
        </option>
      ))}
    </select>
  );
}
