import { useQuery } from '@tanstack/react-query';
import { Link, generatePath } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { cancelledCardQuery } from '../api/cards.ts';

/** What became of a card that was cancelled, which may have been stored in that very moment. */
export function CancelledCard({ groupId, requestKey }: { groupId: string; requestKey: string }) {
  const { data, isError } = useQuery(cancelledCardQuery(groupId, requestKey));
  const outcome = () => {
    if (isError) {
      return (
        <>
          Cancelled. If the card was stored in that moment, it is among{' '}
          <Link className="prose-link" to={generatePath(paths.groupHome, { groupId })}>
            the growth cards of the group
          </Link>
          .
        </>
      );
    }
    if (!data || data.progress) return 'Cancelled. Finding out whether the card was stored in that moment.';
    if (data.cardId === null) return 'Cancelled: no card was made. What you filled in is as it was.';
    return (
      <>
        The cancel came too late:{' '}
        <Link className="prose-link" to={generatePath(paths.card, { cardId: data.cardId })}>
          the card was stored
        </Link>
        . Delete it there if it is not wanted.
      </>
    );
  };
  return (
    <p role="status" className="text-note text-muted">
      {outcome()}
    </p>
  );
}
