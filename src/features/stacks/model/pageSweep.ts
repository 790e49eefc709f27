import { LIMITS } from '../../../../shared/limits.ts';
import type { ReadingName, SweepAxes } from '../../../../shared/run.ts';
import { pointCountOf } from '../../../../shared/runAxes.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { families, readingsOf } from '../../../components/plot/readingView.ts';
import type { Family, Light } from '../../../components/plot/readingView.ts';
import type { Materials } from './media.ts';
import { fitsFilm } from './sweepAxis.ts';
import type { PreviewAxes } from './sweepAxis.ts';
import { axisOf, secondAxisOf, usualFamilies } from './viewState.ts';
import type { ViewState } from './viewState.ts';

/** Up to here a run stores every reading that the page can show; above, those that are drawn. */
const ALL_READINGS_UP_TO = 20_000;

/** The axes that the page draws over this film; null where none of them fits it. */
export function axesOf(view: ViewState, film: StackDocument, materials: Materials): PreviewAxes | null {
  const axis = axisOf(view, film, materials);
  if (axis === null) return null;
  const { family } = view;
  return {
    axis,
    second: secondAxisOf(view, axis, film, materials),
    family: family && fitsFilm(family, film) && !view.isMap ? family : null,
  };
}

/** What of a sweep is drawn, and what could be. */
export type DrawnReadings = {
  /** Families that curves can be drawn of, and those that are. */
  offered: readonly Family[];
  shown: readonly Family[];
  light: Light;
  /** Readings that a map or a family can show one of. */
  choices: readonly ReadingName[];
  /** Whether the sweep has more than one axis, so that one reading is drawn. */
  several: boolean;
  readings: readonly ReadingName[];
};

export function drawnReadings(
  view: Pick<ViewState, 'shown' | 'light' | 'reading' | 'point'>,
  several: boolean,
  transverse: boolean,
  averaged: boolean,
): DrawnReadings {
  const offered = offeredFamilies(averaged);
  const shown = view.shown ?? usualFamilies(transverse);
  const light = view.light ?? view.point.input;
  const choices = readingsOf(offered, 'ps');
  const usual = `${transverse ? 'contrast' : 'rotation'}${view.point.input === 's' ? 'S' : 'P'}`;
  const one = choices.find((name) => name === (view.reading ?? usual)) ?? 'reflectanceP';
  const readings = several
    ? [one]
    : readingsOf(
        shown.filter((family) => offered.includes(family)),
        light,
      );
  return { offered, shown, light, choices, several, readings };
}

/** The ceiling is of amplitudes, which averaged intensities have none of. */
function offeredFamilies(averaged: boolean): readonly Family[] {
  return families.filter((family) => !(averaged && family === 'ceiling'));
}

/** A short run stores all that the page can show, a long one what is drawn, a map at most six. */
export function keptReadings(
  sweep: SweepAxes,
  view: ViewState,
  transverse: boolean,
  averaged: boolean,
): ReadingName[] {
  const usual = usualFamilies(transverse);
  if (sweep.second) {
    const drawn = view.reading && !(averaged && view.reading === 'ceilingShare') ? [view.reading] : [];
    return [...new Set([...drawn, ...readingsOf(usual, 'ps')])].slice(0, LIMITS.mapReadings);
  }
  const all = offeredFamilies(averaged);
  if (pointCountOf(sweep) <= ALL_READINGS_UP_TO) return readingsOf(all, 'ps');
  return readingsOf(
    (view.shown ?? usual).filter((family) => all.includes(family)),
    view.light ?? view.point.input,
  );
}

/** Lowest and highest wavelength that the page asks for, nm. */
export function wavelengthRange(point: WorkingPoint, axes: PreviewAxes | null): readonly [number, number] {
  const swept = [axes?.axis, axes?.second, axes?.family].find((axis) => axis?.kind === 'wavelength');
  const all = swept ? [point.wavelengthNm, swept.from, swept.to] : [point.wavelengthNm];
  return [Math.min(...all), Math.max(...all)];
}
