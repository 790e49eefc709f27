import { useQuery } from '@tanstack/react-query';
import { Download, Printer } from 'lucide-react';
import { generatePath, useNavigate, useParams } from 'react-router-dom';
import type { GrowthCard } from '../../../shared/growthCard.ts';
import { Button } from '../../components/Button.tsx';
import { DeleteButton } from '../../components/DeleteButton.tsx';
import { Page, useDocumentTitle } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { cardQuery, useDeleteCard } from '../../features/cards/api/cards.ts';
import { GrowthCardView } from '../../features/cards/components/GrowthCardView.tsx';
import { mayEdit, useMembership } from '../../features/session/hooks/useSession.ts';
import { apiBase } from '../../lib/apiClient.ts';
import { paths } from '../../lib/paths.ts';

/** `/cards/:cardId`: a growth card, to be read, printed or taken as PDF. */
export function CardPage() {
  const { cardId = '' } = useParams();
  const card = useQuery(cardQuery(cardId));
  useDocumentTitle(card.data?.title ?? 'Growth card');
  if (!card.data) {
    return (
      <Page title="Growth card">
        <QueryGate query={card} what="card">
          {() => null}
        </QueryGate>
      </Page>
    );
  }
  return (
    <div className="mx-auto max-w-[900px] px-4 pt-5 pb-12 sm:px-6 print:max-w-none print:p-0">
      <div data-screen-only className="mb-4 flex flex-wrap items-center gap-2">
        <h1 className="mr-auto text-title">Growth card</h1>
        <Button icon={<Printer size={15} aria-hidden />} onClick={() => window.print()}>
          Print
        </Button>
        <a
          className="inline-flex items-center gap-1.5 rounded-control border border-edge bg-panel px-3.5 py-[7px] leading-[1.35] font-medium text-ink no-underline hover:bg-accent-soft"
          href={`${apiBase}/cards/${card.data.id}/card.pdf`}
          download
        >
          <Download size={15} aria-hidden />
          PDF
        </a>
        <DeleteCard card={card.data} />
      </div>
      <GrowthCardView card={card.data} />
    </div>
  );
}

function DeleteCard({ card }: { card: GrowthCard }) {
  const navigate = useNavigate();
  const membership = useMembership(card.groupId);
  const remove = useDeleteCard(card);
  if (!mayEdit(membership)) return null;
  return (
    <DeleteButton
      title={`Delete the card “${card.title}”?`}
      description="It is gone for everybody in the group, and its link and QR code stop to open."
      action="Delete card"
      remove={remove}
      onDeleted={() => void navigate(generatePath(paths.groupHome, { groupId: card.groupId }))}
    />
  );
}
