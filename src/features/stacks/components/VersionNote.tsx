import { Link } from 'react-router-dom';
import type { StackMedium } from '../../../../shared/stack.ts';
import { formatFormula } from '../../../lib/format.ts';
import { isOutdated, usedVersions } from '../model/versions.ts';
import { useFilm } from './film.ts';
import { historyPath } from './materialPaths.ts';

type Props = {
  /** The media of one place of the film, such as a layer and its oxide. */
  media: readonly (StackMedium | undefined)[];
  /** Takes the newest version of every one of them. */
  onTake: (() => void) | undefined;
};

/** Says at a medium that its material has a newer version, and takes it. Nothing changes until then. */
export function VersionNote({ media, onTake }: Props) {
  const { materials } = useFilm();
  const older = media
    .flatMap((medium) => (medium ? usedVersions(medium, materials) : []))
    .filter(isOutdated)
    .filter(({ id }, index, all) => all.findIndex((one) => one.id === id) === index);
  if (older.length === 0 || !onTake) return null;
  return (
    <p className="mx-2 mb-1.5 rounded-box bg-paper/85 px-2 py-1 text-small text-muted">
      {older.map(({ id, version, newest }) => (
        <span key={id}>
          {formatFormula(materials.get(id)?.formula ?? id)} version {version}; version {newest} exists (
          <Link className="prose-link" to={historyPath(id)}>
            what changed
          </Link>
          ).{' '}
        </span>
      ))}
      <button type="button" className="font-semibold text-accent hover:underline" onClick={onTake}>
        {older.length === 1 ? `Take version ${older[0]!.newest}` : 'Take the newer ones'}
      </button>
    </p>
  );
}
