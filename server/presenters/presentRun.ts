import type { Run as PresentedRun, RunProgress, RunSummary, SharedRun, SweepAxis } from '../../shared/run.ts';
import type { Run } from '../models/run.ts';

/** @param axis apart from the row: a list leaves the rest of the input in the database */
export function presentRunSummary(run: Run, axis: SweepAxis): RunSummary {
  return {
    id: run.id,
    groupId: run.groupId,
    name: run.name,
    stackId: run.stackId,
    stackName: run.stackName,
    axis,
    progress: presentRunProgress(run),
    createdAt: run.createdAt.toISOString(),
    finishedAt: run.finishedAt?.toISOString() ?? null,
    createdBy: run.createdBy?.name ?? null,
    isDemo: run.isDemo,
  };
}

/** @param run with who made it */
export function presentRun(run: Run): PresentedRun {
  return { ...presentRunSummary(run, run.input.axis), ...snapshotOf(run) };
}

/** What a share link shows of a run: nothing of the group, its people or its stack. */
export function presentSharedRun(run: Run): SharedRun {
  return {
    name: run.name,
    axis: run.input.axis,
    finishedAt: run.finishedAt?.toISOString() ?? null,
    ...snapshotOf(run),
  };
}

export function presentRunProgress(run: Run): RunProgress {
  const { state, done, total, error, startedAt } = run;
  const seconds = startedAt ? (Date.now() - startedAt.getTime()) / 1000 : 0;
  const hasRate = state === 'running' && done > 0 && seconds > 0;
  return { state, done, total, secondsLeft: hasRate ? (seconds / done) * (total - done) : null, error };
}

function snapshotOf(run: Run) {
  const { materials, warnings, assumptions, solverVersion, inputSha256, computeSeconds } = run;
  const { document, readings } = run.input;
  return { document, readings, materials, warnings, assumptions, solverVersion, inputSha256, computeSeconds };
}
