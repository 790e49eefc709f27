import { useQuery } from '@tanstack/react-query';
import { QueryGate } from '../../../components/QueryGate.tsx';
import { formatDateTime } from '../../../lib/format.ts';
import { studyVersionsQuery } from '../api/study.ts';

/** Who saved what when, newest first. */
export function StudyVersions({ studyId, version }: { studyId: string; version: number }) {
  const versions = useQuery(studyVersionsQuery(studyId, version));
  return (
    <section aria-labelledby="history-heading">
      <h2 id="history-heading" className="mb-2 text-lead">
        History
      </h2>
      <QueryGate query={versions} what="versions">
        {(data) => (
          <ol className="flex flex-col gap-2">
            {data.versions.map((one) => (
              <li key={one.version} className="border-b border-line pb-2 last:border-b-0">
                <p className="text-note text-muted">
                  Version {one.version}, {formatDateTime(one.savedAt)}
                  {one.savedBy ? ` by ${one.savedBy}` : ''}
                </p>
                <ul className="list-disc pl-5">
                  {one.changes.map((change) => (
                    <li key={change}>{change}</li>
                  ))}
                </ul>
              </li>
            ))}
          </ol>
        )}
      </QueryGate>
    </section>
  );
}
