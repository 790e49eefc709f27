import { Link, generatePath } from 'react-router-dom';
import type { Study } from '../../../shared/study.ts';
import { formatDateTime } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';

/** Where the study stands and who saved it last. */
export function StudyLine({ study }: { study: Study }) {
  return (
    <>
      <Link className="prose-link" to={generatePath(paths.studies, { groupId: study.groupId })}>
        Studies
      </Link>
      {`, version ${study.version}, saved ${formatDateTime(study.updatedAt)}`}
      {study.updatedBy ? ` by ${study.updatedBy}` : ''}
      {study.isDemo ? '. Demo.' : ''}
    </>
  );
}
