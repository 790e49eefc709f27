import type { Design, DesignSummary, SharedDesign } from '../../shared/design.ts';
import type { DesignRun } from '../models/run.ts';
import { presentRunProgress } from './presentRun.ts';

export function presentDesignSummary(design: DesignRun): DesignSummary {
  return {
    id: design.id,
    groupId: design.groupId,
    name: design.name,
    kind: design.kind,
    stackId: design.stackId,
    stackName: design.stackName,
    progress: presentRunProgress(design),
    createdAt: design.createdAt.toISOString(),
    finishedAt: design.finishedAt?.toISOString() ?? null,
    createdBy: design.createdBy?.name ?? null,
    isDemo: design.isDemo,
  };
}

/** @param design with who made it */
export function presentDesign(design: DesignRun): Design {
  return { ...presentDesignSummary(design), ...snapshotOf(design) };
}

/** What a share link shows of a design: nothing of the group, its people or its stack. */
export function presentSharedDesign(design: DesignRun): SharedDesign {
  const { name, kind, finishedAt } = design;
  return { name, kind, finishedAt: finishedAt?.toISOString() ?? null, ...snapshotOf(design) };
}

function snapshotOf(design: DesignRun) {
  const { input, materials, warnings, assumptions, solverVersion, inputSha256, computeSeconds } = design;
  return {
    input: input.design,
    materials,
    warnings,
    assumptions,
    solverVersion,
    inputSha256,
    computeSeconds,
  };
}
