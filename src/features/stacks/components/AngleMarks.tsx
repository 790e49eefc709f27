import { CopyButton } from '../../../components/CopyButton.tsx';
import type { AngleMark } from '../model/angleMarks.ts';

/** The marks of an angle sweep in words, below the plot. */
export function AngleMarks({ marks }: { marks: readonly AngleMark[] }) {
  if (marks.length === 0) return null;
  return (
    <section
      aria-label="Angles of this film"
      className="mt-1 flex flex-wrap items-start justify-between gap-x-4 gap-y-1 border-t border-line pt-1.5"
    >
      <ul className="text-note text-muted tabular-nums">
        {marks.map(({ words }) => (
          <li key={words}>{words}</li>
        ))}
      </ul>
      <CopyButton text={marks.map(({ words }) => words).join('\n')} what="the angles" />
    </section>
  );
}
