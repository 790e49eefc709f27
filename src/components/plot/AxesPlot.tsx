import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { ReadingName, SweepAxis } from '../../../shared/run.ts';
import type { AngleUnit } from '../../lib/format.ts';
import { nearestIndex } from './curveValues.ts';
import { LinePlot } from './LinePlot.tsx';
import { MapPlot } from './map/MapPlot.tsx';
import type { MapPlace } from './map/mapTypes.ts';
import { oneReading, sweepXAxis } from './readingSeries.ts';
import type { PlotSeries } from './plotTypes.ts';

/** A swept quantity with its values, and what the swept layer is called. */
export type SweptAxis = { axis: SweepAxis; grid: ArrayLike<number>; layerName: string | undefined };

type Props = {
  x: SweptAxis;
  /** The second axis of a map. */
  second: SweptAxis | null;
  family: SweptAxis | null;
  /** Which of the family's maps is shown. */
  member: number;
  reading: ReadingName;
  /** First axis innermost, family outermost. */
  values: ArrayLike<number>;
  unit: AngleUnit;
  log: boolean;
  height: number;
  /** Where the working point stands on the axes. */
  marker: { x: number | null; y: number | null };
  onCursor?: ((place: MapPlace | null) => void) | undefined;
  fileName: string;
  controls?: ReactNode;
  downloads?: ReactNode;
  computed?: number;
};

/** One reading over several axes: a map over two, or a family of curves named at the curves. */
export function AxesPlot(props: Props) {
  return props.second ? <ReadingMap {...props} second={props.second} /> : <ReadingFamily {...props} />;
}

function ReadingMap(props: Props & { second: SweptAxis }) {
  const { x, second, member, reading, values, unit, marker, onCursor, fileName } = props;
  const { height, controls, downloads, computed } = props;
  const count = x.grid.length * second.grid.length;
  const one = useMemo(
    () => oneReading(reading, partOf(values, member * count, count), unit, false),
    [reading, values, member, count, unit],
  );
  const data = useMemo(
    () => one && { x: x.grid, y: second.grid, values: one.values },
    [one, x.grid, second.grid],
  );
  const value = useMemo(() => one && { ...one.look, axis: one.axis }, [one]);
  const xAxis = useMemo(() => sweepXAxis(x.axis, x.layerName), [x.axis, x.layerName]);
  const yAxis = useMemo(() => sweepXAxis(second.axis, second.layerName), [second.axis, second.layerName]);
  if (!data || !value) return null;
  return (
    <MapPlot
      data={data}
      xAxis={xAxis}
      yAxis={yAxis}
      value={value}
      height={height}
      marker={marker}
      fileName={fileName}
      controls={controls}
      downloads={downloads}
      {...(computed === undefined ? {} : { computed })}
      {...(onCursor ? { onCursor } : {})}
    />
  );
}

function ReadingFamily(props: Props) {
  const { x, family, reading, values, unit, log, marker, onCursor } = props;
  const { height, fileName, controls, downloads } = props;
  const drawn = useMemo(() => {
    const axis = family && sweepXAxis(family.axis, family.layerName);
    const count = x.grid.length;
    const curves = Array.from({ length: family?.grid.length ?? 1 }, (_, index) => {
      const one = oneReading(reading, partOf(values, index * count, count), unit, log);
      if (!one) return null;
      const name = axis?.format?.(family?.grid[index] ?? NaN) ?? one.look.name;
      const series: PlotSeries = { ...one.look, name, x: x.grid, y: one.values, dash: dashes[index % 3]! };
      return { series, axis: one.axis };
    });
    return curves.flatMap((curve) => curve ?? []);
  }, [x.grid, family, reading, values, unit, log]);
  const xAxis = useMemo(() => sweepXAxis(x.axis, x.layerName), [x.axis, x.layerName]);
  const [first] = drawn;
  const series = useMemo(() => drawn.map((curve) => curve.series), [drawn]);
  if (!first) return null;
  return (
    <LinePlot
      series={series}
      yAxes={[first.axis]}
      xAxis={xAxis}
      height={height}
      ariaLabel={`Family of curves against ${xAxis.label}`}
      fileName={fileName}
      controls={controls}
      downloads={downloads}
      {...(marker.x === null ? {} : { marker: marker.x })}
      {...(onCursor
        ? {
            onCursorX: (at: number | null) =>
              onCursor(at === null ? null : { ix: nearestIndex(x.grid, at), iy: 0 }),
          }
        : {})}
    />
  );
}

/** Neighbours of a family differ in their dash, so that curves can be followed where they cross. */
const dashes = ['solid', 'dashed', 'dotted'] as const;

/** A view where there can be one: a million values are not copied to be shown. */
function partOf(values: ArrayLike<number>, start: number, count: number): ArrayLike<number> {
  if (values instanceof Float64Array) return values.subarray(start, start + count);
  return Array.from({ length: count }, (_, index) => values[start + index] ?? NaN);
}
