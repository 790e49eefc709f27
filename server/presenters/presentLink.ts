import type { CreatedLink, Link } from '../../shared/link.ts';
import type { LinkWithRun } from '../services/links.ts';

export function presentLink({ link, runId, runName }: LinkWithRun): Link {
  return {
    id: link.id,
    runId,
    runName,
    label: link.label,
    createdAt: link.createdAt.toISOString(),
    createdBy: link.createdBy?.name ?? null,
    expiresAt: link.expiresAt?.toISOString() ?? null,
    revokedAt: link.revokedAt?.toISOString() ?? null,
    lastUsedAt: link.lastUsedAt?.toISOString() ?? null,
    useCount: link.useCount,
  };
}

/** @param publicUrl where people reach the server */
export function presentCreatedLink(link: LinkWithRun, token: string, publicUrl: string): CreatedLink {
  return { ...presentLink(link), url: `${publicUrl}/share/${token}` };
}
