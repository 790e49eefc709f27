import type { CapDesign } from '../../shared/capDesign.ts';
import { CapCurves, bareReadings, capThicknesses } from './cap/capCurves.ts';
import { capOutcome } from './cap/capOutcome.ts';
import { CapSamples } from './cap/capSamples.ts';
import type { Sensitivity, ToleranceDesign } from '../../shared/toleranceDesign.ts';
import type { DesignStep, DesignTask, DesignWork } from './designInput.ts';
import type { Film } from './optimise/film.ts';
import { OptimiseFilms } from './optimise/optimiseFilms.ts';
import { SensitiveFilm } from './tolerance/sensitivity.ts';
import { bandsOutcome, toleranceOutcome } from './tolerance/toleranceOutcome.ts';
import { ToleranceFilms, ToleranceSamples } from './tolerance/toleranceSamples.ts';

/** What a thread keeps of the calculation that it last took a step of. */
type Kept = {
  designId: number;
  work: DesignWork;
  curves: CapCurves | null;
  films: ToleranceFilms | null;
  optimised: OptimiseFilms | null;
  /** By the place of the working point. */
  sensitive: Map<number, SensitiveFilm>;
};

let kept: Kept | null = null;

/** One step of a design calculation; what it answers depends on the kind of step. */
export function designStep({ designId, work, flags, step }: DesignTask): unknown {
  if (kept?.designId !== designId) {
    kept = {
      designId,
      work: readWork(work),
      curves: null,
      films: null,
      optimised: null,
      sensitive: new Map(),
    };
  }
  return takeStep(kept, step, new Int32Array(flags));
}

function takeStep(mine: Kept, step: DesignStep, flags: Int32Array): unknown {
  switch (step.kind) {
    case 'cap bare':
      return bareReadings(capOf(mine.work), mine.work.materials);
    case 'cap samples': {
      const { design, curves } = capCurvesOf(mine, step.candidateId);
      const nm = capThicknesses(design);
      const samples = samplesOf(design, nm, step.samples);
      for (let sample = step.from; sample < step.to && Atomics.load(flags, 1) === 0; sample += 1) {
        samples.fill(sample, nm, curves);
        Atomics.add(flags, 0, 1);
      }
      return null;
    }
    case 'cap outcome': {
      const { design, curves } = capCurvesOf(mine, step.candidateId);
      const nm = capThicknesses(design);
      return capOutcome(design, curves, nm, samplesOf(design, nm, step.samples), step.bare);
    }
    case 'optimise films': {
      const films: Film[] = [];
      for (const nm of step.nm) {
        if (Atomics.load(flags, 1) !== 0) return null;
        films.push(optimisedOf(mine).trial(nm));
        Atomics.add(flags, 0, 1);
      }
      return films;
    }
    case 'optimise start':
      return optimisedOf(mine).evaluate(step.nm);
    case 'optimise readings':
      return step.nm.map((nm) => optimisedOf(mine).readings(nm));
    case 'tolerance samples': {
      const design = toleranceOf(mine.work);
      mine.films ??= new ToleranceFilms(design, mine.work.materials);
      const samples = new ToleranceSamples(design, step.samples);
      for (let sample = step.from; sample < step.to && Atomics.load(flags, 1) === 0; sample += 1) {
        mine.films.solve(sample).forEach((readings, point) => samples.set(point, sample, readings));
        Atomics.add(flags, 0, 1);
      }
      return null;
    }
    case 'tolerance derivatives': {
      const film = sensitiveOf(mine, step.point);
      const found: Sensitivity[] = [];
      for (let place = step.from; place < step.to && Atomics.load(flags, 1) === 0; place += 1) {
        found.push(...film.derivatives(place, place + 1));
        Atomics.add(flags, 0, 1);
      }
      return found;
    }
    case 'tolerance outcome':
    case 'tolerance bands': {
      const design = toleranceOf(mine.work);
      const outcome = step.kind === 'tolerance bands' ? bandsOutcome : toleranceOutcome;
      return outcome(design, mine.work.materials, new ToleranceSamples(design, step.samples));
    }
  }
}

function capCurvesOf(mine: Kept, candidateId: string): { design: CapDesign; curves: CapCurves } {
  const { materials } = mine.work;
  const design = capOf(mine.work);
  if (mine.curves?.candidate.id !== candidateId) mine.curves = new CapCurves(design, candidateId, materials);
  return { design, curves: mine.curves };
}

function capOf({ design }: DesignWork): CapDesign {
  if (design.kind !== 'cap') throw new Error(`a cap step of a calculation of kind ${design.kind}`);
  return design;
}

function toleranceOf({ design }: DesignWork): ToleranceDesign {
  if (design.kind !== 'tolerance')
    throw new Error(`a tolerance step of a calculation of kind ${design.kind}`);
  return design;
}

function sensitiveOf(mine: Kept, point: number): SensitiveFilm {
  const { document, points } = toleranceOf(mine.work);
  const film = mine.sensitive.get(point) ?? new SensitiveFilm(document, points[point]!, mine.work.materials);
  mine.sensitive.set(point, film);
  return film;
}

function optimisedOf(mine: Kept): OptimiseFilms {
  const { design, materials } = mine.work;
  if (design.kind !== 'optimise') throw new Error(`an optimise step of a calculation of kind ${design.kind}`);
  return (mine.optimised ??= new OptimiseFilms(design, materials));
}

function samplesOf(design: CapDesign, nm: number[], buffer: SharedArrayBuffer): CapSamples {
  const size = { points: design.points.length, thicknesses: nm.length, samples: design.tolerance.samples };
  return new CapSamples(size, buffer);
}

function readWork(bytes: SharedArrayBuffer): DesignWork {
  const text = new TextDecoder().decode(new Uint8Array(bytes).slice());
  // Written by DesignThreads from a DesignWork in this same process.
  return JSON.parse(text) as DesignWork;
}
