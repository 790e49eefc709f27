import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { AxisKind, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { FamilyControls, ScaleControls } from '../../../components/plot/ReadingControls.tsx';
import { ReadingPlot } from '../../../components/plot/ReadingPlot.tsx';
import { usePlotHeight } from '../../../components/plot/usePlotHeight.ts';
import { PlotButton } from '../../../components/plot/PlotToolbar.tsx';
import { families, readingsOf } from '../../../components/plot/readingView.ts';
import type { Light } from '../../../components/plot/readingView.ts';
import { fileNameOf, saveFile, toCsv } from '../../../components/plot/saveFile.ts';
import { Tabs } from '../../../components/Tabs.tsx';
import { formatCount, formatDuration } from '../../../lib/format.ts';
import { useSweep } from '../hooks/useSweep.ts';
import type { LiveSweep } from '../hooks/useSweep.ts';
import { findItem, isBlock, listLayers } from '../model/items.ts';
import { mediumName } from '../model/media.ts';
import type { Materials } from '../model/media.ts';
import { axisProblems, defaultAxis } from '../model/sweepAxis.ts';
import { usualFamilies } from '../model/viewState.ts';
import type { ViewState } from '../model/viewState.ts';
import { AxisForm } from './AxisForm.tsx';
import { SolveProblem } from './ReadingsStrip.tsx';

type Props = {
  title: string;
  document: StackDocument;
  materials: Materials;
  view: ViewState;
  /** What is swept; null where there is nothing to sweep. */
  axis: SweepAxis | null;
  transverse: boolean;
  /** What to know of the constants along the sweep. */
  notes: readonly string[];
  onView: (change: Partial<ViewState>) => void;
  /** The one primary button; absent for those who may not keep runs. */
  keep: ((sweep: { axis: SweepAxis; problem: boolean }) => ReactNode) | null;
};

/** Header, working point, readings and controls above the plot and its margin below, px. */
const PAGE_ABOVE_PLOT = 420;

const kinds = [
  { value: 'wavelength', label: 'wavelength' },
  { value: 'angle', label: 'angle' },
  { value: 'thickness', label: 'thickness' },
] as const;

/** The plot of the current question: which quantity is swept, over what, and which readings are drawn. */
export function SweepPanel({
  title,
  document,
  materials,
  view,
  axis,
  transverse,
  notes,
  onView,
  keep,
}: Props) {
  const plotHeight = usePlotHeight(PAGE_ABOVE_PLOT);
  const shown = view.shown ?? usualFamilies(transverse);
  const light: Light = view.light ?? view.point.input;
  const readings = useMemo(() => readingsOf(shown, light), [shown, light]);
  const sweep = useSweep(document, view.point, axis, readings);
  const layers = listLayers(document.layers).map((layer) => ({
    layer,
    name: mediumName(layer.medium, materials),
  }));
  const nameOf = (id: string) => layers.find(({ layer }) => layer.id === id)?.name;

  return (
    <section aria-label="Plot">
      <Tabs
        label="What is swept"
        value={view.kind}
        onValueChange={(kind) => onView({ kind, axis: null })}
        tabs={kinds}
        end={
          <>
            <span className="text-[13px] text-muted">{axis && <SweepNote sweep={sweep} axis={axis} />}</span>
            {axis &&
              keep?.({ axis, problem: Object.keys(axisProblems(axis)).length > 0 || sweep.error !== null })}
          </>
        }
      >
        {axis === null ? (
          <p className="card mt-1.5 px-4 py-10 text-center text-muted">
            There is no layer whose thickness could be swept. Add one to the drawing.
          </p>
        ) : (
          <div className="card mt-1.5 px-4 pt-2.5 pb-2">
            <div className="flex flex-wrap items-center justify-between gap-x-3 gap-y-1">
              <AxisForm
                axis={axis}
                layers={layers}
                onChange={(next) => onView({ axis: next })}
                onChooseLayer={(layerId) =>
                  onView({ axis: defaultAxis('thickness', document, materials, layerId) })
                }
              />
              <ScaleControls light={light} lights="ps" log={view.log} unit={view.unit} onChange={onView} />
            </div>
            <div className="mt-1 border-t border-line pt-1.5">
              {sweep.drawn ? (
                <div
                  className={`transition-opacity ${sweep.error ? 'opacity-45' : ''}`}
                  aria-busy={sweep.pending}
                >
                  <ReadingPlot
                    axis={sweep.drawn.axis}
                    layerName={
                      sweep.drawn.axis.kind === 'thickness' ? nameOf(sweep.drawn.axis.layerId) : undefined
                    }
                    grid={sweep.drawn.grid}
                    columns={sweep.drawn.columns}
                    readings={readings}
                    unit={view.unit}
                    log={view.log}
                    height={plotHeight}
                    marker={markerOf(sweep.drawn.axis, document, view)}
                    onPickX={
                      sweep.drawn.axis.kind === 'thickness' ? undefined : (x) => onView(picked(axis, x, view))
                    }
                    fileName={`${title} ${axis.kind}`}
                    controls={<FamilyControls families={families} shown={shown} onChange={onView} />}
                    downloads={
                      <PlotButton label="Download the values as CSV" onClick={() => saveCsv(title, sweep)}>
                        CSV
                      </PlotButton>
                    }
                  />
                </div>
              ) : (
                <div
                  className="flex items-center justify-center text-muted"
                  style={{ height: plotHeight + 36 }}
                  role="status"
                >
                  {sweep.error ? '' : 'Solving the film'}
                </div>
              )}
              {sweep.error && <SolveProblem error={sweep.error} />}
              {notes.map((note) => (
                <p key={note} className="text-small text-warn">
                  {note}
                </p>
              ))}
            </div>
          </div>
        )}
      </Tabs>
    </section>
  );
}

function markerOf(axis: SweepAxis, document: StackDocument, view: ViewState): number | undefined {
  switch (axis.kind) {
    case 'wavelength':
      return view.point.wavelengthNm;
    case 'angle':
      return view.point.angleDeg;
    case 'thickness': {
      const layer = findItem(document.layers, axis.layerId);
      return layer && !isBlock(layer) ? layer.thicknessNm : undefined;
    }
  }
}

/** The working point moved to where the plot was clicked, in steps that can be read. */
function picked(axis: SweepAxis, x: number, view: ViewState): Partial<ViewState> {
  const rounded = Number(x.toFixed(Math.abs(axis.to - axis.from) < 10 ? 3 : 1));
  const kind: AxisKind = axis.kind;
  return {
    point:
      kind === 'wavelength' ? { ...view.point, wavelengthNm: rounded } : { ...view.point, angleDeg: rounded },
  };
}

function SweepNote({ sweep, axis }: { sweep: LiveSweep; axis: SweepAxis }) {
  if (sweep.drawn === null) return null;
  const previewed = sweep.drawn.grid.length;
  const time = formatDuration(sweep.drawn.seconds);
  return axis.points > previewed
    ? `preview of ${formatCount(previewed)} points, ${time}`
    : `${formatCount(previewed)} points, ${time}`;
}

function saveCsv(title: string, { drawn }: LiveSweep): void {
  if (drawn === null) return;
  const unit = drawn.axis.kind === 'angle' ? 'Deg' : 'Nm';
  saveFile(
    fileNameOf(`${title} ${drawn.axis.kind}`, 'csv'),
    toCsv([
      { header: drawn.axis.kind + unit, values: drawn.grid },
      ...Object.entries(drawn.columns).map(([name, values]) => ({ header: csvHeader(name), values })),
    ]),
    'text/csv',
  );
}

/** Angles say their unit; the rest has none. */
function csvHeader(reading: string): string {
  return /^(rotation|ellipticity)/.test(reading) ? `${reading}Deg` : reading;
}
