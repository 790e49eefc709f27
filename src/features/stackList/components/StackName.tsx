import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Link, generatePath } from 'react-router-dom';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { StackSummary } from '../../../../shared/stack.ts';
import { paths } from '../../../lib/paths.ts';
import { useInView } from '../../../lib/useInView.ts';
import { stackDocumentQuery } from '../api/stackDocument.ts';
import { outlineOf } from '../outline.ts';
import { StackGlyph } from './StackGlyph.tsx';

/** Thumbnail, name and the layers in a line. The document is fetched when the row comes into sight. */
export function StackName({
  stack,
  materials,
}: {
  stack: StackSummary;
  materials: readonly MaterialSummary[];
}) {
  const [row, seen] = useInView<HTMLDivElement>();
  const document = useQuery({ ...stackDocumentQuery(stack), enabled: seen });
  const outline = useMemo(
    () => (document.data ? outlineOf(document.data, materials) : null),
    [document.data, materials],
  );
  return (
    <div ref={row} className="flex min-w-0 items-center gap-3">
      <StackGlyph outline={outline} />
      <div className="min-w-0">
        <Link
          to={generatePath(paths.stack, { stackId: stack.id })}
          className="font-semibold text-ink no-underline hover:text-accent hover:underline"
        >
          {stack.name}
        </Link>
        {stack.isDemo ? <span className="ml-2 text-small font-normal text-muted">demo</span> : null}
        <div className="line-clamp-1 text-note font-normal text-muted">{outline?.text ?? ' '}</div>
      </div>
    </div>
  );
}
