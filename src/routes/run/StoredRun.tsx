import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { materialClasses } from '../../../shared/material.ts';
import type { RunResult } from '../../../shared/resultFormat.ts';
import type { SharedRun, UsedMaterial } from '../../../shared/run.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { usePlotHeight } from '../../components/plot/usePlotHeight.ts';
import { runDataQuery } from '../../features/runs/api/runData.ts';
import { RunPlot } from '../../features/runs/components/RunPlot.tsx';
import { ValueTable } from '../../features/runs/components/ValueTable.tsx';
import {
  describePlace,
  pointAt,
  sweptLayer,
  valuesNear,
  workingPlace,
} from '../../features/runs/model/sweepPlace.ts';
import { FilmDrawing } from '../../features/stacks/components/FilmDrawing.tsx';
import { isTransverse, workingVectors } from '../../features/stacks/model/magnetization.ts';
import { mediumName } from '../../features/stacks/model/media.ts';
import type { DrawnMaterial } from '../../features/stacks/model/media.ts';
import { usualFamilies } from '../../features/stacks/model/viewState.ts';
import { useReadingView } from './useReadingView.ts';

type Props = {
  run: SharedRun;
  /** Where its numbers are: `/runs/…` or `/shared/…`; null while there are none. */
  dataPath: string | null;
  /** In place of the plot while there are no numbers. */
  waiting: ReactNode;
  /** Right below the plot; it may compare the numbers with others. */
  besideFilm?: (loaded: { result: RunResult | null; layerName: string | null }) => ReactNode;
  /** Below film and plot, over the whole width. */
  children: ReactNode;
};

/**
 * A stored run: the film as it was, the values at the cursor, the curves. On a phone in this order, one below the
 * other. The drawing follows the cursor along an angle or a wavelength.
 */
export function StoredRun({ run, dataPath, waiting, besideFilm, children }: Props) {
  const [view, setView] = useReadingView();
  const [cursor, setCursor] = useState<number | null>(null);
  const data = useQuery({ ...runDataQuery(dataPath ?? ''), enabled: dataPath !== null });
  const materials = useMemo(() => drawnMaterials(run.materials), [run.materials]);
  const plotHeight = usePlotHeight(330);
  const { axis, document } = run;
  const layer = sweptLayer(axis, document);
  const layerName = layer && mediumName(layer.medium, materials);
  const result = data.data ?? null;
  const usual = usualFamilies(isTransverse(workingVectors(document, document.workingPoint.magnetization)));
  const near = result && valuesNear(result, cursor ?? workingPlace(axis, document) ?? axis.from);
  const point = near ? pointAt(axis, document.workingPoint, near.x) : document.workingPoint;
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
            kerr={kerrOf(near?.values[rotation], near?.values[ellipticity])}
            rangeNm={
              axis.kind === 'wavelength'
                ? [Math.min(axis.from, axis.to), Math.max(axis.from, axis.to)]
                : [point.wavelengthNm, point.wavelengthNm]
            }
            edit={null}
          />
        </section>
        {near && (
          <section aria-label="Readings" className="mt-3">
            <ValueTable
              place={describePlace(axis, near.x, layerName)}
              values={near.values}
              unit={view.unit}
            />
          </section>
        )}
      </div>
      <div className="min-w-0">
        <section aria-label="Plot">
          {result ? (
            <RunPlot
              run={run}
              result={result}
              view={view}
              usual={usual}
              onView={setView}
              onCursorX={setCursor}
              layerName={layerName}
              height={plotHeight}
            />
          ) : data.error ? (
            <ErrorState
              title="The values could not be loaded"
              error={data.error}
              onRetry={() => void data.refetch()}
            />
          ) : dataPath === null ? (
            waiting
          ) : (
            <LoadingState label="Loading the values" rows={8} />
          )}
        </section>
        {besideFilm?.({ result, layerName })}
      </div>
      <div className="min-w-0 lg:col-span-2">{children}</div>
    </div>
  );
}

/** The materials of a run as the drawing takes them, each as it was in the version that was used. */
function drawnMaterials(used: readonly UsedMaterial[]): ReadonlyMap<string, DrawnMaterial> {
  return new Map(
    used.map((material) => [
      material.id,
      {
        formula: material.formula,
        class: materialClasses.find((one) => one === material.class) ?? 'refractory',
        rangeNm: material.rangeNm,
        voigtRangeNm: material.voigtRangeNm,
        voigtConfidence: material.voigtSource?.confidence ?? null,
      },
    ]),
  );
}

function kerrOf(rotationDeg: number | undefined, ellipticityDeg: number | undefined) {
  const known = Number.isFinite(rotationDeg) && Number.isFinite(ellipticityDeg);
  return known ? { rotationDeg: rotationDeg ?? 0, ellipticityDeg: ellipticityDeg ?? 0 } : null;
}
