import { ApiError } from '../lib/apiClient.ts';
import type { ApiErrorCode } from '../lib/apiClient.ts';
import { Button } from './Button.tsx';

type ErrorStateProps = {
  error: unknown;
  /** What could not be done, such as "The stacks could not be loaded". */
  title?: string;
  onRetry?: (() => void) | undefined;
};

/** What a reader can do about each kind of failure. */
function remedyFor(code: ApiErrorCode): string {
  switch (code) {
    case 'network':
      return 'This page tries again by itself as soon as the server answers.';
    case 'unavailable':
      return 'The server or its database is not there at the moment. This page tries again by itself; nothing you saved is lost.';
    case 'not-found':
      return 'It may have been deleted, or it belongs to a group you are not a member of.';
    case 'forbidden':
      return 'Ask an owner of the group for a role that may do this.';
    case 'gone':
      return 'Ask the person who sent the link for a new one.';
    case 'unauthenticated':
      return 'Sign in again.';
    case 'conflict':
      return 'Reload to see the newest state, then repeat the change.';
    case 'too-many-requests':
      return 'Wait a minute before the next try.';
    case 'invalid':
    case 'too-large':
      return 'Change the input and try again.';
    case 'unreadable':
    case 'internal':
      return 'Try again; if it stays, report the request id to whoever runs this server.';
  }
}

export function ErrorState({ error, title, onRetry }: ErrorStateProps) {
  const known = error instanceof ApiError ? error : null;
  const message = error instanceof Error ? error.message : 'Something went wrong.';
  return (
    <div
      role="alert"
      className="flex flex-col items-start gap-2 rounded-card border border-danger bg-panel px-5 py-4"
    >
      <p className="font-semibold text-danger">{title ?? message}</p>
      {title ? <p>{message}</p> : null}
      {known?.issues.length ? (
        <ul className="list-disc pl-5 text-note">
          {known.issues.map((issue) => (
            <li key={`${issue.path} ${issue.message}`}>
              <code>{issue.path}</code>: {issue.message}
            </li>
          ))}
        </ul>
      ) : null}
      <p className="text-muted">
        {known ? remedyFor(known.code) : 'Reload the page; if it stays, report what you did.'}
      </p>
      {known?.requestId ? (
        <p className="text-note text-muted">
          Request id <code className="select-all">{known.requestId}</code>
        </p>
      ) : null}
      {onRetry ? <Button onClick={onRetry}>Try again</Button> : null}
    </div>
  );
}
