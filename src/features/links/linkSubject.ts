import { generatePath } from 'react-router-dom';
import type { Link } from '../../../shared/link.ts';
import { paths } from '../../lib/paths.ts';

/** What a link opens, in a word. */
export const subjectWords: Record<Link['opens'], string> = {
  run: 'run',
  design: 'design',
  study: 'study',
  card: 'growth card',
};

/** The page of what a link opens, for members of the group. */
export function subjectPath({ opens, subjectId }: Link): string {
  switch (opens) {
    case 'run':
      return generatePath(paths.run, { runId: subjectId });
    case 'design':
      return generatePath(paths.design, { designId: subjectId });
    case 'study':
      return generatePath(paths.study, { studyId: subjectId });
    case 'card':
      return generatePath(paths.card, { cardId: subjectId });
  }
}
