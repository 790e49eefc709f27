import { axisValues } from '../shared/axisValues.ts';
import type { AngleFeatures } from '../shared/live.ts';
import type { ReadingsStrip } from '../shared/readingsStrip.ts';
import type { StackDocument } from '../shared/stack.ts';
import type { ResolvableMaterial } from './dispersion/resolveCase.ts';
import { runLimited } from './runLimited.ts';
import { ComputeError } from './sweep/computeError.ts';
import { microsecondsPerPoint } from './sweep/cost.ts';
import { generalCost } from './sweep/generalStack.ts';
import type { LiveCurveTask } from './sweep/liveCurve.ts';
import { SharedMaterials } from './sweep/sharedMaterials.ts';
import { SharedResult } from './sweep/sharedResult.ts';
import type { Threads } from './sweep/threads.ts';

const LIVE_TIMEOUT_MS = 20_000;
/** Curves expected to take longer queue with the sweeps, so that the threads for small ones stay free. */
const SMALL_MICROSECONDS = 100_000;

export type LiveCurve = {
  axis: Float64Array;
  /** The readings in the order asked; NaN where one does not exist. */
  columns: Float64Array[];
  /** The readings at the working point, where they were asked for. */
  strip: ReadingsStrip | null;
};

/** Answers while somebody edits, in the threads for what is quick. */
export type LivePool = {
  /**
   * One curve. A cancelled one ends at its next point and leaves its thread as it is.
   *
   * @param materials every medium that the document names, with its version
   * @throws ComputeError `refused` with issues at fields of the solve case, `cancelled`, `timeout` (20 s) or `crashed`
   */
  liveCurve(
    sweep: LiveCurveTask['sweep'],
    materials: readonly ResolvableMaterial[],
    options?: { strip?: boolean; signal?: AbortSignal },
  ): Promise<LiveCurve>;
  /** Angles at which something happens (design/angleFeatures.ts). @throws ComputeError as `liveCurve` */
  angleFeatures(document: StackDocument, materials: readonly ResolvableMaterial[]): Promise<AngleFeatures>;
};

/** @param small threads for what is quick; @param large threads that are shared with the sweeps */
export function livePool({ small, large }: { small: Threads; large: Threads }): LivePool {
  const shared = new SharedMaterials();
  return {
    async liveCurve(sweep, materials, { strip = false, signal } = {}) {
      const { axis, readings } = sweep;
      const result = SharedResult.allocate(axis.points, readings.length);
      const stop = () => result.cancel();
      signal?.addEventListener('abort', stop, { once: true });
      if (signal?.aborted) stop();
      const task: LiveCurveTask = {
        sweep,
        materials: materials.map((material) => shared.share(material)),
        result: result.buffer,
        strip,
      };
      let found: ReadingsStrip | null;
      try {
        found = await runLimited(isQuick(sweep) ? small : large, 'liveCurve', task, {
          milliseconds: LIVE_TIMEOUT_MS,
          message: `The curve took longer than ${LIVE_TIMEOUT_MS / 1000} s: ask fewer points, or start a run.`,
        });
      } finally {
        signal?.removeEventListener('abort', stop);
      }
      if (result.cancelled) throw new ComputeError('cancelled', 'The curve is no longer wanted.');
      return { axis: Float64Array.from(axisValues(axis)), columns: result.columns, strip: found };
    },
    angleFeatures: (document, materials) =>
      runLimited(
        small,
        'angleFeatures',
        { document, materials: materials.map((material) => shared.share(material)) },
        {
          milliseconds: LIVE_TIMEOUT_MS,
          message: `Looking for angles took longer than ${LIVE_TIMEOUT_MS / 1000} s: this film has too many layers or averages for it.`,
        },
      ),
  };
}

function isQuick(sweep: LiveCurveTask['sweep']): boolean {
  const { document, axis } = sweep;
  return generalCost(sweep) * axis.points * microsecondsPerPoint(document.layers) <= SMALL_MICROSECONDS;
}
