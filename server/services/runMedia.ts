/** Whatever names a library material: a medium, an oxide's, the one behind a slab, a part of a mixture. */
export type NamesMaterial = { material: string; version?: number; assumeConstant?: boolean };

/**
 * The document, or whatever holds media, with everything that names a library material passed through `change`, however
 * deep it stands.
 *
 * @param change gives what stands there instead; `keep` it as it is by returning it
 */
export function mapNamedMaterials<Holder extends object>(
  document: Holder,
  change: (named: NamesMaterial) => object,
): Holder {
  const walk = (value: unknown): unknown => {
    if (Array.isArray(value)) return value.map(walk);
    if (typeof value !== 'object' || value === null) return value;
    if (namesMaterial(value)) return change(value);
    return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, walk(inner)]));
  };
  // Only what names a material was replaced, by what may stand in its place.
  return walk(document) as Holder;
}

/** Everything in a document, or another holder of media, that names a library material. */
export function namedMaterialsOf(document: object): NamesMaterial[] {
  const named: NamesMaterial[] = [];
  mapNamedMaterials(document, (one) => {
    named.push(one);
    return one;
  });
  return named;
}

function namesMaterial(value: object): value is NamesMaterial {
  return 'material' in value && typeof value.material === 'string';
}
