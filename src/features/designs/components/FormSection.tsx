import { useId } from 'react';
import type { ReactNode } from 'react';

/** One part of the question under its heading. */
export function FormSection({
  title,
  hint,
  children,
}: {
  title: string;
  hint?: string;
  children: ReactNode;
}) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="card flex min-w-0 flex-col gap-3 px-4 py-3.5">
      <div>
        <h2 id={id} className="text-lead">
          {title}
        </h2>
        {hint ? <p className="text-note text-muted">{hint}</p> : null}
      </div>
      {children}
    </section>
  );
}
