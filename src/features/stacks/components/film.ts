import { createContext, use } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { Materials } from '../model/media.ts';
import type { MaterialAt } from '../hooks/useMaterials.ts';
import type { EditDocument } from '../hooks/useStackEditor.ts';

/** What every part of the drawing needs: the library, how to change the film, and what is wrong with it. */
export type Film = {
  materials: Materials;
  /** What a layer can be made of. */
  library: readonly MaterialSummary[];
  /** Asks for a material in full; null where none is needed, as in a picture. */
  materialAt: MaterialAt | null;
  /** Null for those who may look but not change. */
  edit: EditDocument | null;
  /** Lowest and highest wavelength that the page asks for, nm. */
  rangeNm: readonly [number, number];
  /** Issues of the server by item id (or `incident`, `substrate`), path cut to the field. */
  issues: ReadonlyMap<string, readonly Issue[]>;
  /** Says a change in words to screen readers. */
  announce: (text: string) => void;
};

export const FilmContext = createContext<Film>({
  materials: new Map(),
  library: [],
  materialAt: null,
  edit: null,
  rangeNm: [0, 0],
  issues: new Map(),
  announce: () => undefined,
});

export function useFilm(): Film {
  return use(FilmContext);
}
