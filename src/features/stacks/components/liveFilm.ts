import { createContext, use } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { LiveReadings } from '../hooks/useReadings.ts';
import type { LiveSweep } from '../hooks/useSweep.ts';

/** What the numeric core says of the film on the page. */
export type LiveFilm = {
  live: LiveReadings;
  sweep: LiveSweep;
  /** Of the numeric core and of saving. */
  issues: readonly Issue[];
};

export const LiveFilmContext = createContext<LiveFilm | null>(null);

/** @throws Error outside of LiveFilmProvider */
export function useLiveFilm(): LiveFilm {
  const film = use(LiveFilmContext);
  if (!film) throw new Error('useLiveFilm needs a LiveFilmProvider around it');
  return film;
}
