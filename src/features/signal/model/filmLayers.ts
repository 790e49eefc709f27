import type { StackDocument, StackItem, StackLayer, StackMedium } from '../../../../shared/stack.ts';

/** What a layer is called and how it is filled on the drawing. */
export type DescribeMedium = (medium: StackMedium) => { name: string; fill: string };

/** One layer of the expanded film, parts of a real sample (oxide, dead parts) counted as layers of their own. */
export type FilmLayer = {
  /** Where it stands in the solve case, such as `layers[1].layers[0]`. */
  path: string;
  /** The layer of the document that it belongs to. */
  layerId: string;
  /** `Co`, or `Co 3` where there are several magnetic layers of that name. */
  label: string;
  fill: string;
  magnetic: boolean;
  topNm: number;
  thicknessNm: number;
  /** Width of the graded zone about its upper face, nm. */
  gradedNm: number;
};

type Part = { name: string; fill: string; thicknessNm: number; magnetic: boolean };

/** The film with its blocks expanded, from the surface down; the substrate is not among its layers. */
export function filmLayers(document: StackDocument, describe: DescribeMedium): FilmLayer[] {
  const layers: FilmLayer[] = [];
  let topNm = 0;
  const visit = (items: readonly StackItem[], prefix: string) => {
    let position = 0;
    for (const item of items) {
      if ('layers' in item) {
        const path = `${prefix}layers[${position}]`;
        for (let turn = 0; turn < item.repeat; turn++) visit(item.layers, `${path}.`);
        position++;
        continue;
      }
      for (const [index, part] of partsOf(item, describe).entries()) {
        layers.push({
          path: `${prefix}layers[${position}]`,
          layerId: item.id,
          label: part.name,
          fill: part.fill,
          magnetic: part.magnetic,
          topNm,
          thicknessNm: part.thicknessNm,
          gradedNm: index === 0 ? (item.gradedNm ?? 0) : 0,
        });
        topNm += part.thicknessNm;
        position++;
      }
    }
  };
  visit(document.layers, '');
  return numbered(layers);
}

/** As `toSolveCase` cuts a layer: oxide, dead top, live part, dead bottom; those that have a thickness. */
function partsOf(layer: StackLayer, describe: DescribeMedium): Part[] {
  const { oxide, dead } = layer;
  const own = describe(layer.medium);
  const consumedNm = oxide?.consumedNm ?? 0;
  const [topNm, bottomNm] = [dead?.topNm ?? 0, dead?.bottomNm ?? 0];
  const parts: Part[] = [];
  if (oxide && consumedNm > 0) {
    parts.push({ ...describe(oxide.medium), thicknessNm: consumedNm * oxide.expansion, magnetic: false });
  }
  const silent = { ...own, name: `${own.name}, dead`, magnetic: false };
  if (topNm > 0) parts.push({ ...silent, thicknessNm: topNm });
  const liveNm = layer.thicknessNm - consumedNm - topNm - bottomNm;
  parts.push({ ...own, thicknessNm: liveNm, magnetic: layer.m !== undefined });
  if (bottomNm > 0) parts.push({ ...silent, thicknessNm: bottomNm });
  return parts;
}

function numbered(layers: FilmLayer[]): FilmLayer[] {
  const totals = new Map<string, number>();
  for (const { label, magnetic } of layers) {
    if (magnetic) totals.set(label, (totals.get(label) ?? 0) + 1);
  }
  const counts = new Map<string, number>();
  return layers.map((layer) => {
    if (!layer.magnetic || (totals.get(layer.label) ?? 0) < 2) return layer;
    const count = (counts.get(layer.label) ?? 0) + 1;
    counts.set(layer.label, count);
    return { ...layer, label: `${layer.label} ${count}` };
  });
}
