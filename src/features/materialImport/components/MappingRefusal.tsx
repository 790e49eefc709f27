import { ErrorState } from '../../../components/ErrorState.tsx';
import { ApiError } from '../../../lib/apiClient.ts';

/** Why the table gives no constants so, with the step where each cause can be mended. */
export function MappingRefusal({ error, onRetry }: { error: unknown; onRetry: () => void }) {
  const issues = error instanceof ApiError ? error.issues : [];
  if (issues.length === 0) {
    return <ErrorState title="The table could not be converted" error={error} onRetry={onRetry} />;
  }
  return (
    <div role="alert" className="flex flex-col gap-2 rounded-control bg-danger-soft px-3 py-2.5 text-danger">
      <p className="font-semibold">With these answers the table gives no constants of a medium</p>
      <ul className="flex max-w-prose list-disc flex-col gap-1.5 pl-5">
        {issues.map(({ path, message }) => {
          const signs = path.startsWith('habits');
          return (
            <li key={`${path} ${message}`}>
              {message}{' '}
              <a href={signs ? '#step-signs' : '#step-columns'} className="underline">
                {signs ? 'To the signs' : 'To the columns'}
              </a>
            </li>
          );
        })}
      </ul>
    </div>
  );
}
