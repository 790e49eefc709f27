import type { PlotAxis, PlotSeries } from '../plotTypes.ts';

/** Values over two axes, the first one innermost: `values[iy * x.length + ix]`, NaN for none or not yet. */
export type MapData = { x: ArrayLike<number>; y: ArrayLike<number>; values: ArrayLike<number> };

/** What is mapped: its name, and the axis that its cut and its colour bar have. */
export type MapValue = { name: string; axis: PlotAxis } & Pick<PlotSeries, 'tone' | 'dash' | 'width'>;

/** A point of the grid. */
export type MapPlace = { ix: number; iy: number };
