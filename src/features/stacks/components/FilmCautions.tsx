import { TriangleAlert } from 'lucide-react';
import { memo } from 'react';
import type { StackDocument } from '../../../../shared/stack.ts';
import { filmCautions } from '../model/media.ts';
import { useFilm } from './film.ts';

/** What to know of the film's constants, each said once: a Q from memory, a constant used beyond its wavelength. */
export const FilmCautions = memo(function FilmCautions({ document }: { document: StackDocument }) {
  const { materials, rangeNm } = useFilm();
  const cautions = filmCautions(document, materials, rangeNm);
  if (cautions.length === 0) return null;
  return (
    <ul aria-label="Cautions" className="ml-[38px] text-small text-warn">
      {cautions.map(({ text }) => (
        <li key={text}>
          <TriangleAlert aria-hidden="true" className="mr-1 inline size-3 align-[-1px]" />
          {text}
        </li>
      ))}
    </ul>
  );
});
