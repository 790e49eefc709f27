import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { ErrorState } from '../../components/ErrorState.tsx';
import { Page } from '../../components/Page.tsx';
import { ApiError } from '../../lib/apiClient.ts';
import { paths } from '../../lib/paths.ts';

/** A link that no longer opens is an answer, not a failure; anything else can be tried again. */
export function ClosedShare({ error, onRetry }: { error: Error; onRetry: () => void }) {
  const status = error instanceof ApiError ? error.status : 0;
  if (status === 410) {
    return (
      <Closed title="This link no longer opens">
        It was revoked by the group that made it, or it has expired. What it opened may still exist: ask the
        person who sent you the link for a new one.
      </Closed>
    );
  }
  if (status === 404) {
    return (
      <Closed title="There is no such link">
        The address may have been cut off when it was copied. A share link ends in a long row of letters and
        digits; check that all of it is there, or ask for it again.
      </Closed>
    );
  }
  return (
    <Page title="Shared page" width="text">
      <ErrorState title="The shared page could not be opened" error={error} onRetry={onRetry} />
    </Page>
  );
}

function Closed({ title, children }: { title: string; children: ReactNode }) {
  return (
    <Page title={title} width="text">
      <p className="max-w-prose text-muted">{children}</p>
      <p className="mt-4">
        <Link className="prose-link" to={paths.conventions}>
          What Skewlight computes, and its conventions
        </Link>
      </p>
    </Page>
  );
}
