import { useId } from 'react';
import type { ReactNode } from 'react';

type Props = { title: string; children: ReactNode };

/** One part of the form under its heading. */
export function Section({ title, children }: Props) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="card flex min-w-0 flex-col gap-3 px-4 py-3.5">
      <h2 id={id} className="text-lead">
        {title}
      </h2>
      {children}
    </section>
  );
}
