import { Download } from 'lucide-react';
import type { z } from 'zod';
import type { sharedGrowthCardSchema } from '../../../shared/growthCard.ts';
import { Page } from '../../components/Page.tsx';
import { GrowthCardView } from '../../features/cards/components/GrowthCardView.tsx';
import { sharedPath } from '../../features/sharing/api/sharedRun.ts';
import { apiBase } from '../../lib/apiClient.ts';

type Props = { token: string; card: z.infer<typeof sharedGrowthCardSchema> };

/** A shared growth card: to be read, printed or taken as PDF. */
export function OpenCard({ token, card }: Props) {
  return (
    <Page
      title={card.title}
      subtitle="Shared growth card. It was made once and does not change."
      actions={
        <a
          data-screen-only
          className="prose-link inline-flex items-center gap-1.5"
          href={`${apiBase}${sharedPath(token)}/card.pdf`}
          download
        >
          <Download size={14} aria-hidden />
          Card (PDF)
        </a>
      }
    >
      <GrowthCardView card={card} />
    </Page>
  );
}
