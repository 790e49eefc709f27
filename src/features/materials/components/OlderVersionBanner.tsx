import { History } from 'lucide-react';
import { Link, generatePath } from 'react-router-dom';
import type { Material } from '../../../../shared/material.ts';
import { paths } from '../../../lib/paths.ts';

/** Says that the page shows constants that have been replaced since. */
export function OlderVersionBanner({ material }: { material: Material }) {
  const { id, version, newestVersion } = material;
  if (version === newestVersion) return null;
  return (
    <p role="status" className="mb-4 flex gap-2 rounded-control bg-warn-soft px-3 py-2 text-warn">
      <History aria-hidden="true" className="mt-0.5 size-4 shrink-0" />
      <span>
        This is version {version}, an older one. Stored runs that name it keep it.{' '}
        <Link className="underline" to={generatePath(paths.material, { materialId: id })}>
          Show version {newestVersion}, the newest
        </Link>
      </span>
    </p>
  );
}
