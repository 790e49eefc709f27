import { useQuery } from '@tanstack/react-query';
import { useCallback, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { materialClasses } from '../../../shared/material.ts';
import type { RunResult } from '../../../shared/resultFormat.ts';
import type { SharedRun, SweepAxis, UsedMaterial } from '../../../shared/run.ts';
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
import { versionKey } from '../../features/stacks/model/media.ts';
import type { DrawnMaterial, Materials } from '../../features/stacks/model/media.ts';
import { usualFamilies } from '../../features/stacks/model/viewState.ts';
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
  const [member, setMember] = useState<number | null>(null);
  const data = useQuery({ ...runDataQuery(dataPath ?? ''), enabled: dataPath !== null });
  const materials = useMemo(() => drawnMaterials(run.materials), [run.materials]);
  const plotHeight = usePlotHeight(330);
  const partial = useQuery({ ...partialRunDataQuery(partialPath ?? ''), enabled: partialPath !== null });
  const { axis, second, document } = run;
  const nameOf = useCallback((one: SweepAxis) => targetName(one, document, materials), [document, materials]);
  const result = data.data ?? (partialPath === null ? null : (partial.data ?? null));
  const usual = usualFamilies(isTransverse(workingVectors(document, document.workingPoint.magnetization)));
  const home = result && homePlace(run, result, document);
  const place = home && { ...home, ...cursor, ...(member === null ? {} : { member }) };
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
              onMember={setMember}
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

/** The materials of a run as the drawing takes them, each as it was in the version that was used. */
function drawnMaterials(used: readonly UsedMaterial[]): Materials {
  return new Map(
    used.flatMap((material) => {
      const drawn: DrawnMaterial = {
        version: material.version,
        formula: material.formula,
        class: materialClasses.find((one) => one === material.class) ?? 'refractory',
        rangeNm: material.rangeNm,
        voigtRangeNm: material.voigtRangeNm,
        voigtConfidence: material.voigtSource?.confidence ?? null,
        // The drawing of a stored run shows each m as it was given; it does not ask what could be magnetic.
        anisotropy: null,
      };
      return [[material.id, drawn] as const, [versionKey(material.id, material.version), drawn] as const];
    }),
  );
}

function kerrOf(rotationDeg: number | undefined, ellipticityDeg: number | undefined) {
  const known = Number.isFinite(rotationDeg) && Number.isFinite(ellipticityDeg);
  return known ? { rotationDeg: rotationDeg ?? 0, ellipticityDeg: ellipticityDeg ?? 0 } : null;
}
