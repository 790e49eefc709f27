import { useCallback, useMemo } from 'react';
import type { ReadingName, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { AxesPlot } from '../../../components/plot/AxesPlot.tsx';
import type { SweptAxis } from '../../../components/plot/AxesPlot.tsx';
import { PlotButton } from '../../../components/plot/PlotToolbar.tsx';
import { FamilyControls } from '../../../components/plot/ReadingControls.tsx';
import { ReadingPlot } from '../../../components/plot/ReadingPlot.tsx';
import { ReadingSelect } from '../../../components/plot/ReadingSelect.tsx';
import type { Family } from '../../../components/plot/readingView.ts';
import { fileNameOf, saveFile, toCsv } from '../../../components/plot/saveFile.ts';
import { useAngleFeatures } from '../hooks/useAngleFeatures.ts';
import type { LiveSweep } from '../hooks/useSweep.ts';
import { angleMarks } from '../model/angleMarks.ts';
import type { AngleMark } from '../model/angleMarks.ts';
import { targetName } from '../model/axisTargets.ts';
import { findItem, isBlock } from '../model/items.ts';
import type { Materials } from '../model/media.ts';
import type { Sweep } from '../model/solveStates.ts';
import type { ViewState } from '../model/viewState.ts';
import { AngleMarks } from './AngleMarks.tsx';
import { useLiveFilm } from './liveFilm.ts';

type Props = {
  title: string;
  document: StackDocument;
  materials: Materials;
  view: ViewState;
  /** Families that curves can be drawn of, and those that are. */
  offered: readonly Family[];
  shown: readonly Family[];
  /** Readings that a map or a family can show. */
  choices: readonly ReadingName[];
  height: number;
  /** Whether the film is being moved: the scales then stay as they are. */
  moving: boolean;
  onView: (change: Partial<ViewState>) => void;
};

/** The preview as it suits its axes: curves of several readings, a family of one reading, or a map of one. */
export function SweepFigure(props: Props) {
  const { title, document, materials, view, offered, shown, choices, height, moving, onView } = props;
  const { sweep } = useLiveFilm();
  const sweepsAngle = isAngleCurve(sweep.drawn);
  const features = useAngleFeatures(document, view.point, sweepsAngle);
  const marks = useMemo(
    () => (features && sweep.drawn ? angleMarks(features, sweep.drawn.readings) : noMarks),
    [features, sweep.drawn],
  );
  const { drawn, error, pending } = sweep;
  const layerName = drawn ? targetName(drawn.axis, document, materials) : undefined;
  const pick = useCallback(
    (x: number) => {
      if (drawn) onView({ point: picked(drawn.axis, x, view.point) });
    },
    [drawn, view.point, onView],
  );
  const marker = drawn ? markerOf(drawn.axis, document, view.point) : undefined;
  // Made anew when there is something to draw, not at every step of a pointer that moves the film.
  const curves = useMemo(
    () =>
      drawn && (
        <ReadingPlot
          axis={drawn.axis}
          layerName={layerName}
          grid={drawn.grid}
          columns={drawn.columns}
          readings={drawn.readings}
          unit={view.unit}
          log={view.log}
          height={height}
          steady={moving}
          marks={marks}
          marker={marker}
          onPickX={isPointAxis(drawn.axis) ? pick : undefined}
          fileName={`${title} ${drawn.axis.kind}`}
          controls={<FamilyControls families={offered} shown={shown} onChange={onView} />}
          downloads={
            <PlotButton label="Download the values as CSV" onClick={() => saveCsv(title, drawn)}>
              CSV
            </PlotButton>
          }
        />
      ),
    [
      drawn,
      layerName,
      view.unit,
      view.log,
      height,
      moving,
      marks,
      marker,
      pick,
      title,
      offered,
      shown,
      onView,
    ],
  );
  if (drawn === null) {
    return (
      <div
        className="flex items-center justify-center text-muted"
        style={{ height: height + 36 }}
        role="status"
      >
        {error ? '' : 'Solving the film'}
      </div>
    );
  }
  const { axis, grid, columns } = drawn;
  const swept = (one: Sweep['second']): SweptAxis | null =>
    one ? { ...one, layerName: targetName(one.axis, document, materials) } : null;
  const [reading] = drawn.readings;
  const values = reading && columns[reading];
  const several = drawn.second !== undefined || drawn.family !== undefined;
  return (
    <div className={`transition-opacity ${error ? 'opacity-45' : ''}`} aria-busy={pending}>
      {several && reading && values ? (
        <AxesPlot
          x={{ axis, grid, layerName }}
          second={swept(drawn.second)}
          family={swept(drawn.family)}
          member={0}
          reading={reading}
          values={values}
          unit={view.unit}
          log={view.log}
          height={height}
          marker={{
            x: marker ?? null,
            y: drawn.second ? (markerOf(drawn.second.axis, document, view.point) ?? null) : null,
          }}
          fileName={`${title} ${axis.kind}`}
          controls={
            <ReadingSelect
              readings={choices}
              value={reading}
              onChange={(next) => onView({ reading: next })}
            />
          }
        />
      ) : (
        curves
      )}
      {sweepsAngle && <AngleMarks marks={marks} />}
    </div>
  );
}

const noMarks: readonly AngleMark[] = [];

function isAngleCurve(drawn: LiveSweep['drawn']): boolean {
  return drawn !== null && drawn.axis.kind === 'angle' && !drawn.second && !drawn.family;
}

function isPointAxis({ kind }: SweepAxis): boolean {
  return kind === 'wavelength' || kind === 'angle';
}

function markerOf(axis: SweepAxis, document: StackDocument, point: WorkingPoint): number | undefined {
  switch (axis.kind) {
    case 'wavelength':
      return point.wavelengthNm;
    case 'angle':
      return point.angleDeg;
    case 'thickness': {
      const layer = findItem(document.layers, axis.layerId);
      return layer && !isBlock(layer) ? layer.thicknessNm : undefined;
    }
    case 'repeat': {
      const block = findItem(document.layers, axis.blockId);
      return block && isBlock(block) ? block.repeat : undefined;
    }
    case 'graded': {
      const layer = findItem(document.layers, axis.layerId);
      const below = layer && !isBlock(layer) ? layer.gradedNm : document.substrateGradedNm;
      return below ?? 0;
    }
    case 'voigtScale':
      return 1;
    case 'direction':
      return undefined;
  }
}

/** The working point moved to where the plot was clicked, in steps that can be read. */
function picked(axis: SweepAxis, x: number, point: WorkingPoint): WorkingPoint {
  const rounded = Number(x.toFixed(Math.abs(axis.to - axis.from) < 10 ? 3 : 1));
  return axis.kind === 'wavelength' ? { ...point, wavelengthNm: rounded } : { ...point, angleDeg: rounded };
}

const unitEndings = {
  wavelength: 'Nm',
  angle: 'Deg',
  thickness: 'Nm',
  direction: 'Deg',
  voigtScale: '',
  repeat: '',
  graded: 'Nm',
} as const;

function saveCsv(title: string, { axis, grid, columns }: NonNullable<LiveSweep['drawn']>): void {
  saveFile(
    fileNameOf(`${title} ${axis.kind}`, 'csv'),
    toCsv([
      { header: axis.kind + unitEndings[axis.kind], values: grid },
      ...Object.entries(columns).map(([name, values]) => ({ header: csvHeader(name), values })),
    ]),
    'text/csv',
  );
}

/** Angles say their unit; the rest has none. */
function csvHeader(reading: string): string {
  return /^(rotation|ellipticity)/.test(reading) ? `${reading}Deg` : reading;
}
