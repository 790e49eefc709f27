import { Link, generatePath } from 'react-router-dom';
import type { Design } from '../../../shared/design.ts';
import { kindLabels } from '../../features/designs/model/kinds.ts';
import { formatDateTime } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';

/** What was asked, of which stack, when and by whom. */
export function DesignLine({ design }: { design: Design }) {
  return (
    <>
      {kindLabels[design.kind]},{' '}
      {design.stackId ? (
        <Link className="prose-link" to={generatePath(paths.stack, { stackId: design.stackId })}>
          {design.stackName ?? 'its stack'}
        </Link>
      ) : design.stackName === null ? (
        'not made from a saved stack'
      ) : (
        `${design.stackName}, a stack that was deleted`
      )}
      {`, ${formatDateTime(design.createdAt)}`}
      {design.createdBy ? ` by ${design.createdBy}` : ''}
      {design.isDemo ? '. Demo.' : ''}
    </>
  );
}
