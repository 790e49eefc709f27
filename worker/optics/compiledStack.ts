import type { Complex } from '../../shared/complex.ts';
import { toComplex } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';
import type { SolveCase, StackItemInput } from '../../shared/solve.ts';
import { gradeSequence } from './gradedInterfaces.ts';
import type { GradedLayer, WrittenLayer } from './layers.ts';
import { Medium, sampleAt, samplesOf } from './medium.ts';

export type CompileOptions = {
  /** Every layer of the expanded stack has a medium of its own, for `isolateGyration`. */
  separateLayers?: boolean;
  /** Slices per graded interface. */
  slices?: number;
  /** Light comes from the substrate: the order is reversed and every tensor mirrored in the film plane. */
  fromBelow?: boolean;
};

/** A solve case with equal media shared and blocks expanded; what every computation on it starts from. */
export class CompiledStack {
  readonly wavelengthsNm: Float64Array;
  readonly anglesDeg: Float64Array;
  /** Each different medium once, the substrate's first. */
  readonly media: Medium[] = [];
  readonly substrate: Medium;
  readonly written: WrittenLayer[] = [];
  /** Layers in the order in which light meets them, blocks expanded. */
  sequence: WrittenLayer[] = [];

  readonly #incidentIndex: Complex[];
  readonly #byPath = new Map<string, WrittenLayer>();
  #loaded = -1;

  /** @param solveCase a case that has passed `solveCaseSchema` and `checkSolveRequest` */
  constructor(solveCase: SolveCase, options: CompileOptions = {}) {
    this.wavelengthsNm = Float64Array.from([solveCase.wavelengthNm].flat());
    this.anglesDeg = Float64Array.from([solveCase.angleDeg].flat());
    const { gradedNm = 0, ...bottom } = solveCase.substrate;
    const [entry, exit] = options.fromBelow ? [bottom, solveCase.incident] : [solveCase.incident, bottom];
    this.#incidentIndex = samplesOf(entry.index, toComplex) ?? [[1, 0]];
    const shared = new Map<string, Medium>();
    const mediumOf = (input: MediumInput): Medium => {
      const key = JSON.stringify(input);
      const known = shared.get(key);
      if (known) return known;
      const medium = new Medium(input);
      shared.set(key, medium);
      this.media.push(medium);
      return medium;
    };
    this.substrate = mediumOf(exit);
    const layers = this.#compile(solveCase.layers, [], mediumOf);
    const isGraded = gradedNm > 0 || layers.some((layer) => layer.gradedNm > 0);
    if (isGraded) {
      const last = { path: [], medium: new Medium(bottom), thicknessNm: Infinity, gradedNm };
      const graded = gradeSequence([...layers, last], solveCase.incident, options.slices ?? 1);
      this.#replaceLayers(graded.slice(0, -1));
    } else {
      this.sequence = layers;
    }
    if (options.fromBelow) {
      this.sequence.reverse();
      for (const medium of this.media) medium.mirrored = true;
    }
    if (options.separateLayers) {
      this.#replaceLayers(this.sequence.map((layer) => ({ ...layer, medium: layer.medium.copy() })));
    }
  }

  #compile(items: StackItemInput[], path: number[], mediumOf: (input: MediumInput) => Medium): GradedLayer[] {
    return items.flatMap((item, position) => {
      const here = [...path, position];
      if ('layers' in item) {
        const block = this.#compile(item.layers, here, mediumOf);
        return Array.from({ length: item.repeat }, () => block).flat();
      }
      const { thicknessNm, gradedNm = 0, ...constants } = item;
      const layer = { path: here, medium: mediumOf(constants), thicknessNm, gradedNm };
      this.written.push(layer);
      this.#byPath.set(here.join('/'), layer);
      return layer;
    });
  }

  /** Layers that are no longer those written: thicknesses then belong to the case, not to `layerAt`. */
  #replaceLayers(layers: WrittenLayer[]): void {
    this.sequence = layers;
    this.#byPath.clear();
    this.written.length = 0;
    this.written.push(...layers);
    this.media.length = 0;
    this.media.push(this.substrate, ...new Set(layers.map((layer) => layer.medium)));
  }

  /** Leaves one layer of a separated stack its gyration, times `factor`; the substrate comes last. */
  isolateGyration(position: number, factor: number): void {
    const media = [...this.sequence.map((layer) => layer.medium), this.substrate];
    media.forEach((medium, index) => {
      medium.gyrationScale = index === position ? factor : 0;
    });
    this.#loaded = -1;
  }

  /** Index of the incident medium; complex only for light that comes from inside a slab. */
  incidentIndex(wavelengthIndex: number): Complex {
    return sampleAt(this.#incidentIndex, wavelengthIndex);
  }

  /** The written layer at a path as `findLayerPath` gives it; undefined when there is none. */
  layerAt(path: number[]): WrittenLayer | undefined {
    return this.#byPath.get(path.join('/'));
  }

  /** Makes every medium describe this wavelength. */
  load(wavelengthIndex: number): void {
    if (wavelengthIndex === this.#loaded) return;
    for (const medium of this.media) medium.load(wavelengthIndex);
    this.#loaded = wavelengthIndex;
  }
}
