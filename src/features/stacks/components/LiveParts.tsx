import { useMemo } from 'react';
import type { ComponentProps } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { Polarization, StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { issueTarget } from '../model/issueTarget.ts';
import { kerrAngles } from '../model/solveStates.ts';
import { ceilingCell } from '../model/stripReadings.ts';
import { FilmDrawing } from './FilmDrawing.tsx';
import { useLiveFilm } from './liveFilm.ts';
import { ReadingsStrip } from './ReadingsStrip.tsx';
import { WorkingPointBar } from './WorkingPointBar.tsx';

/* The parts of the stack page that show what the numeric core says of the film. */

type DrawingProps = Omit<ComponentProps<typeof FilmDrawing>, 'kerr' | 'issues'>;

export function LiveDrawing(props: DrawingProps) {
  const { live, issues } = useLiveFilm();
  const kerr = useMemo(
    () => kerrAngles(live.readings, props.point.input),
    [live.readings, props.point.input],
  );
  return <FilmDrawing {...props} kerr={kerr} issues={issues} />;
}

type StripProps = {
  input: Polarization;
  transverse: boolean;
  unit: AngleUnit;
  /** Whether any layer has an m other than 0. */
  magnetized: boolean;
  averaged: boolean;
};

export function LiveStrip({ magnetized, ...props }: StripProps) {
  const { live } = useLiveFilm();
  const ceiling = useMemo(
    () => ceilingCell(live.readings, magnetized, props.averaged),
    [live.readings, magnetized, props.averaged],
  );
  return <ReadingsStrip {...props} live={live} ceiling={ceiling} />;
}

type PointProps = {
  document: StackDocument;
  point: WorkingPoint;
  onChange: (change: Partial<WorkingPoint>) => void;
};

export function LivePointBar({ document, point, onChange }: PointProps) {
  const { issues } = useLiveFilm();
  const problems = useMemo(() => pointProblems(document, issues), [document, issues]);
  return <WorkingPointBar point={point} problems={problems} onChange={onChange} />;
}

const noProblems = {};

function pointProblems(document: StackDocument, issues: readonly Issue[]) {
  // The same object while there is nothing to say, so that the bar is not drawn at every step of a drag.
  if (issues.length === 0) return noProblems;
  const find = (field: string) =>
    issues.find(({ path }) => {
      const target = issueTarget(document, path);
      return target.place === 'point' && target.field === field;
    })?.message;
  return { wavelengthNm: find('wavelengthNm'), angleDeg: find('angleDeg') };
}
