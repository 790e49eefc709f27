import type { Issue } from '../shared/error.ts';
import type { Material, MaterialContent } from '../shared/material.ts';
import type { ImportMapping, ImportTable } from '../shared/materialImport.ts';
import type { FitResult } from '../shared/materialFit.ts';
import type { LibrarySolveCase, SolveCase, SolveRequest, SolveResponse } from '../shared/solve.ts';
import type { SensitivityAnswer, SensitivityRequest } from '../shared/toleranceDesign.ts';
import type { AngleFeatures } from '../shared/live.ts';
import type { ReadingsStrip } from '../shared/readingsStrip.ts';
import type { StackDocument } from '../shared/stack.ts';
import { angleFeatures as featuresOf } from './design/angleFeatures.ts';
import type { DesignTask } from './design/designInput.ts';
import { designStep as stepTaken } from './design/designTask.ts';
import { sensitivities } from './design/tolerance/sensitivity.ts';
import { checkContent as issuesOf } from './dispersion/checkContent.ts';
import { materialCurves } from './dispersion/materialCurves.ts';
import type { ResolvableMaterial } from './dispersion/resolveCase.ts';
import { convertTable as tableConverted } from './import/convertTable.ts';
import type { ConvertedTable } from './import/convertTable.ts';
import { decodeText } from './import/decodeText.ts';
import type { ExportedMaterial } from './import/exportedMaterial.ts';
import { readExportedMaterial } from './import/readExportedMaterial.ts';
import { readTable as tableFrom } from './import/readTable.ts';
import type { FitInput } from './fit/fitMaterial.ts';
import { fitMaterial } from './fit/fitMaterial.ts';
import { solveRequest } from './optics/solveRequest.ts';
import { releaseMemory } from './releaseMemory.ts';
import { resolveCases } from './resolveCases.ts';
import { liveCurve as curveInto, readMaterial } from './sweep/liveCurve.ts';
import type { LiveCurveTask, SharedMaterial } from './sweep/liveCurve.ts';
import type { ChunkTask } from './sweep/runSweep.ts';
import { SharedResult } from './sweep/sharedResult.ts';
import { materialKey } from './sweep/sweepInput.ts';
import type { SweepInput } from './sweep/sweepInput.ts';
import { SweepSolver } from './sweep/sweepSolver.ts';
import { warmUp } from './sweep/warmUp.ts';
import { outcomeOf } from './taskOutcome.ts';
import type { TaskOutcome } from './taskOutcome.ts';

/* What runs in a worker thread: the pool calls these functions by name. */

/** Sweeps that this thread has compiled, the one used last at the end. */
const solvers = new Map<number, SweepSolver>();
/** A host runs few sweeps at a time; old ones must not keep their stacks in memory. */
const MOST_SOLVERS = 2;

/** Size of the columns of the sweep before. */
let formerBytes = 0;

export function sweepChunk(task: ChunkTask): TaskOutcome<null> {
  return outcomeOf(() => {
    if (!solvers.has(task.sweepId)) {
      // A thread that makes little garbage collects seldom, and would keep the columns of several past sweeps.
      releaseMemory(formerBytes);
      formerBytes = task.result.byteLength;
    }
    const result = new SharedResult(task.result, task.points, task.readings);
    solverOf(task).solve(task.chunk, result);
    return null;
  });
}

export function fit(input: FitInput): TaskOutcome<FitResult> {
  return outcomeOf(() => fitMaterial(input));
}

export function solve(request: SolveRequest): TaskOutcome<SolveResponse> {
  return outcomeOf(() => solveRequest(request));
}

export function curves(content: MaterialContent): TaskOutcome<Material['curves']> {
  return outcomeOf(() => materialCurves(content));
}

export function checkContent(content: MaterialContent): TaskOutcome<Issue[]> {
  return outcomeOf(() => issuesOf(content));
}

export function resolve(task: {
  cases: LibrarySolveCase[];
  materials: ReadonlyMap<string, ResolvableMaterial>;
}): TaskOutcome<SolveCase[]> {
  return outcomeOf(() => resolveCases(task.cases, task.materials));
}

/** @param task.progress one number in shared memory, which rises to 1 */
export function readTable(task: {
  bytes: Uint8Array;
  progress: Float64Array;
}): TaskOutcome<{ table: ImportTable; exported: ExportedMaterial | null }> {
  return outcomeOf(() => {
    const { table } = tableFrom(task.bytes, (fraction) => {
      task.progress[0] = fraction;
    });
    return { table, exported: readExportedMaterial(decodeText(task.bytes)) };
  });
}

export function convertTable(task: {
  bytes: Uint8Array;
  mapping: ImportMapping;
  indexOf: MaterialContent | null;
}): TaskOutcome<ConvertedTable> {
  return outcomeOf(() => tableConverted(tableFrom(task.bytes), task.mapping, task.indexOf));
}

/** One step of a design question; what it answers depends on the kind of step. */
export function designStep(task: DesignTask): TaskOutcome<unknown> {
  return outcomeOf(() => stepTaken(task));
}

export function sensitivity(task: {
  request: SensitivityRequest;
  materials: ResolvableMaterial[];
}): TaskOutcome<SensitivityAnswer> {
  return outcomeOf(() => sensitivities(task.request.document, task.request.points, task.materials));
}

export function liveCurve(task: LiveCurveTask): TaskOutcome<ReadingsStrip | null> {
  return outcomeOf(() => curveInto(task));
}

export function angleFeatures(task: {
  document: StackDocument;
  materials: SharedMaterial[];
}): TaskOutcome<AngleFeatures> {
  return outcomeOf(() => {
    const materials = task.materials.map(readMaterial);
    return featuresOf(task.document, new Map(materials.map((material) => [materialKey(material), material])));
  });
}

/** Makes a thread load and compile its code before the first question. */
export function warm(): TaskOutcome<null> {
  return outcomeOf(() => {
    warmUp();
    return null;
  });
}

function solverOf(task: ChunkTask): SweepSolver {
  const solver = solvers.get(task.sweepId) ?? new SweepSolver(readInput(task.input));
  solvers.delete(task.sweepId);
  solvers.set(task.sweepId, solver);
  for (const old of solvers.keys()) {
    if (solvers.size <= MOST_SOLVERS) break;
    solvers.delete(old);
  }
  return solver;
}

function readInput(bytes: SharedArrayBuffer): SweepInput {
  const text = new TextDecoder().decode(new Uint8Array(bytes).slice());
  // Written by runSweep from a SweepInput in this same process.
  return JSON.parse(text) as SweepInput;
}
