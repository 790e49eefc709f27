import { useQuery } from '@tanstack/react-query';
import { Link, generatePath } from 'react-router-dom';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { useSession } from '../../features/session/hooks/useSession.ts';
import { tokenListQuery } from '../../features/tokens/api/tokenList.ts';
import { CreateTokenForm } from '../../features/tokens/components/CreateTokenForm.tsx';
import { TokenExample } from '../../features/tokens/components/TokenExample.tsx';
import { TokenTable } from '../../features/tokens/components/TokenTable.tsx';
import { paths } from '../../lib/paths.ts';

export function AccountPage() {
  const session = useSession();
  const tokens = useQuery(tokenListQuery());
  return (
    <Page
      title="Account"
      subtitle={session ? `${session.user.name}, ${session.user.email}` : null}
      width="text"
    >
      <section aria-labelledby="groups-heading" className="mb-9">
        <h2 id="groups-heading" className="mb-2 text-lead">
          Your groups
        </h2>
        <ul className="flex flex-col gap-1">
          {session?.groups.map((group) => (
            <li key={group.groupId}>
              <Link to={generatePath(paths.groupHome, { groupId: group.groupId })} className="prose-link">
                {group.groupName}
              </Link>
              <span className="text-muted">, {group.role}</span>
            </li>
          ))}
        </ul>
      </section>
      <section aria-labelledby="tokens-heading" className="mb-9">
        <h2 id="tokens-heading" className="text-lead">
          API tokens
        </h2>
        <p className="mb-4 max-w-prose text-note text-muted">
          A token lets a script ask for predictions in your name, through{' '}
          <a href="/api/v1/docs" className="prose-link">
            the API
          </a>
          . The server keeps only a fingerprint of it, so a lost token cannot be shown again: revoke it and
          make another.
        </p>
        <CreateTokenForm />
        <QueryGate query={tokens} what="tokens">
          {(data) => (
            <div className={data.tokens.length > 0 ? 'card' : ''}>
              <TokenTable tokens={data.tokens} />
            </div>
          )}
        </QueryGate>
      </section>
      <section aria-labelledby="example-heading">
        <h2 id="example-heading" className="text-lead">
          In a script
        </h2>
        <p className="mb-2 max-w-prose text-note text-muted">
          Ten nanometres of iron on silicon, polar magnetization, at 60°. Put the token into the environment
          variable <code>SKEWLIGHT_TOKEN</code> first.
        </p>
        <TokenExample />
      </section>
    </Page>
  );
}
