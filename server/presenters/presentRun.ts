import type { Run as PresentedRun, RunProgress, RunSummary, SharedRun, SweepAxes } from '../../shared/run.ts';
import type { Run, SweepRun } from '../models/run.ts';

/** @param axes apart from the row: a list leaves the rest of the input in the database */
export function presentRunSummary(run: SweepRun, axes: SweepAxes): RunSummary {
  return {
    id: run.id,
    groupId: run.groupId,
    name: run.name,
    stackId: run.stackId,
    stackName: run.stackName,
    ...onlyAxes(axes),
    progress: presentRunProgress(run),
    createdAt: run.createdAt.toISOString(),
    finishedAt: run.finishedAt?.toISOString() ?? null,
    createdBy: run.createdBy?.name ?? null,
    isDemo: run.isDemo,
  };
}

/** @param run with who made it */
export function presentRun(run: SweepRun): PresentedRun {
  return { ...presentRunSummary(run, run.input), ...snapshotOf(run) };
}

/** What a share link shows of a run: nothing of the group, its people or its stack. */
export function presentSharedRun(run: SweepRun): SharedRun {
  return {
    name: run.name,
    ...onlyAxes(run.input),
    finishedAt: run.finishedAt?.toISOString() ?? null,
    ...snapshotOf(run),
  };
}

function onlyAxes({ axis, second, family }: SweepAxes): SweepAxes {
  return { axis, ...(second && { second }), ...(family && { family }) };
}

export function presentRunProgress(run: Run): RunProgress {
  const { state, done, total, error, startedAt } = run;
  const seconds = startedAt ? (Date.now() - startedAt.getTime()) / 1000 : 0;
  const hasRate = state === 'running' && done > 0 && seconds > 0;
  return { state, done, total, secondsLeft: hasRate ? (seconds / done) * (total - done) : null, error };
}

function snapshotOf(run: SweepRun) {
  const { materials, warnings, assumptions, solverVersion, inputSha256, computeSeconds } = run;
  const { document, readings } = run.input;
  return { document, readings, materials, warnings, assumptions, solverVersion, inputSha256, computeSeconds };
}
