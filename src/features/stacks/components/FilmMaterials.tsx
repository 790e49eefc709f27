import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { StackDocument } from '../../../../shared/stack.ts';
import { formatFormula } from '../../../lib/format.ts';
import type { EditDocument } from '../hooks/useStackEditor.ts';
import type { Materials } from '../model/media.ts';
import { filmVersions, isOutdated, withNewestEverywhere } from '../model/versions.ts';
import type { UsedVersion } from '../model/versions.ts';
import { historyPath, versionPath } from './materialPaths.ts';

type Props = {
  document: StackDocument;
  materials: Materials;
  /** Null for those who may look but not change. */
  edit: EditDocument | null;
};

/** The library materials of the film with the version that each is used in, and the newer ones that there are. */
export function FilmMaterials({ document, materials, edit }: Props) {
  const [open, setOpen] = useState(false);
  const used = filmVersions(document, materials);
  const older = used.filter(isOutdated).length;
  if (used.length === 0) return null;
  const take = (only: string | null) => edit?.((now) => withNewestEverywhere(now, materials, only), null);
  return (
    <details
      onToggle={(event) => setOpen(event.currentTarget.open)}
      className="mt-3 ml-[38px] rounded-control border border-line bg-panel px-3 py-2 text-note"
    >
      <summary className="rounded-box">
        <span className="font-semibold">Materials</span>{' '}
        <span className="text-muted">
          {used.length} from the library
          {older > 0 ? `, ${older} with a newer version` : ', all in the newest version'}
        </span>
      </summary>
      {open && (
        <ul aria-label="Materials of the film" className="flex flex-col gap-1.5 pt-2">
          {used.map((one) => (
            <li key={`${one.id}@${one.version}`}>
              <MaterialLine used={one} materials={materials} onTake={edit ? () => take(one.id) : null} />
            </li>
          ))}
        </ul>
      )}
      {edit && older > 1 && (
        <button
          type="button"
          className="mt-2 rounded-box font-semibold text-accent hover:underline"
          onClick={() => take(null)}
        >
          Take every newer version
        </button>
      )}
    </details>
  );
}

type LineProps = { used: UsedVersion; materials: Materials; onTake: (() => void) | null };

function MaterialLine({ used, materials, onTake }: LineProps) {
  const { id, version, newest } = used;
  const name = formatFormula(materials.get(id)?.formula ?? id);
  if (newest === null) {
    return (
      <span>
        <b className="font-semibold">{name}</b>, {version === null ? 'no version' : `version ${version}`}: not
        in the library of this group.
      </span>
    );
  }
  return (
    <span className="flex flex-wrap items-baseline gap-x-2">
      <Link className="prose-link font-semibold" to={versionPath(id, version)}>
        {name}
      </Link>
      <span className="text-muted">{stateWords(used)}</span>
      <Link className="prose-link" to={historyPath(id)} aria-label={`History of ${name}`}>
        history
      </Link>
      {onTake && isOutdated(used) && (
        <button type="button" className="font-semibold text-accent hover:underline" onClick={onTake}>
          Take version {newest}
        </button>
      )}
    </span>
  );
}

function stateWords({ version, newest }: UsedVersion): string {
  if (version === null) return `the newest, version ${newest}; pinned to it when the stack is saved`;
  return version === newest
    ? `version ${version}, the newest`
    : `version ${version}; version ${newest} exists`;
}
