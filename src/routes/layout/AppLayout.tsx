import { useQuery } from '@tanstack/react-query';
import { Link, Outlet, ScrollRestoration, generatePath, useNavigation } from 'react-router-dom';
import type { Location } from 'react-router-dom';
import { AppShell } from '../../components/AppShell.tsx';
import { ButtonLink } from '../../components/Button.tsx';
import { ConnectionBanner } from '../../components/ConnectionBanner.tsx';
import { sessionQuery } from '../../features/session/api/session.ts';
import { GroupMenu } from '../../features/session/components/GroupMenu.tsx';
import { PersonMenu } from '../../features/session/components/PersonMenu.tsx';
import { useCurrentGroup } from '../../features/session/hooks/useCurrentGroup.ts';
import { useReconnect } from '../../features/session/hooks/useReconnect.ts';
import { paths } from '../../lib/paths.ts';
import { useFocusOnNavigation } from './useFocusOnNavigation.ts';

/** The first page of a visit has no key of its own; under a common one an anchor would lose to an old position. */
function scrollKey({ key, pathname, search, hash }: Location): string {
  return key === 'default' ? pathname + search + hash : key;
}

/** Header and frame of every page, signed in or not. */
export function AppLayout() {
  const { data: session } = useQuery(sessionQuery());
  const fetchingPage = useNavigation().state === 'loading';
  const group = useCurrentGroup();
  useFocusOnNavigation();
  const connection = useReconnect();
  const links = group
    ? [
        { to: generatePath(paths.groupHome, { groupId: group.groupId }), label: 'Stacks', exact: true },
        { to: generatePath(paths.materials, { groupId: group.groupId }), label: 'Materials' },
        { to: generatePath(paths.runs, { groupId: group.groupId }), label: 'Runs' },
        { to: generatePath(paths.designs, { groupId: group.groupId }), label: 'Designs' },
        { to: generatePath(paths.studies, { groupId: group.groupId }), label: 'Studies' },
        { to: paths.conventions, label: 'Conventions', narrowOnly: true },
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
            className={`rounded-control px-2 py-1.5 text-muted no-underline hover:bg-accent-soft hover:text-accent ${group ? 'max-md:hidden' : ''}`}
          >
            Conventions
          </Link>
          {session ? (
            <PersonMenu session={session} />
          ) : session === null ? (
            <ButtonLink to={paths.signIn} tone="plain">
              Sign in
            </ButtonLink>
          ) : null}
        </>
      }
    >
      {fetchingPage ? (
        <div aria-hidden="true" className="fixed inset-x-0 top-0 z-50 h-0.5 animate-pulse bg-accent" />
      ) : null}
      <Outlet />
      <ScrollRestoration getKey={scrollKey} />
    </AppShell>
  );
}
