import { Link, generatePath } from 'react-router-dom';
import { cardTime } from '../../../../shared/cardWords.ts';
import type { z } from 'zod';
import type { growthCardListSchema } from '../../../../shared/growthCard.ts';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { paths } from '../../../lib/paths.ts';

type ListedCard = z.infer<typeof growthCardListSchema>['cards'][number];

const columns: readonly Column<ListedCard>[] = [
  {
    id: 'title',
    header: 'Card',
    value: ({ title }) => title,
    cell: ({ id, title }) => (
      <Link className="prose-link" to={generatePath(paths.card, { cardId: id })}>
        {title}
      </Link>
    ),
  },
  { id: 'sample', header: 'Sample', value: ({ sampleId }) => sampleId || null },
  { id: 'by', header: 'Decided by', value: ({ decision }) => decision.by },
  {
    id: 'at',
    header: 'Made',
    value: ({ createdAt }) => createdAt,
    cell: ({ createdAt }) => cardTime(createdAt),
  },
];

/** The growth cards of a group, newest first. */
export function CardTable({ cards }: { cards: readonly ListedCard[] }) {
  return (
    <DataTable
      caption="Growth cards"
      columns={columns}
      rows={cards}
      rowKey={({ id }) => id}
      empty={null}
      initialSort={{ id: 'at', descending: true }}
    />
  );
}
