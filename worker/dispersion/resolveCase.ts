import type { Complex } from '../../shared/complex.ts';
import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { LibraryMediumInput, MediumInput, MixtureInput } from '../../shared/medium.ts';
import type {
  LibrarySolveCase,
  LibraryStackItemInput,
  SolveCase,
  StackItemInput,
} from '../../shared/solve.ts';
import { DispersionValueError } from './opticalValue.ts';
import { DispersionRangeError } from './range.ts';
import { sampleIndex, sampleVoigt } from './sample.ts';

/** A stored version of a material, as the solve needs it. */
export type ResolvableMaterial = { id: string; version: number; name: string; content: MaterialContent };

/** Everything that keeps a case from being solved with the library, each with its path inside the case. */
export class ResolutionError extends Error {
  override readonly name = 'ResolutionError';

  constructor(readonly issues: Issue[]) {
    super(issues.map((issue) => `${issue.path}: ${issue.message}`).join('\n'));
  }
}

type Constants = Pick<MediumInput, 'index' | 'voigt'>;

/** What may name a material: a medium or a part of a mixture. */
type ByName = Pick<
  LibraryMediumInput,
  'material' | 'version' | 'assumeConstant' | 'm' | 'index' | 'voigt' | 'voigtScale'
>;

/**
 * A case with numbers in place of library ids, one sample per wavelength where the case lists several.
 * Layers of one material share their samples. `m` is kept as it stands; the Voigt constant is put in only where
 * m is not zero, so that a film without magnetization is not bound to the wavelengths at which Q is known.
 *
 * @param materials by `${id}@${version}`; a medium without `version` takes the newest one in it
 * @throws ResolutionError with every issue at once, paths such as `layers[1].material`
 */
export function resolveCase(
  given: LibrarySolveCase,
  materials: ReadonlyMap<string, ResolvableMaterial>,
): SolveCase {
  const resolver = new MediumResolver(given.wavelengthNm, materials);
  const resolveItem = (item: LibraryStackItemInput, path: string): StackItemInput => {
    if ('layers' in item) return { ...item, layers: resolveItems(item.layers, `${path}.layers`) };
    const { thicknessNm, gradedNm, ...medium } = item;
    return { thicknessNm, ...graded(gradedNm), ...resolver.resolve(medium, path) };
  };
  const resolveItems = (items: LibraryStackItemInput[], path: string) =>
    items.map((item, position) => resolveItem(item, `${path}[${position}]`));
  const { gradedNm, ...substrate } = given.substrate;
  const { backside, ...rest } = given;
  const resolved: SolveCase = {
    ...rest,
    incident: resolver.resolve(given.incident, 'incident'),
    layers: resolveItems(given.layers, 'layers'),
    substrate: { ...graded(gradedNm), ...resolver.resolve(substrate, 'substrate') },
    ...(backside
      ? { backside: { ...backside, exit: resolver.resolve(backside.exit, 'backside.exit') } }
      : {}),
  };
  if (resolver.issues.length > 0) throw new ResolutionError(resolver.issues);
  return resolved;
}

function graded(gradedNm: number | undefined): { gradedNm?: number } {
  return gradedNm === undefined ? {} : { gradedNm };
}

class MediumResolver {
  readonly issues: Issue[] = [];
  private readonly wavelengthsNm: number[];
  private readonly newest = new Map<string, ResolvableMaterial>();
  /** What was sampled or refused before: a stack names few materials in many layers. */
  private readonly known = new Map<string, Constants | string[]>();

  constructor(
    private readonly wavelengthNm: number | number[],
    private readonly materials: ReadonlyMap<string, ResolvableMaterial>,
  ) {
    this.wavelengthsNm = typeof wavelengthNm === 'number' ? [wavelengthNm] : wavelengthNm;
    for (const material of materials.values()) {
      const other = this.newest.get(material.id);
      if (!other || other.version < material.version) this.newest.set(material.id, material);
    }
  }

  resolve(medium: LibraryMediumInput, path: string): MediumInput {
    const { mixture, ...plain } = medium;
    const resolved = this.resolvePlain(plain, path);
    if (!mixture) return resolved;
    const part = (position: 0 | 1): MixtureInput['parts'][0] =>
      this.resolvePlain(mixture.parts[position], `${path}.mixture.parts[${position}]`);
    return { ...resolved, mixture: { ...mixture, parts: [part(0), part(1)] } };
  }

  private resolvePlain<Plain extends ByName>(
    medium: Plain,
    path: string,
  ): Omit<Plain, 'material' | 'version' | 'assumeConstant'> & Constants {
    const { material: id, version, assumeConstant = false, ...rest } = medium;
    if (id === undefined) return rest;
    const magnetized = rest.m !== undefined && rest.m.some((component) => component !== 0);
    const key = JSON.stringify([id, version, assumeConstant, magnetized]);
    let constants = this.known.get(key);
    if (constants === undefined) {
      constants = this.sample(id, version, assumeConstant, magnetized);
      this.known.set(key, constants);
    }
    if (!Array.isArray(constants)) {
      const hasScaleOnly = rest.voigtScale !== undefined && constants.voigt === undefined;
      return { ...rest, ...(hasScaleOnly && { voigtScale: undefined }), ...constants };
    }
    for (const message of constants) this.issues.push({ path: `${path}.material`, message });
    return rest;
  }

  private sample(
    id: string,
    version: number | undefined,
    assumeConstant: boolean,
    magnetized: boolean,
  ): Constants | string[] {
    const material = version === undefined ? this.newest.get(id) : this.materials.get(`${id}@${version}`);
    if (!material) {
      const which = version === undefined ? '' : ` in version ${version}`;
      return [`there is no material ${id}${which}: choose one that is listed among the materials`];
    }
    const { content } = material;
    const name = `${material.name} (${material.id})`;
    const messages: string[] = [];
    const index = collect(messages, () => {
      const { n, k } = sampleIndex(name, content.index, this.wavelengthsNm, { assumeConstant });
      return this.asInput(n, k);
    });
    const { voigt } = content;
    if (voigt === null || !magnetized) return messages.length > 0 ? messages : { index };
    const q = collect(messages, () => {
      const { re, im } = sampleVoigt(name, { index: content.index, voigt }, this.wavelengthsNm, {
        assumeConstant,
      });
      return this.asInput(re, im);
    });
    return messages.length > 0 ? messages : { index, voigt: q };
  }

  private asInput(re: Float64Array, im: Float64Array): Complex | { samples: Complex[] } {
    if (typeof this.wavelengthNm === 'number') return [re[0]!, im[0]!];
    return { samples: Array.from(re, (value, position): Complex => [value, im[position]!]) };
  }
}

/** Runs one sampling; what is wrong with the material at these wavelengths becomes a message, the rest is thrown. */
function collect<Value>(messages: string[], sample: () => Value): Value | undefined {
  try {
    return sample();
  } catch (error) {
    if (!(error instanceof DispersionRangeError || error instanceof DispersionValueError)) throw error;
    messages.push(error.message);
    return undefined;
  }
}
