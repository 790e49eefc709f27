import type { DesignResult } from '../shared/design.ts';
import type {
  SensitivityAnswer,
  SensitivityRequest,
  ToleranceDesign,
  ToleranceResult,
} from '../shared/toleranceDesign.ts';
import type { DesignWork } from './design/designInput.ts';
import type { DesignOptions, SubmitStep } from './design/designThreads.ts';
import { DesignThreads } from './design/designThreads.ts';
import { runDesign } from './design/runDesign.ts';
import type { DesignOutcome } from './design/runDesign.ts';
import { runBands } from './design/tolerance/runTolerance.ts';
import type { ResolvableMaterial } from './dispersion/resolveCase.ts';
import { runLimited } from './runLimited.ts';
import type { Threads } from './sweep/threads.ts';

const SENSITIVITY_TIMEOUT_MS = 20_000;

type BandsWork = DesignWork & { design: ToleranceDesign };

/** Design questions in threads. */
export type DesignPool = {
  /**
   * Answers a question over all cores; the answer does not depend on how many there are. A cancelled one rejects at
   * once.
   *
   * @throws ComputeError `cancelled`, `refused` (a material is not known at a working point), `crashed` or `closed`
   */
  design(work: DesignWork, options?: DesignOptions<DesignResult>): Promise<DesignOutcome>;
  /**
   * The points of a tolerance question alone, without what its page tells beside: a growth card waits for it.
   *
   * @throws ComputeError as `design`
   */
  bands(
    work: BandsWork,
    options?: Pick<DesignOptions<never>, 'signal' | 'onProgress'>,
  ): Promise<ToleranceResult['points']>;
  /** Derivatives of every reading. @throws ComputeError as `design`, and `timeout` (20 s) */
  sensitivity(
    request: SensitivityRequest,
    materials: readonly ResolvableMaterial[],
  ): Promise<SensitivityAnswer>;
};

/** @param large threads that are shared with the sweeps */
export function designPool(large: Threads): DesignPool {
  const submit: SubmitStep = (task, signal) => large.run('designStep', task, signal);
  return {
    design: (work, options) => runDesign(work, large.count, submit, options),
    bands(work, options = {}) {
      const threads = new DesignThreads(work, large.count, submit);
      const { design } = work;
      return threads.watch(design.tolerance.samples, options, () => runBands(design, threads));
    },
    sensitivity: (request, materials) =>
      runLimited(
        large,
        'sensitivity',
        { request, materials },
        {
          milliseconds: SENSITIVITY_TIMEOUT_MS,
          message:
            'The derivatives took longer than 20 s: ask fewer working points, or a film of fewer layers.',
        },
      ),
  };
}
