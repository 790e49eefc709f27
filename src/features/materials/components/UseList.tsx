import { Link, generatePath } from 'react-router-dom';
import type { MaterialUses } from '../../../../shared/materialEdit.ts';
import { paths } from '../../../lib/paths.ts';

/** Uses of one kind on screen at most. */
const MOST = 12;

type Use = MaterialUses['stacks'][number];

export function isUsed({ stacks, runs, designs, materials }: MaterialUses): boolean {
  return stacks.length + runs.length + designs.length + materials.length > 0;
}

/** The stacks, runs, designs and mixtures that a material is used in, with the versions that they name. */
export function UseList({ uses }: { uses: MaterialUses }) {
  if (!isUsed(uses)) return <p className="text-muted">Nothing of your groups uses it.</p>;
  return (
    <div className="flex flex-col gap-3">
      <Uses what="Stacks" uses={uses.stacks} to={(stackId) => generatePath(paths.stack, { stackId })} />
      <Uses what="Stored runs" uses={uses.runs} to={(runId) => generatePath(paths.run, { runId })} />
      <Uses what="Designs" uses={uses.designs} to={(designId) => generatePath(paths.design, { designId })} />
      <Uses
        what="Mixtures"
        uses={uses.materials}
        to={(materialId) => generatePath(paths.material, { materialId })}
      />
    </div>
  );
}

function Uses({ what, uses, to }: { what: string; uses: Use[]; to: (id: string) => string }) {
  if (uses.length === 0) return null;
  return (
    <div>
      <h3 className="text-note text-muted">{what}</h3>
      <ul>
        {uses.slice(0, MOST).map(({ id, name, versions }) => (
          <li key={id}>
            <Link className="prose-link wrap-anywhere" to={to(id)}>
              {name}
            </Link>
            <span className="text-note text-muted"> {versionsText(versions)}</span>
          </li>
        ))}
      </ul>
      {uses.length > MOST ? <p className="text-note text-muted">and {uses.length - MOST} more</p> : null}
    </div>
  );
}

function versionsText(versions: readonly number[]): string {
  if (versions.length === 0) return 'the newest version';
  return `${versions.length === 1 ? 'version' : 'versions'} ${versions.join(', ')}`;
}
