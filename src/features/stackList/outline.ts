import type { MaterialClass, MaterialSummary } from '../../../shared/material.ts';
import type { StackDocument, StackItem, StackMedium } from '../../../shared/stack.ts';
import { formatFormula, formatPlain } from '../../lib/format.ts';

export type Band = { label: string; class: MaterialClass | null; thicknessNm: number; magnetic: boolean };
export type Outline = { bands: Band[]; substrate: Omit<Band, 'thicknessNm'>; text: string };

/** Bands beyond this are too thin to see in a drawing of a row's height. */
const mostBands = 60;

/** A stack in few words and few bands: what the list shows beside its name. */
export function outlineOf(document: StackDocument, materials: readonly MaterialSummary[]): Outline {
  const byId = new Map(materials.map((material) => [material.id, material]));
  const substrate = bandOf(document.substrate, byId, document.substrateM !== undefined);
  const bands: Band[] = [];
  const visit = (items: StackItem[]) => {
    for (const item of items) {
      if (bands.length >= mostBands) return;
      if ('layers' in item) {
        // More repeats than there can be bands change nothing.
        for (let n = 0; n < Math.min(item.repeat, mostBands); n++) visit(item.layers);
      } else {
        bands.push({ ...bandOf(item.medium, byId, item.m !== undefined), thicknessNm: item.thicknessNm });
      }
    }
  };
  visit(document.layers);
  const layers = textOf(document.layers, byId);
  return { bands, substrate, text: layers ? `${layers} on ${substrate.label}` : `${substrate.label}, bare` };
}

type MaterialsById = ReadonlyMap<string, MaterialSummary>;

function bandOf(medium: StackMedium, byId: MaterialsById, magnetic: boolean): Omit<Band, 'thicknessNm'> {
  const material = medium.material === undefined ? undefined : byId.get(medium.material);
  const label = material ? formatFormula(material.formula) : (medium.label ?? medium.material ?? 'typed-in');
  return { label, class: material?.class ?? null, magnetic };
}

function textOf(items: StackItem[], byId: MaterialsById): string {
  return items
    .map((item) =>
      'layers' in item
        ? `[${textOf(item.layers, byId)}] × ${item.repeat}`
        : `${bandOf(item.medium, byId, false).label} ${formatPlain(item.thicknessNm)}`,
    )
    .join(' / ');
}
