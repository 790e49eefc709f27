import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { LibraryMediumInput, MediumInput, MixtureInput } from '../../shared/medium.ts';
import type {
  LibrarySolveCase,
  LibraryStackItemInput,
  SolveCase,
  StackItemInput,
} from '../../shared/solve.ts';
import { checkMaterialUse } from './checkMaterialUse.ts';
import type { MaterialConstants, MaterialUse } from './materialConstants.ts';
import { materialConstants } from './materialConstants.ts';

/** A stored version of a material, as the solve needs it. */
export type ResolvableMaterial = {
  id: string;
  version: number;
  name: string;
  /** Short name for tables, such as "Co". */
  formula?: string;
  content: MaterialContent;
};

/** Everything that keeps a case from being solved with the library, each with its path inside the case. */
export class ResolutionError extends Error {
  override readonly name = 'ResolutionError';

  constructor(readonly issues: Issue[]) {
    super(issues.map((issue) => `${issue.path}: ${issue.message}`).join('\n'));
  }
}

/** A medium, or a part of a mixture, without the mixture itself. */
type PlainMedium = Omit<LibraryMediumInput, 'mixture'>;

/** A material with its constants, or what keeps it from being used. */
type Sampled = { material: ResolvableMaterial; constants: MaterialConstants } | string[];

/**
 * A case with numbers in place of library ids, one sample per wavelength where the case lists several.
 * Layers of one material share their samples. `m` is kept as it stands; the Voigt constant is put in only where
 * m is not zero, so that a film without magnetization is not bound to the wavelengths at which Q is known; so is the
 * second order of a cubic crystal. `tensorState` is used for free tensors and means nothing for other materials.
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
  private readonly newest = new Map<string, ResolvableMaterial>();
  /** What was sampled or refused before: a stack names few materials in many layers. */
  private readonly known = new Map<string, Sampled>();

  constructor(
    private readonly wavelengthNm: number | number[],
    private readonly materials: ReadonlyMap<string, ResolvableMaterial>,
  ) {
    for (const material of materials.values()) {
      const other = this.newest.get(material.id);
      if (!other || other.version < material.version) this.newest.set(material.id, material);
    }
  }

  resolve(medium: LibraryMediumInput, path: string): MediumInput {
    const { mixture, ...plain } = medium;
    const resolved = this.resolvePlain(plain, path, false);
    if (!mixture) return resolved;
    const part = (position: 0 | 1): MixtureInput['parts'][0] =>
      this.resolvePlain(mixture.parts[position], `${path}.mixture.parts[${position}]`, true);
    return { ...resolved, mixture: { ...mixture, parts: [part(0), part(1)] } };
  }

  private resolvePlain(medium: PlainMedium, path: string, isPart: boolean): Omit<MediumInput, 'mixture'> {
    const { material: id, version, assumeConstant = false, tensorState, ...rest } = medium;
    if (id === undefined) return rest;
    const magnetized = rest.m !== undefined && rest.m.some((component) => component !== 0);
    const use = { assumeConstant, magnetized, tensorState };
    const key = JSON.stringify([id, version, use]);
    let sampled = this.known.get(key);
    if (sampled === undefined) {
      sampled = this.sample(id, version, use);
      this.known.set(key, sampled);
    }
    if (Array.isArray(sampled)) {
      for (const message of sampled) this.issues.push({ path: `${path}.material`, message });
      return rest;
    }
    const { material, constants } = sampled;
    this.issues.push(...checkMaterialUse(nameOf(material), material.content, rest, path, isPart));
    return { ...withoutIdleKeys(rest, constants), ...constants };
  }

  private sample(id: string, version: number | undefined, use: MaterialUse): Sampled {
    const material = version === undefined ? this.newest.get(id) : this.materials.get(`${id}@${version}`);
    if (!material) {
      const which = version === undefined ? '' : ` in version ${version}`;
      return [`there is no material ${id}${which}: choose one that is listed among the materials`];
    }
    const messages: string[] = [];
    const constants = materialConstants(nameOf(material), material.content, this.wavelengthNm, use, messages);
    return messages.length > 0 ? messages : { material, constants };
  }
}

function nameOf({ name, id }: ResolvableMaterial): string {
  return `${name} (${id})`;
}

/** Keys that may stand beside the material but have nothing to act on in what it gave. */
function withoutIdleKeys(
  { m, voigtScale, orientationDeg, ...rest }: Omit<MediumInput, 'mixture'>,
  { epsilon, voigt, extraordinary, quadratic }: MaterialConstants,
): Omit<MediumInput, 'mixture'> {
  const hasAxes = epsilon !== undefined || extraordinary !== undefined || quadratic !== undefined;
  return {
    ...rest,
    ...(m !== undefined && epsilon === undefined && { m }),
    ...(voigtScale !== undefined && voigt !== undefined && { voigtScale }),
    ...(orientationDeg !== undefined && hasAxes && { orientationDeg }),
  };
}
