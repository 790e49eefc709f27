import { useQuery } from '@tanstack/react-query';
import { useCallback, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import type { RunResult } from '../../../shared/resultFormat.ts';
import type { SharedRun, SweepAxis } from '../../../shared/run.ts';
import type { WorkingPoint } from '../../../shared/stack.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { usePlotHeight } from '../../components/plot/usePlotHeight.ts';
import { partialRunDataQuery, runDataQuery } from '../../features/runs/api/runData.ts';
import { RunPlot } from '../../features/runs/components/RunPlot.tsx';
import { ValueTable } from '../../features/runs/components/ValueTable.tsx';
import {
  describeGridPlace,
  homePlace,
  placeAt,
  pointAt,
  valuesAt,
} from '../../features/runs/model/sweepPlace.ts';
import type { GridPlace } from '../../features/runs/model/sweepPlace.ts';
import { FilmDrawing } from '../../features/stacks/components/FilmDrawing.tsx';
import { isTransverse, workingVectors } from '../../features/stacks/model/magnetization.ts';
import { targetName } from '../../features/stacks/model/axisTargets.ts';
import { usualFamilies } from '../../features/stacks/model/viewState.ts';
import { drawnMaterials } from './drawnMaterials.ts';
import { markedPlaceIn } from './markedPlace.ts';
import { useMarkedPlace } from './useMarkedPlace.ts';
import { useReadingView } from './useReadingView.ts';

type Props = {
  run: SharedRun;
  /** Where its numbers are: `/runs/…` or `/shared/…`; null while there are none. */
  dataPath: string | null;
  /** Where a map is that is still being computed. */
  partialPath?: string | null;
  /** In place of the plot while there are no numbers. */
  waiting: ReactNode;
  /** Right below the plot; it may compare the numbers with others. */
  besideFilm?: (loaded: { result: RunResult | null; placeOf: (index: number) => string }) => ReactNode;
  /** Below film and plot, over the whole width. */
  children: ReactNode;
};

/**
 * A stored run: the film as it was, the values at the cursor, the curves. On a phone in this order, one below the
 * other. The drawing follows the cursor along an angle or a wavelength.
 */
export function StoredRun({ run, dataPath, partialPath = null, waiting, besideFilm, children }: Props) {
  const [view, setView] = useReadingView();
  const [cursor, setCursor] = useState<Pick<GridPlace, 'ix' | 'iy'> | null>(null);
  const [{ at, member }, setMarked] = useMarkedPlace();
  const data = useQuery({ ...runDataQuery(dataPath ?? ''), enabled: dataPath !== null });
  const materials = useMemo(() => drawnMaterials(run.materials), [run.materials]);
  const plotHeight = usePlotHeight(330);
  const partial = useQuery({ ...partialRunDataQuery(partialPath ?? ''), enabled: partialPath !== null });
  const { axis, second, document } = run;
  const nameOf = useCallback((one: SweepAxis) => targetName(one, document, materials), [document, materials]);
  const result = data.data ?? (partialPath === null ? null : (partial.data ?? null));
  const usual = usualFamilies(isTransverse(workingVectors(document, document.workingPoint.magnetization)));
  const home = result && homePlace(run, result, document);
  const place = home && result && { ...home, ...markedPlaceIn({ at, member }, result), ...cursor };
  const values = result && place ? valuesAt(result, place) : null;
  const point = result && place ? pointOf(run, result, place) : document.workingPoint;
  const swept = [axis, second, run.family].find((one) => one?.kind === 'wavelength');
  const rangeNm: readonly [number, number] = swept
    ? [Math.min(swept.from, swept.to), Math.max(swept.from, swept.to)]
    : [point.wavelengthNm, point.wavelengthNm];
  const [rotation, ellipticity] =
    point.input === 'p' ? (['rotationP', 'ellipticityP'] as const) : (['rotationS', 'ellipticityS'] as const);

  return (
    <div className="grid grid-cols-1 gap-x-8 gap-y-5 lg:grid-cols-[376px_minmax(0,1fr)]">
      <div className="min-w-0">
        <section aria-label="Film">
          <FilmDrawing
            document={document}
            materials={materials}
            point={point}
            kerr={kerrOf(values?.[rotation], values?.[ellipticity])}
            rangeNm={rangeNm}
            edit={null}
          />
        </section>
        {values && result && place && (
          <section aria-label="Readings" className="mt-3">
            <ValueTable
              place={describeGridPlace(run, result, place, nameOf)}
              values={values}
              unit={view.unit}
            />
          </section>
        )}
      </div>
      <div className="min-w-0">
        <section aria-label="Plot">
          {partialPath !== null && <div className="mb-3">{waiting}</div>}
          {result && place ? (
            <RunPlot
              run={run}
              result={result}
              view={view}
              usual={usual}
              onView={setView}
              onPlace={setCursor}
              member={place.member}
              onMember={(next) => setMarked({ member: next })}
              mark={at}
              onMark={(x) => setMarked({ at: x })}
              nameOf={nameOf}
              height={plotHeight}
            />
          ) : data.error ? (
            <ErrorState
              title="The values could not be loaded"
              error={data.error}
              onRetry={() => void data.refetch()}
            />
          ) : dataPath === null ? (
            partialPath === null && waiting
          ) : (
            <LoadingState label="Loading the values" rows={8} />
          )}
        </section>
        {besideFilm?.({
          result: data.data ?? null,
          placeOf: (index) => (result ? describeGridPlace(run, result, placeAt(result, index), nameOf) : ''),
        })}
      </div>
      <div className="min-w-0 lg:col-span-2">{children}</div>
    </div>
  );
}

/** The working point moved to a point of the grid, as far as an axis moves it. */
function pointOf(run: SharedRun, result: RunResult, { ix, iy, member }: GridPlace): WorkingPoint {
  const moves = [
    [run.axis, result.axis[ix]],
    [run.second, result.second?.[iy]],
    [run.family, result.family?.[member]],
  ] as const;
  return moves.reduce(
    (point, [axis, x]) => (axis && x !== undefined ? pointAt(axis, point, x) : point),
    run.document.workingPoint,
  );
}

function kerrOf(rotationDeg: number | undefined, ellipticityDeg: number | undefined) {
  const known = Number.isFinite(rotationDeg) && Number.isFinite(ellipticityDeg);
  return known ? { rotationDeg: rotationDeg ?? 0, ellipticityDeg: ellipticityDeg ?? 0 } : null;
}
