import type { ReactNode } from 'react';
import { pointCountOf } from '../../../../shared/runAxes.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { ScaleControls } from '../../../components/plot/ReadingControls.tsx';
import { usePlotHeight } from '../../../components/plot/usePlotHeight.ts';
import { Tabs } from '../../../components/Tabs.tsx';
import { formatCount, formatDuration } from '../../../lib/format.ts';
import { axesProblem } from '../model/axesProblem.ts';
import type { Materials } from '../model/media.ts';
import type { DrawnReadings } from '../model/pageSweep.ts';
import { axisProblems, defaultAxis, sweepableKinds, withFewerPoints } from '../model/sweepAxis.ts';
import type { PreviewAxes } from '../model/sweepAxis.ts';
import type { ViewState } from '../model/viewState.ts';
import { AxesForm } from './AxesForm.tsx';
import { useLiveFilm } from './liveFilm.ts';
import { SolveProblem } from './ReadingsStrip.tsx';
import { SweepFigure } from './SweepFigure.tsx';

type Props = {
  title: string;
  document: StackDocument;
  materials: Materials;
  view: ViewState;
  /** What is swept; null where there is nothing to sweep. */
  axes: PreviewAxes | null;
  /** What of the sweep is drawn. */
  drawn: DrawnReadings;
  /** Whether the film is being moved. */
  moving: boolean;
  /** What to know of the constants along the sweep. */
  notes: readonly string[];
  onView: (change: Partial<ViewState>) => void;
  /** The one primary button; absent for those who may not keep runs. */
  keep: ((sweep: { axes: PreviewAxes; problem: boolean }) => ReactNode) | null;
};

/** Header, working point, readings and controls above the plot and its margin below, px. */
const PAGE_ABOVE_PLOT = 420;

const tabs = [
  { value: 'wavelength', label: 'wavelength' },
  { value: 'angle', label: 'angle' },
  { value: 'thickness', label: 'thickness' },
  { value: 'direction', label: 'magnetization' },
  { value: 'map', label: 'two axes' },
  { value: 'more', label: 'more' },
] as const;

type Tab = (typeof tabs)[number]['value'];

const moreKinds = ['voigtScale', 'repeat', 'graded'] as const;

/** The plot of the current question: which quantity is swept, over what, and which readings are drawn. */
export function SweepPanel(props: Props) {
  const { title, document, materials, view, axes, drawn, moving, notes, onView, keep } = props;
  const plotHeight = usePlotHeight(PAGE_ABOVE_PLOT);
  const { offered, shown, choices, light, several } = drawn;
  const between = axes && axesProblem(axes);
  const tab = tabOf(view);
  const kinds = tab === 'more' || tab === 'map' ? sweepableKinds(document) : [];

  return (
    <section aria-label="Plot">
      <Tabs
        label="What is swept"
        value={tab}
        onValueChange={(next) => onView(viewOfTab(next, props))}
        tabs={tabs}
        end={
          <>
            <span className="text-[13px] text-muted">{axes && <SweepNote axes={axes} />}</span>
            {axes && keep && (
              <KeepSweep axes={axes} problem={hasProblem(axes) || between !== null} keep={keep} />
            )}
          </>
        }
      >
        {axes === null ? (
          <p className="card mt-1.5 px-4 py-10 text-center text-muted">{nothingToSweep(view)}</p>
        ) : (
          <div className="card mt-1.5 px-4 pt-2.5 pb-2">
            <div className="flex flex-wrap items-start justify-between gap-x-3 gap-y-1">
              <AxesForm
                document={document}
                materials={materials}
                axes={axes}
                kinds={tab === 'more' ? kinds.filter(isMoreKind) : kinds}
                onView={onView}
              />
              <ScaleControls
                light={light}
                lights={several ? light : 'ps'}
                log={view.log}
                unit={view.unit}
                onChange={onView}
              />
            </div>
            {between && <p className="text-small text-danger">{between}</p>}
            <div className="mt-1 border-t border-line pt-1.5">
              <SweepFigure
                title={title}
                document={document}
                materials={materials}
                view={view}
                offered={offered}
                shown={shown}
                choices={choices}
                height={plotHeight}
                moving={moving}
                onView={onView}
              />
              <SweepProblem />
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

function isMoreKind(kind: string): boolean {
  return moreKinds.some((one) => one === kind);
}

function tabOf({ isMap, kind }: ViewState): Tab {
  if (isMap) return 'map';
  return tabs.find(({ value }) => value === kind)?.value ?? 'more';
}

/** The view that a tab opens: a map starts from the axis on the page, everything else from the default of its kind. */
function viewOfTab(tab: Tab, { axes, document, materials, view }: Props): Partial<ViewState> {
  if (tab === 'map') {
    const axis = axes?.axis ?? defaultAxis('angle', document, materials);
    if (!axis) return { isMap: true, family: null };
    return { isMap: true, kind: axis.kind, axis: withFewerPoints(axis, 'map'), second: null, family: null };
  }
  const possible = sweepableKinds(document);
  const kind = tab === 'more' ? (moreKinds.find((one) => possible.includes(one)) ?? 'graded') : tab;
  return { isMap: false, kind, axis: null, family: view.family?.kind === kind ? null : view.family };
}

function nothingToSweep({ kind }: ViewState): string {
  switch (kind) {
    case 'direction':
    case 'voigtScale':
      return 'No layer of this film is magnetic. Choose a material that has a Q.';
    case 'repeat':
      return 'There is no repeated block in this film. Make one from the menu of a layer.';
    default:
      return 'There is no layer to sweep here. Add one to the drawing.';
  }
}

function hasProblem({ axis, second, family }: PreviewAxes): boolean {
  return [axis, second, family].some((one) => one !== null && Object.keys(axisProblems(one)).length > 0);
}

type KeepProps = { axes: PreviewAxes; problem: boolean; keep: NonNullable<Props['keep']> };

function KeepSweep({ axes, problem, keep }: KeepProps) {
  const { error } = useLiveFilm().sweep;
  return keep({ axes, problem: problem || error !== null });
}

function SweepProblem() {
  const { error } = useLiveFilm().sweep;
  return error && <SolveProblem error={error} />;
}

function SweepNote({ axes }: { axes: PreviewAxes }) {
  const { drawn } = useLiveFilm().sweep;
  if (drawn === null) return null;
  const { second, family } = drawn;
  const previewed = drawn.grid.length * (second?.grid.length ?? 1) * (family?.grid.length ?? 1);
  const time = formatDuration(drawn.seconds);
  return pointCountOf(asked(axes)) > previewed
    ? `preview of ${formatCount(previewed)} points, ${time}`
    : `${formatCount(previewed)} points, ${time}`;
}

function asked({ axis, second, family }: PreviewAxes) {
  return { axis, ...(second ? { second } : {}), ...(family ? { family } : {}) };
}
