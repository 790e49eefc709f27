import { TriangleAlert } from 'lucide-react';
import type { Issue } from '../../../../shared/error.ts';
import type { StackMedium } from '../../../../shared/stack.ts';
import { mediumNotes } from '../model/media.ts';
import { useFilm } from './film.ts';

type Props = {
  medium: StackMedium;
  magnetized: boolean;
  issues: readonly Issue[];
  onChange?: ((medium: StackMedium) => void) | undefined;
};

/** What stands in the way of a medium's constants, at the medium, with what can be done about it. */
export function MediumNotes({ medium, magnetized, issues, onChange }: Props) {
  const { materials, rangeNm } = useFilm();
  // Cautions stand below the drawing, once for all layers of the material.
  const notes = mediumNotes(medium, materials, rangeNm, magnetized).filter(({ tone }) => tone === 'problem');
  // The page knows most of it before the server says so; then it is said once.
  const shownIssues = notes.length > 0 ? issues.filter(({ path }) => !path.endsWith('material')) : issues;
  if (notes.length === 0 && shownIssues.length === 0) return null;
  return (
    <div className="mx-2 mb-1.5 flex flex-col gap-1 rounded-box bg-paper/90 px-2 py-1 text-small">
      {notes.map(({ text, offer }) => (
        <p key={text} className="text-danger">
          <TriangleAlert aria-hidden="true" className="mr-1 inline size-3 align-[-1px]" />
          {text}{' '}
          {offer && onChange && (
            <button
              type="button"
              className="font-semibold underline underline-offset-2"
              onClick={() => onChange({ ...medium, assumeConstant: true })}
            >
              Use it at other wavelengths too
            </button>
          )}
        </p>
      ))}
      {shownIssues.map(({ path, message }) => (
        <p key={path + message} className="text-danger">
          <TriangleAlert aria-hidden="true" className="mr-1 inline size-3 align-[-1px]" />
          {path ? `${path}: ` : ''}
          {message}
        </p>
      ))}
    </div>
  );
}
