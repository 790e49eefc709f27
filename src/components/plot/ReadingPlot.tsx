import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { ReadingName, SweepAxis } from '../../../shared/run.ts';
import type { AngleUnit } from '../../lib/format.ts';
import { LinePlot } from './LinePlot.tsx';
import type { PlotMark } from './plotTypes.ts';
import { readingSeries, sweepXAxis } from './readingSeries.ts';
import { useSteadyAxes } from './useSteadyAxes.ts';

type Props = {
  axis: SweepAxis;
  /** What the swept layer is called, for a thickness axis. */
  layerName?: string | undefined;
  grid: ArrayLike<number>;
  columns: Partial<Record<ReadingName, ArrayLike<number>>>;
  /** Which of them to draw. */
  readings: readonly ReadingName[];
  unit: AngleUnit;
  log: boolean;
  height: number;
  marker?: number | undefined;
  onPickX?: ((x: number) => void) | undefined;
  onCursorX?: ((x: number | null) => void) | undefined;
  /** Whether the curves are being moved: the scales then stay as they are. */
  steady?: boolean | undefined;
  /** Places on x with a name. */
  marks?: readonly PlotMark[] | undefined;
  fileName: string;
  controls?: ReactNode;
  downloads?: ReactNode;
  renderer?: 'canvas' | 'svg';
};

/** Readings along a sweep, drawn as everywhere in the program. */
export function ReadingPlot(props: Props) {
  const { axis, layerName, grid, columns, readings, unit, log, marker, onPickX, onCursorX, ...others } =
    props;
  const { steady = false, marks, ...rest } = others;
  const data = useMemo(
    () => readingSeries(grid, columns, readings, unit, log),
    [grid, columns, readings, unit, log],
  );
  const yAxes = useSteadyAxes(data, steady);
  const xAxis = useMemo(() => sweepXAxis(axis, layerName), [axis, layerName]);
  return (
    <LinePlot
      {...rest}
      series={data.series}
      yAxes={yAxes}
      xAxis={xAxis}
      ariaLabel={`Readings against ${xAxis.label}`}
      {...(marks ? { marks } : {})}
      {...(marker === undefined ? {} : { marker })}
      {...(onPickX ? { onPickX } : {})}
      {...(onCursorX ? { onCursorX } : {})}
    />
  );
}
