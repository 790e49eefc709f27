import { Link, Outlet, ScrollRestoration, generatePath } from 'react-router-dom';
import { AppShell } from '../../components/AppShell.tsx';
import { ButtonLink } from '../../components/Button.tsx';
import { ConnectionBanner } from '../../components/ConnectionBanner.tsx';
import { GroupMenu } from '../../features/session/components/GroupMenu.tsx';
import { PersonMenu } from '../../features/session/components/PersonMenu.tsx';
import { useCurrentGroup } from '../../features/session/hooks/useCurrentGroup.ts';
import { useReconnect } from '../../features/session/hooks/useReconnect.ts';
import { useSession } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';

/** Header and frame of every page, signed in or not. */
export function AppLayout() {
  const session = useSession();
  const group = useCurrentGroup();
  const connection = useReconnect();
  const links = group
    ? [
        { to: generatePath(paths.groupHome, { groupId: group.groupId }), label: 'Stacks', exact: true },
        { to: generatePath(paths.materials, { groupId: group.groupId }), label: 'Materials' },
        { to: generatePath(paths.runs, { groupId: group.groupId }), label: 'Runs' },
      ]
    : [];
  return (
    <AppShell
      home={paths.start}
      links={links}
      banner={<ConnectionBanner connection={connection} />}
      right={
        <>
          {session && group ? <GroupMenu groups={session.groups} current={group} /> : null}
          <Link
            to={paths.conventions}
            className="rounded-control px-2 py-1.5 text-muted no-underline hover:bg-accent-soft hover:text-accent max-[420px]:hidden"
          >
            Conventions
          </Link>
          {session ? (
            <PersonMenu session={session} />
          ) : (
            <ButtonLink to={paths.signIn} tone="plain">
              Sign in
            </ButtonLink>
          )}
        </>
      }
    >
      <Outlet />
      <ScrollRestoration />
    </AppShell>
  );
}
