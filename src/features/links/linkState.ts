import type { Link } from '../../../shared/link.ts';
import { formatDate } from '../../lib/format.ts';

/** Whether a link still opens, in words. */
export function linkState(link: Link, now = Date.now()): { open: boolean; text: string } {
  if (link.revokedAt) return { open: false, text: `revoked ${formatDate(link.revokedAt)}` };
  if (!link.expiresAt) return { open: true, text: 'opens, no end' };
  const ended = new Date(link.expiresAt).getTime() <= now;
  return { open: !ended, text: `${ended ? 'expired' : 'opens until'} ${formatDate(link.expiresAt)}` };
}
