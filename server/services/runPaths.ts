import type { Issue } from '../../shared/error.ts';

/** Fields that a layer of a document carries itself; everything else of a layer of a case is its medium's. */
const OWN_FIELDS = /^(thicknessNm|m|repeat|layers)\b/;

/**
 * Where a field of a solve case stands in the document that the case was made from: `layers[1].index` is
 * `document.layers[1].medium.index`. A material that cannot be used is said of its medium.
 */
export function documentPath(casePath: string): string {
  const path = casePath.replace(/^cases\[\d+\]\./, '').replace(/\.?material$/, '');
  const layer = /^((?:layers\[\d+\]\.)*layers\[\d+\])(?:\.(.+))?$/.exec(path);
  if (layer) {
    const [, place, field] = layer;
    if (field === undefined) return `document.${place}.medium`;
    return OWN_FIELDS.test(field) ? `document.${place}.${field}` : `document.${place}.medium.${field}`;
  }
  return path === 'substrate.m' ? 'document.substrateM' : `document.${path}`;
}

export function toDocumentIssues(issues: Issue[]): Issue[] {
  return issues.map(({ path, message }) => ({ path: documentPath(path), message }));
}
