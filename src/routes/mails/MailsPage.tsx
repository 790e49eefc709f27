import { useQuery } from '@tanstack/react-query';
import { EmptyState } from '../../components/EmptyState.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { mailListQuery } from '../../features/mails/api/mailList.ts';
import { MailText } from '../../features/mails/components/MailText.tsx';
import { formatDateTime } from '../../lib/format.ts';

/** The local post of development: what the server sent goes nowhere else. */
export function MailsPage() {
  const mails = useQuery(mailListQuery());
  return (
    <Page
      title="Caught mails"
      subtitle="Mail that this server sent while in development. Nothing leaves the machine; the page looks every few seconds."
      width="text"
    >
      {mails.isPending ? <LoadingState label="Loading mails" /> : null}
      {mails.isError ? (
        <ErrorState
          title="The mails could not be loaded"
          error={mails.error}
          onRetry={() => void mails.refetch()}
        />
      ) : null}
      {mails.data?.mails.length === 0 ? (
        <EmptyState title="No mail yet">Ask for a password reset, and its mail appears here.</EmptyState>
      ) : null}
      <ul className="flex flex-col gap-3">
        {mails.data?.mails.map((mail) => (
          <li key={mail.id} className="card px-5 py-4">
            <h2 className="text-body">{mail.subject}</h2>
            <p className="mb-2 text-note text-muted">
              to {mail.to}, {formatDateTime(mail.receivedAt)}
            </p>
            <MailText text={mail.text} />
          </li>
        ))}
      </ul>
    </Page>
  );
}
