import { useMemo } from 'react';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { SharedRun, SweepAxis } from '../../../../shared/run.ts';
import { AxesPlot } from '../../../components/plot/AxesPlot.tsx';
import type { SweptAxis } from '../../../components/plot/AxesPlot.tsx';
import { FamilyControls, ScaleControls } from '../../../components/plot/ReadingControls.tsx';
import { ReadingPlot } from '../../../components/plot/ReadingPlot.tsx';
import { ReadingSelect } from '../../../components/plot/ReadingSelect.tsx';
import { sweepXAxis } from '../../../components/plot/readingSeries.ts';
import { familiesOf, lightsOf, readingsOf } from '../../../components/plot/readingView.ts';
import type { Family, ReadingView } from '../../../components/plot/readingView.ts';
import { nearestIndex } from '../../../components/plot/curveValues.ts';
import { workingPlace } from '../model/sweepPlace.ts';
import type { GridPlace, NameOfTarget } from '../model/sweepPlace.ts';

type Props = {
  run: Pick<SharedRun, 'name' | 'axis' | 'second' | 'family' | 'document'>;
  result: RunResult;
  view: ReadingView;
  /** What is drawn until somebody chooses. */
  usual: readonly Family[];
  onView: (change: Partial<ReadingView>) => void;
  /** Told the point of the grid that is read, null when none. */
  onPlace: (place: Pick<GridPlace, 'ix' | 'iy'> | null) => void;
  /** Which of a family is shown, where only one can be. */
  member: number;
  onMember: (member: number) => void;
  /** Where somebody marked a value on the first axis; null for the place of the film itself. */
  mark: number | null;
  onMark: (x: number) => void;
  nameOf: NameOfTarget;
  height: number;
};

/** The curves or the map of a stored run. */
export function RunPlot(props: Props) {
  const { run, result, view, onView } = props;
  const stored = useMemo(() => result.header.readings.map(({ name }) => name), [result]);
  const families = useMemo(() => familiesOf(stored), [stored]);
  const lights = lightsOf(stored);
  const light = view.light ?? (lights === 'ps' ? run.document.workingPoint.input : lights);
  const several = result.second !== null || result.family !== null;
  return (
    <div className="card px-4 pt-2 pb-2">
      <div className="flex justify-end">
        <ScaleControls
          light={light}
          lights={several ? light : lights}
          log={view.log}
          unit={view.unit}
          onChange={onView}
        />
      </div>
      {several ? (
        <SeveralAxes {...props} families={families} light={light} />
      ) : (
        <OneAxis {...props} families={families} light={light} />
      )}
    </div>
  );
}

type PartProps = Props & { families: readonly Family[]; light: 'p' | 's' | 'ps' };

function OneAxis(props: PartProps) {
  const { run, result, view, usual, onView, onPlace, mark, onMark, nameOf, height, families, light } = props;
  const wanted = (view.shown ?? usual).filter((family) => families.includes(family));
  const shown = wanted.length > 0 ? wanted : families;
  const key = `${shown.join()} ${light}`;
  // The curves are made anew when the choice changes, not whenever its array does.
  const readings = useMemo(() => {
    const [chosen = '', lit = ''] = key.split(' ');
    const picked = families.filter((family) => chosen.split(',').includes(family));
    return readingsOf(picked, lit === 's' || lit === 'ps' ? lit : 'p');
  }, [key, families]);
  return (
    <ReadingPlot
      axis={run.axis}
      layerName={nameOf(run.axis)}
      grid={result.axis}
      columns={result.columns}
      readings={readings}
      unit={view.unit}
      log={view.log}
      height={height}
      marker={mark ?? workingPlace(run.axis, run.document) ?? undefined}
      onPickX={onMark}
      onCursorX={(x) => onPlace(x === null ? null : { ix: nearestIndex(result.axis, x), iy: 0 })}
      fileName={run.name}
      controls={<FamilyControls families={families} shown={shown} onChange={onView} />}
    />
  );
}

function SeveralAxes(props: PartProps) {
  const { run, result, view, usual, onView, onPlace, member, onMember, nameOf, height, families } = props;
  const choices = useMemo(() => readingsOf(families, 'ps'), [families]);
  const drawable = choices.filter((name) => result.columns[name] !== undefined);
  const light = props.light === 'ps' ? 'p' : props.light;
  const reading =
    drawable.find((name) => name === view.reading) ??
    drawable.find((name) => readingsOf(usual, light).includes(name)) ??
    drawable[0];
  const { axis, second, family } = run;
  const name = nameOf(axis);
  const x = useMemo(() => ({ axis, grid: result.axis, layerName: name }), [axis, result.axis, name]);
  const up = useSwept(second, result.second, nameOf);
  const members = useSwept(family, result.family, nameOf);
  const values = reading && result.columns[reading];
  const { done, pointCount } = result.header;
  if (!reading || !values)
    return <p className="py-10 text-center text-muted">This run has no curve to draw.</p>;
  return (
    <AxesPlot
      x={x}
      second={up}
      family={members}
      member={member}
      reading={reading}
      values={values}
      unit={view.unit}
      log={view.log}
      height={height}
      marker={{
        x: props.mark ?? workingPlace(axis, run.document),
        y: second ? workingPlace(second, run.document) : null,
      }}
      onCursor={onPlace}
      fileName={run.name}
      {...(done === undefined ? {} : { computed: done / pointCount })}
      controls={
        <>
          <ReadingSelect readings={drawable} value={reading} onChange={(next) => onView({ reading: next })} />
          {up && members && <MemberSelect family={members} member={member} onMember={onMember} />}
        </>
      }
    />
  );
}

function useSwept(
  axis: SweepAxis | undefined,
  grid: Float64Array | null,
  nameOf: NameOfTarget,
): SweptAxis | null {
  const layerName = axis && nameOf(axis);
  return useMemo(() => (axis && grid ? { axis, grid, layerName } : null), [axis, grid, layerName]);
}

type MemberProps = { family: SweptAxis; member: number; onMember: (member: number) => void };

/** Which map of a family of maps is shown. */
function MemberSelect({ family, member, onMember }: MemberProps) {
  const format = sweepXAxis(family.axis, family.layerName).format ?? String;
  return (
    <select
      aria-label="Map of the family"
      value={member}
      onChange={(event) => onMember(Number(event.target.value))}
      className="h-7 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-note text-ink"
    >
      {Array.from(family.grid, (value, index) => (
        <option key={value} value={index}>
          {format(value)}
        </option>
      ))}
    </select>
  );
}
