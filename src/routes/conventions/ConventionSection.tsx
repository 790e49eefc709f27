import { Link2 } from 'lucide-react';
import type { ReactNode } from 'react';

type ConventionSectionProps = {
  /** The anchor: readings all over the program link to it, so it never changes. */
  id: string;
  title: string;
  children: ReactNode;
};

export function ConventionSection({ id, title, children }: ConventionSectionProps) {
  return (
    <section aria-labelledby={id} className="mb-8">
      <h3 id={id} className="group mb-2 text-lead target:text-accent">
        <a href={`#${id}`} className="inline-flex items-center gap-1.5 text-inherit no-underline">
          {title}
          <Link2
            aria-hidden="true"
            className="size-3.5 opacity-0 group-hover:opacity-60 group-focus-within:opacity-60"
          />
        </a>
      </h3>
      <div className="flex flex-col gap-2.5">{children}</div>
    </section>
  );
}

/** An equation on a line of its own. */
export function Formula({ children }: { children: ReactNode }) {
  return <div className="pl-4 text-lead leading-[1.9] sm:pl-6">{children}</div>;
}

/** A fraction with a bar; read as "top over bottom". */
export function Fraction({ top, bottom }: { top: ReactNode; bottom: ReactNode }) {
  return (
    <span className="inline-flex flex-col items-center align-middle leading-snug">
      <span className="px-1">{top}</span>
      <span className="sr-only"> over </span>
      <span className="border-t border-ink px-1">{bottom}</span>
    </span>
  );
}

/** A 3 by 3 matrix in brackets, rows x, y, z. */
export function Matrix({ rows }: { rows: readonly (readonly ReactNode[])[] }) {
  return (
    <span className="inline-flex items-stretch align-middle">
      <span className="w-1.5 border-y-[1.5px] border-l-[1.5px] border-ink" />
      <table>
        <tbody>
          {rows.map((row, rowPosition) => (
            <tr key={rowPosition}>
              {row.map((entry, position) => (
                <td key={position} className="px-2 text-center leading-snug">
                  {entry}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <span className="w-1.5 border-y-[1.5px] border-r-[1.5px] border-ink" />
    </span>
  );
}
