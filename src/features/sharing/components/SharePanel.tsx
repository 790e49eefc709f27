import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Link } from '../../../../shared/link.ts';
import { Button } from '../../../components/Button.tsx';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { formatDate, formatSince } from '../../../lib/format.ts';
import { linksQuery, useRevokeLink } from '../api/links.ts';
import type { LinkSubject } from '../api/links.ts';
import { NewLinkForm } from './NewLinkForm.tsx';

/** What a reader of each kind of link sees, and what a revoked link leaves. */
const words = {
  run: {
    sees: 'this run as it is now, its assumptions and sources',
    stays: 'The run stays.',
  },
  design: {
    sees: 'this design as it is now, its assumptions and sources',
    stays: 'The design stays.',
  },
  study: {
    sees: 'this study with all it holds, as it was last saved, and the assumptions and sources of each run in it',
    stays: 'The study stays.',
  },
} as const;

/** Share links of a run, a design or a study: make one, see who used which when, revoke. */
export function SharePanel({ subject }: { subject: LinkSubject }) {
  const links = useQuery(linksQuery(subject));
  const open = links.data?.links ?? [];
  return (
    <section aria-label="Share links">
      <h2 className="mb-1 text-lead">Share</h2>
      <p className="mb-3 text-note text-muted">
        Whoever has a link sees {words[subject.opens].sees}, without an account; nothing else of the group.
      </p>
      <NewLinkForm subject={subject} />
      {links.error && (
        <p className="mt-3 text-note text-danger">The links cannot be listed: {links.error.message}</p>
      )}
      {open.length > 0 && (
        <ul className="mt-4 divide-y divide-line border-t border-line">
          {open.map((link) => (
            <LinkRow key={link.id} link={link} subject={subject} />
          ))}
        </ul>
      )}
    </section>
  );
}

function LinkRow({ link, subject }: { link: Link; subject: LinkSubject }) {
  const [asked, setAsked] = useState(false);
  const revoke = useRevokeLink(subject);
  const state = stateOf(link);
  return (
    <li className="flex flex-wrap items-center gap-x-3 gap-y-1 py-2">
      <div className="min-w-0 flex-1">
        <p className="truncate font-semibold">{link.label || 'Link without a label'}</p>
        <p className="text-note text-muted">
          {state.text}, made {formatSince(link.createdAt)}
          {link.createdBy ? ` by ${link.createdBy}` : ''},{' '}
          {link.lastUsedAt
            ? `last used ${formatSince(link.lastUsedAt)}, ${link.useCount} ${link.useCount === 1 ? 'time' : 'times'}`
            : 'not used yet'}
        </p>
      </div>
      {state.open && (
        <Button className="py-1!" onClick={() => setAsked(true)}>
          Revoke
        </Button>
      )}
      <ConfirmDialog
        open={asked}
        onOpenChange={setAsked}
        title={`Revoke “${link.label || 'the link'}”?`}
        description={`It stops to open at once and cannot be made valid again. ${words[subject.opens].stays}`}
        action="Revoke link"
        busy={revoke.isPending}
        error={revoke.error?.message}
        onConfirm={() => revoke.mutate(link.id, { onSuccess: () => setAsked(false) })}
      />
    </li>
  );
}

function stateOf({ revokedAt, expiresAt }: Link): { open: boolean; text: string } {
  if (revokedAt) return { open: false, text: `revoked ${formatSince(revokedAt)}` };
  if (expiresAt === null) return { open: true, text: 'open, no end' };
  const expired = new Date(expiresAt).getTime() <= Date.now();
  return { open: !expired, text: `${expired ? 'expired' : 'open until'} ${formatDate(expiresAt)}` };
}
