import type { StackDocument, StackItem, StackMedium } from '../../../../shared/stack.ts';
import { isBlock } from './items.ts';
import type { Materials } from './media.ts';

/** A library material in the version in which a medium uses it. */
export type UsedVersion = {
  id: string;
  /** Null where the medium names none: it is pinned when the stack is saved. */
  version: number | null;
  /** The newest that there is; null for a material that is not in reach. */
  newest: number | null;
};

type Named = Pick<StackMedium, 'material' | 'version' | 'assumeConstant'>;

/** Passes the medium, or each part of a mixture, through `change`. The same medium comes back when nothing changed. */
function mapNamed(medium: StackMedium, change: <One extends Named>(named: One) => One): StackMedium {
  const { mixture } = medium;
  if (!mixture) return change(medium);
  const [first, second] = [change(mixture.parts[0]), change(mixture.parts[1])];
  return first === mixture.parts[0] && second === mixture.parts[1]
    ? medium
    : { ...medium, mixture: { ...mixture, parts: [first, second] } };
}

/** The library materials of a medium: itself, or the parts of a mixture. */
export function usedVersions(medium: StackMedium, materials: Materials): UsedVersion[] {
  const used: UsedVersion[] = [];
  mapNamed(medium, (named) => {
    if (named.material !== undefined) {
      const newest = materials.get(named.material)?.version ?? null;
      used.push({ id: named.material, version: named.version ?? null, newest });
    }
    return named;
  });
  return used;
}

export function isOutdated({ version, newest }: UsedVersion): boolean {
  return version !== null && newest !== null && version < newest;
}

/** The medium with the newest version of its materials. */
export function withNewest(medium: StackMedium, materials: Materials): StackMedium {
  return mapNamed(medium, (named) => {
    const newest = named.material === undefined ? undefined : materials.get(named.material)?.version;
    const older = newest !== undefined && named.version !== undefined && named.version < newest;
    return older ? { ...named, version: newest } : named;
  });
}

/** The film with every medium passed through `change`: layers, oxides, what light comes from and leaves to. */
export function mapMedia(
  document: StackDocument,
  change: (medium: StackMedium) => StackMedium,
): StackDocument {
  const changeItem = (item: StackItem): StackItem => {
    if (isBlock(item)) return { ...item, layers: item.layers.map(changeItem) };
    const { oxide } = item;
    return {
      ...item,
      medium: change(item.medium),
      ...(oxide ? { oxide: { ...oxide, medium: change(oxide.medium) } } : {}),
    };
  };
  const { backside } = document;
  return {
    ...document,
    incident: change(document.incident),
    layers: document.layers.map(changeItem),
    substrate: change(document.substrate),
    ...(backside ? { backside: { ...backside, exit: change(backside.exit) } } : {}),
  };
}

/** Every material of the film in every version used, each once, in the order in which light meets it. */
export function filmVersions(document: StackDocument, materials: Materials): UsedVersion[] {
  const used = new Map<string, UsedVersion>();
  mapMedia(document, (medium) => {
    for (const one of usedVersions(medium, materials)) {
      const key = `${one.id}@${one.version ?? 'newest'}`;
      if (!used.has(key)) used.set(key, one);
    }
    return medium;
  });
  return [...used.values()];
}

/** The film with one material taken in its newest version wherever it stands, or every material. */
export function withNewestEverywhere(
  document: StackDocument,
  materials: Materials,
  only: string | null = null,
): StackDocument {
  const known = only === null ? materials : new Map([...materials].filter(([id]) => id === only));
  return mapMedia(document, (medium) => withNewest(medium, known));
}
