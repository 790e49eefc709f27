import type { CreatedLink, Link } from '../../shared/link.ts';
import { shareAddress } from '../services/shareAddress.ts';
import type { LinkWithSubject } from '../services/links.ts';

export function presentLink({ link, subject }: LinkWithSubject): Link {
  return {
    id: link.id,
    opens: subject.opens,
    subjectId: subject.id,
    subjectName: subject.name,
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
export function presentCreatedLink(link: LinkWithSubject, token: string, publicUrl: string): CreatedLink {
  return { ...presentLink(link), url: shareAddress(publicUrl, token) };
}
