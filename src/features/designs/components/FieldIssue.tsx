import { useIssue } from '../hooks/issueContext.ts';

/** What is wrong with a part that is not a single field, such as a whole list. */
export function FieldIssue({ path }: { path: string }) {
  const message = useIssue(path);
  if (message === undefined) return null;
  return (
    <p role="alert" className="text-note text-danger">
      <span aria-hidden="true">▲ </span>
      {message.charAt(0).toUpperCase() + message.slice(1)}
    </p>
  );
}
