import type { ReactNode } from 'react';

type EmptyStateProps = {
  title: string;
  /** What would stand here and how to get it. */
  children?: ReactNode;
  action?: ReactNode;
};

/** Nothing here yet, or nothing found: said in words, with the next step. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-2 rounded-card border border-dashed border-edge px-5 py-6">
      <p className="font-semibold">{title}</p>
      {children ? <div className="max-w-prose text-muted">{children}</div> : null}
      {action ? <div className="mt-1">{action}</div> : null}
    </div>
  );
}
