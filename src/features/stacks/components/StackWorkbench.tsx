import { useCallback, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { ReadingName, SweepAxes } from '../../../../shared/run.ts';
import type { Stack, StackDocument, StackMedium, WorkingPoint } from '../../../../shared/stack.ts';
import { addsIntensities } from '../../../../shared/stackCase.ts';
import { Button } from '../../../components/Button.tsx';
import type { AngleUnit } from '../../../lib/format.ts';
import { useMoving } from '../../../lib/useMoving.ts';
import { useSettled } from '../../../lib/useSettled.ts';
import { useEditorKeys } from '../hooks/useEditorKeys.ts';
import { useMaterials } from '../hooks/useMaterials.ts';
import type { MaterialAt } from '../hooks/useMaterials.ts';
import { useSteadySweep } from '../hooks/useSteadySweep.ts';
import { useStackEditor } from '../hooks/useStackEditor.ts';
import type { EditDocument } from '../hooks/useStackEditor.ts';
import { useView } from '../hooks/useView.ts';
import { isTransverse, lengthOf, workingVectors } from '../model/magnetization.ts';
import { filmCautions, hasAxes, isMagnetic, mediumClass, mediumName } from '../model/media.ts';
import type { Materials } from '../model/media.ts';
import { axesOf, drawnReadings, keptReadings, wavelengthRange } from '../model/pageSweep.ts';
import type { PreviewAxes } from '../model/sweepAxis.ts';
import { samePoint } from '../model/viewState.ts';
import { classFill } from './classColours.ts';
import { EditorNotices } from './EditorNotices.tsx';
import { FilmHeader } from './FilmHeader.tsx';
import { FilmMaterials } from './FilmMaterials.tsx';
import { LeaveGuard } from './LeaveGuard.tsx';
import { LiveFilmProvider } from './LiveFilmProvider.tsx';
import { LiveDrawing, LivePointBar, LiveStrip } from './LiveParts.tsx';
import { MediumPicker } from './MediumPicker.tsx';
import { StackDescription } from './StackDescription.tsx';
import { SweepPanel } from './SweepPanel.tsx';

/** What "keep as run" keeps. */
export type KeptSweep = {
  document: StackDocument;
  sweep: SweepAxes;
  readings: ReadingName[];
  /** Whether the axis or the film is such that the run would be refused. */
  problem: boolean;
};

/** The film at its working point, for what explains its readings. */
export type ExplainedFilm = {
  document: StackDocument;
  /** Whether the film on the page has gone on since: what is said of it is then of an earlier state. */
  stale: boolean;
  point: WorkingPoint;
  /** Name and fill of a medium on the drawing. */
  describe: (medium: StackMedium) => { name: string; fill: string };
  unit: AngleUnit;
  onPoint: (change: Partial<WorkingPoint>) => void;
  /** Marks a layer of the drawing while its share is pointed at. */
  onActiveLayer: (layerId: string | null) => void;
};

/** The film as the panel of a real sample changes it. */
export type SampledFilm = {
  document: StackDocument;
  edit: EditDocument | null;
  nameOf: (medium: StackMedium) => string;
  isMagnetic: (medium: StackMedium) => boolean;
  hasAxes: (medium: StackMedium) => boolean;
  pickMedium: (props: {
    medium: StackMedium;
    label: string;
    onChange: (medium: StackMedium) => void;
  }) => ReactNode;
};

/** Shorter than what a person takes for slow, longer than a step of a drag. */
const EXPLAIN_AFTER_MS = 60;

type Props = {
  stack: Stack;
  library: readonly MaterialSummary[];
  materialAt: MaterialAt;
  mayEdit: boolean;
  onCopied: (stack: Stack) => void;
  /** The button that keeps the sweep on the page as a run. */
  keepButton: (sweep: KeptSweep) => ReactNode;
  /** Below the plot: where the readings come from. */
  explanation: (film: ExplainedFilm) => ReactNode;
  /** Below the drawing: what of the sample is not ideal. */
  samplePanel: (film: SampledFilm) => ReactNode;
};

/** The heart of the program: the film on the left, its readings and the current question on the right. */
export function StackWorkbench({
  stack,
  library,
  materialAt,
  mayEdit,
  onCopied,
  keepButton,
  explanation,
  samplePanel,
}: Props) {
  const editor = useStackEditor(stack);
  const [showsNewer, setShowsNewer] = useState(false);
  const newer = showsNewer ? editor.conflict : null;
  const film = newer?.document ?? editor.draft.document;
  const materials = useMaterials(library, film, materialAt);
  const [view, setView] = useView(film.workingPoint);
  const { point } = view;
  const moving = useMoving(film);
  const usualAxes = useMemo(() => axesOf(view, film, materials), [view, film, materials]);
  const axes = useSteadySweep(usualAxes, moving);
  const rangeNm = wavelengthRange(point, axes);
  const vectors = useMemo(() => workingVectors(film, point.magnetization), [film, point]);
  const transverse = isTransverse(vectors);
  const averaged = addsIntensities(film);
  const several = axes !== null && (axes.second !== null || axes.family !== null);
  const drawn = useMemo(
    () => drawnReadings(view, several, transverse, averaged),
    [view, several, transverse, averaged],
  );
  const magnetized = vectors.some((m) => lengthOf(m) > 0);
  const [activeLayer, setActiveLayer] = useState<string | null>(null);
  const nameOf = (medium: StackMedium) => mediumName(medium, materials);
  const describe = useCallback(
    (medium: StackMedium) => ({
      name: mediumName(medium, materials),
      fill: classFill[mediumClass(medium, materials)],
    }),
    [materials],
  );
  const canEdit = mayEdit && newer === null;
  useEditorKeys({ undo: editor.undo, redo: editor.redo, save: () => void editor.save() }, canEdit);

  const setPoint = useCallback(
    (change: Partial<WorkingPoint>) => setView({ point: { ...point, ...change } }),
    [point, setView],
  );
  // What explains the readings follows when the film stands still: the curve under the pointer comes first.
  const explained = useSettled(film, EXPLAIN_AFTER_MS);
  const stale = explained !== film;
  const panels = useMemo(
    () =>
      explanation({
        document: explained,
        stale,
        point,
        describe,
        unit: view.unit,
        onPoint: setPoint,
        onActiveLayer: setActiveLayer,
      }),
    [explanation, explained, stale, point, describe, view.unit, setPoint],
  );
  const keep = ({ axes: { axis, second, family }, problem }: { axes: PreviewAxes; problem: boolean }) => {
    const sweep = { axis, ...(second ? { second } : {}), ...(family ? { family } : {}) };
    return keepButton({
      document: { ...film, workingPoint: point },
      sweep,
      readings: keptReadings(sweep, view, transverse, averaged),
      problem,
    });
  };

  return (
    <LiveFilmProvider
      document={film}
      point={point}
      axes={axes}
      readings={drawn.readings}
      materials={materials}
      saveIssues={editor.saveIssues}
    >
      <div className="grid min-h-[calc(100dvh-53px)] grid-cols-1 lg:grid-cols-[416px_minmax(0,1fr)]">
        <section aria-label="Film" className="border-line px-5 py-4 max-lg:border-b lg:border-r">
          <FilmHeader stack={stack} editor={editor} mayEdit={mayEdit} />
          {mayEdit && (
            <EditorNotices
              editor={editor}
              showsNewer={showsNewer}
              onShowNewer={setShowsNewer}
              onCopied={onCopied}
            />
          )}
          <div className="mt-3">
            <LiveDrawing
              document={film}
              materials={materials}
              library={library}
              materialAt={materialAt}
              point={point}
              rangeNm={rangeNm}
              edit={canEdit ? editor.editDocument : null}
              activeLayer={activeLayer}
            >
              {samplePanel({
                document: film,
                edit: canEdit ? editor.editDocument : null,
                nameOf,
                isMagnetic: (medium) => isMagnetic(medium, materials),
                hasAxes: (medium) => hasAxes(medium, materials),
                pickMedium: pickMedium(materials),
              })}
              <FilmMaterials
                document={film}
                materials={materials}
                edit={canEdit ? editor.editDocument : null}
              />
            </LiveDrawing>
          </div>
          <StackDescription
            text={newer?.description ?? editor.draft.description}
            onChange={
              canEdit
                ? (description) => editor.editDraft((now) => ({ ...now, description }), 'description')
                : null
            }
          />
        </section>
        <div className="min-w-0 px-6 pt-4 pb-6">
          <div className="mb-3 flex flex-wrap items-center gap-x-3 gap-y-2">
            <LivePointBar document={film} point={point} onChange={setPoint} />
            <span className="ml-auto text-[13px] text-muted">
              {canEdit && !samePoint(point, film.workingPoint) ? (
                <Button
                  tone="plain"
                  className="px-1.5! py-0.5! text-[13px]!"
                  title="Open the stack at this working point from now on; saved with the stack"
                  onClick={() => editor.editDocument((now) => ({ ...now, workingPoint: point }), null)}
                >
                  Make this the stack's working point
                </Button>
              ) : (
                'exact, change against m = 0'
              )}
            </span>
          </div>
          <LiveStrip
            input={point.input}
            transverse={transverse}
            unit={view.unit}
            magnetized={magnetized}
            averaged={averaged}
          />
          <div className="mt-4">
            <SweepPanel
              title={editor.draft.name}
              document={film}
              materials={materials}
              view={view}
              axes={axes}
              notes={filmCautions(film, materials, rangeNm)
                .filter(({ kind }) => kind === 'extended')
                .map(({ text }) => text)}
              drawn={drawn}
              moving={moving}
              onView={setView}
              keep={mayEdit ? keep : null}
            />
          </div>
          <div className="mt-4">{panels}</div>
        </div>
        <LeaveGuard dirty={editor.dirty && mayEdit} />
      </div>
    </LiveFilmProvider>
  );
}

/** The control of the drawing that chooses a medium, for panels below it. */
function pickMedium(materials: Materials): SampledFilm['pickMedium'] {
  return function pick({ medium, label, onChange }) {
    return (
      <MediumPicker medium={medium} label={label} onChange={onChange} className="bg-paper font-semibold">
        {mediumName(medium, materials)}
      </MediumPicker>
    );
  };
}
