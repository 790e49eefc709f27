import { useIssuesBelow } from '../hooks/issueContext.ts';

/** What is wrong in a part of the form at no field of its own. */
export function SectionIssues({ path, isField }: { path: string; isField: (path: string) => boolean }) {
  const issues = useIssuesBelow(path, isField);
  if (issues.length === 0) return null;
  return (
    <ul className="rounded-control bg-danger-soft px-3 py-2 text-note text-danger">
      {issues.map((issue) => (
        <li key={issue.path + issue.message}>
          <span aria-hidden="true">▲ </span>
          <code>{issue.path}</code> {issue.message}
        </li>
      ))}
    </ul>
  );
}
