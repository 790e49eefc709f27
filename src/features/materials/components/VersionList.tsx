import { useQuery } from '@tanstack/react-query';
import { Link, generatePath } from 'react-router-dom';
import { QueryGate } from '../../../components/QueryGate.tsx';
import { formatDateTime } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { materialVersionsQuery } from '../api/materialVersions.ts';

/** Who changed what and when, newest first; each version opens here. */
export function VersionList({ materialId, shown }: { materialId: string; shown: number }) {
  const versions = useQuery(materialVersionsQuery(materialId));
  return (
    <QueryGate query={versions} what="versions">
      {(data) => (
        <ol reversed className="flex flex-col gap-3">
          {data.versions.map(({ version, author, madeAt, note, changes }) => (
            <li key={version} aria-current={version === shown ? 'true' : undefined}>
              <div className="flex flex-wrap items-baseline gap-x-2">
                {version === shown ? (
                  <span className="font-semibold">Version {version}, shown here</span>
                ) : (
                  <Link
                    className="prose-link"
                    to={`${generatePath(paths.material, { materialId })}?version=${version}`}
                  >
                    Version {version}
                  </Link>
                )}
                <span className="text-note text-muted">
                  {formatDateTime(madeAt)}, {author ?? 'shipped with the program'}
                </span>
              </div>
              {note ? <p className="whitespace-pre-line">{note}</p> : null}
              {changes.length > 0 ? (
                <ul className="list-disc pl-5 text-note text-muted">
                  {changes.map((change) => (
                    <li key={change}>{change}</li>
                  ))}
                </ul>
              ) : null}
            </li>
          ))}
        </ol>
      )}
    </QueryGate>
  );
}
