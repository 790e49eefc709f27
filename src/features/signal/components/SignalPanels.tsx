import { useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { inputAzimuthOf } from '../../../../shared/stack.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { addsIntensities, countLayers } from '../../../../shared/stackCase.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { useSolved } from '../hooks/useSolved.ts';
import { explainRequest } from '../model/explainRequest.ts';
import { filmLayers } from '../model/filmLayers.ts';
import type { DescribeMedium } from '../model/filmLayers.ts';
import { threeStates } from '../model/moreReadings.ts';
import { DepthProfile } from './DepthProfile.tsx';
import { ExactTables } from './ExactTables.tsx';
import { LayerShares } from './LayerShares.tsx';
import { MoreReadings } from './MoreReadings.tsx';
import { SensitivityPanel } from './SensitivityPanel.tsx';
import { StateStep } from './StateStep.tsx';

type Props = {
  document: StackDocument;
  /** Whether the film on the page has gone on since. */
  stale: boolean;
  point: WorkingPoint;
  /** Name and fill of a medium on the drawing. Keep the function stable between renders. */
  describe: DescribeMedium;
  heightsOf: (thicknessesNm: readonly number[], roomPx: number, leastPx: number) => readonly number[];
  unit: AngleUnit;
  onAzimuth: (azimuthDeg: number) => void;
  onActiveLayer?: (layerId: string | null) => void;
};

/** Films longer than this are not taken apart while they are edited: one answer would be megabytes. */
const TAKEN_APART = 3000;

/** What stands behind the readings strip: layer shares, depth profile, further readings, steps between states. */
export function SignalPanels(props: Props) {
  const layers = countLayers(props.document.layers);
  if (layers > TAKEN_APART) {
    return (
      <p className="card px-4 py-6 text-center text-note text-muted">
        Layer shares and depth profile are shown for films of up to {TAKEN_APART} layers; this one has{' '}
        {layers}.
      </p>
    );
  }
  return <Panels {...props} />;
}

function Panels({ document, stale, point, describe, heightsOf, unit, onAzimuth, onActiveLayer }: Props) {
  const request = useMemo(() => explainRequest(document, point), [document, point]);
  const { response, pending: unanswered, error } = useSolved(request);
  const pending = stale || unanswered || error !== null;
  const film = useMemo(() => filmLayers(document, describe), [document, describe]);
  const substrate = describe(document.substrate);
  const states = useMemo(() => threeStates(response), [response]);
  const contributions = states?.given.contributions;
  const depth = states?.given.depth;
  const averaged = addsIntensities(document);
  return (
    <div className="flex flex-col gap-4">
      {averaged ? (
        <p className="card px-4 py-3 text-note text-muted">
          Intensities are added or averaged here (backside or spread), so there is no one amplitude to take
          apart: layer shares, depth profile, cross-polarized amplitude and ceiling stay empty. Switch them
          off under “Real sample” to see those.
        </p>
      ) : (
        <div className="grid gap-4 md:grid-cols-[minmax(0,1.15fr)_minmax(0,1fr)]">
          {contributions ? (
            <LayerShares
              contributions={contributions}
              film={film}
              substrateName={substrate.name}
              pending={pending}
              onActiveLayer={onActiveLayer}
            />
          ) : (
            <Waiting title="Where the signal comes from">
              {states
                ? 'This film is too long to be taken apart layer by layer.'
                : error
                  ? ''
                  : 'Solving the film'}
            </Waiting>
          )}
          {depth ? (
            <DepthProfile
              depth={depth}
              film={film}
              substrate={substrate}
              heightsOf={heightsOf}
              pending={pending}
            />
          ) : (
            <Waiting title="Depth profile">{error ? '' : 'Solving the film'}</Waiting>
          )}
        </div>
      )}
      <Disclosure title="More readings">
        {states && (
          <MoreReadings
            states={states}
            unit={unit}
            azimuthDeg={inputAzimuthOf(point)}
            onAzimuth={onAzimuth}
          />
        )}
      </Disclosure>
      <Disclosure title="Exact values">{states && <ExactTables states={states} />}</Disclosure>
      <Disclosure title="Sensitivity">
        <SensitivityPanel document={document} stale={stale} point={point} unit={unit} />
      </Disclosure>
      <Disclosure title="Step between two magnetization states">
        <StateStep document={document} stale={stale} point={point} describe={describe} unit={unit} />
      </Disclosure>
    </div>
  );
}

function Waiting({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title} className="card min-h-64 px-4 pt-3.5">
      <h2 className="text-[14px]">{title}</h2>
      <p className="pt-20 text-center text-note text-muted">{children}</p>
    </section>
  );
}

/** Secondary matter behind its title; what is in it is not asked of the server before it is opened. */
function Disclosure({ title, children }: { title: string; children: ReactNode }) {
  const [open, setOpen] = useState(false);
  return (
    <details className="card px-4 py-2.5" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="rounded-box text-[14px] font-semibold">{title}</summary>
      {open && <div className="pt-2.5">{children}</div>}
    </details>
  );
}
