import type { Issue } from '../../shared/error.ts';
import type { StackDocument, StackItem, StackLayer } from '../../shared/stack.ts';

/** Fields that a layer of a document carries itself; everything else of a layer of a case is its medium's. */
const OWN_FIELDS = /^(thicknessNm|gradedNm|m|voigtScale|repeat|layers)\b/;

/**
 * Where a field of a solve case stands in the document that the case was made from: `layers[1].index` is
 * `document.layers[1].medium.index`. A material that cannot be used is said of its medium.
 *
 * @param document as given to `toSolveCase`: its oxides and dead parts are layers of their own in the case
 */
export function documentPath(casePath: string, document: StackDocument): string {
  const path = casePath.replace(/^cases\[\d+\]\./, '').replace(/\.?material$/, '');
  const layer = /^((?:layers\[\d+\]\.)*layers\[\d+\])(?:\.(.+))?$/.exec(path);
  if (layer) {
    const [, inCase, field] = layer;
    const place = placesOf(document.layers, 'layers', 'document.layers').get(inCase!) ?? {
      path: `document.${inCase}`,
      medium: `document.${inCase}.medium`,
    };
    if (field === undefined) return place.medium;
    return OWN_FIELDS.test(field) ? `${place.path}.${field}` : `${place.medium}.${field}`;
  }
  if (path === 'substrate.m') return 'document.substrateM';
  if (path === 'substrate.voigtScale') return 'document.substrateVoigtScale';
  if (path === 'substrate.gradedNm') return 'document.substrateGradedNm';
  return /^(wavelengthNm|angleDeg)/.test(path)
    ? `document.workingPoint.${path.replace(/\[\d+\]/, '')}`
    : `document.${path}`;
}

export function toDocumentIssues(issues: Issue[], document: StackDocument): Issue[] {
  return issues.map(({ path, message }) => ({ path: documentPath(path, document), message }));
}

type Place = { path: string; medium: string };

/** Place in the document of every layer and block of the case. */
function placesOf(items: StackItem[], inCase: string, inDocument: string): Map<string, Place> {
  const places = new Map<string, Place>();
  let position = 0;
  items.forEach((item, index) => {
    const path = `${inDocument}[${index}]`;
    if ('layers' in item) {
      const here = `${inCase}[${position}]`;
      places.set(here, { path, medium: path });
      placesOf(item.layers, `${here}.layers`, `${path}.layers`).forEach((place, key) =>
        places.set(key, place),
      );
      position += 1;
      return;
    }
    for (const medium of partsOf(item)) {
      places.set(`${inCase}[${position}]`, { path, medium: `${path}.${medium}` });
      position += 1;
    }
  });
  return places;
}

/** The media of the layers that one layer becomes in a case, from the light down (shared/stackCase.ts). */
function partsOf({ oxide, dead }: StackLayer): string[] {
  return [
    ...((oxide?.consumedNm ?? 0) > 0 ? ['oxide.medium'] : []),
    ...((dead?.topNm ?? 0) > 0 ? ['medium'] : []),
    'medium',
    ...((dead?.bottomNm ?? 0) > 0 ? ['medium'] : []),
  ];
}
