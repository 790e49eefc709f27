/** Colours a curve may have; each stands for one kind of quantity all over the program. */
export type PlotTone = 'rotation' | 'ellipticity' | 'reflectance' | 'ink' | 'magnet' | 'accent';

export type PlotSeries = {
  /** Printed at the curve and beside its value. */
  name: string;
  /** Runs in one direction; a Float64Array of a million samples is fine. */
  x: ArrayLike<number>;
  /** As many values as x; NaN where there is none, which breaks the line. */
  y: ArrayLike<number>;
  tone: PlotTone;
  dash?: 'solid' | 'dashed' | 'dotted';
  /** Line width, px. */
  width?: number;
  /** Open markers along the line (the mark of s light). */
  symbol?: 'none' | 'open';
  /** Samples that the curve was made from, such as tabulated ones; drawn as small open marks, not read out. */
  points?: { x: ArrayLike<number>; y: ArrayLike<number> };
  /** Lower and upper edge at the x of the curve, such as a tolerance band; NaN where there is none. */
  band?: { low: ArrayLike<number>; high: ArrayLike<number> };
  /** Which of the y axes: 0 is on the left, the others on the right. */
  yAxisIndex?: number;
  /** A value as read out, unit included; as many digits as the axis needs when left out. */
  format?: (value: number) => string;
};

export type PlotAxis = {
  /** Name with unit, such as "angle of incidence (deg)". */
  label: string;
  /** Logarithmic; a y axis then shows absolute values. */
  log?: boolean;
  /** Values that the scale always encloses, such as 0. */
  include?: readonly number[];
  /** What the quantity cannot exceed; the scale does not run past it only to look tidy. */
  most?: number;
  /** A value as read out, unit included. */
  format?: (value: number) => string;
};

/** Pixels of the plotting area within the figure. */
export type PlotFrame = { left: number; right: number; top: number; bottom: number };

/** A place on x that has a name, such as an angle at which a curve passes through 0. */
export type PlotMark = { x: number; label: string };
