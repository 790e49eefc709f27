import { useQuery } from '@tanstack/react-query';
import type { Membership, Session } from '../../../../shared/account.ts';
import { sessionQuery } from '../api/session.ts';

/** Who is signed in; null when nobody is, and until it is known. */
export function useSession(): Session | null {
  return useQuery(sessionQuery()).data ?? null;
}

/** The person's place in a group; null for somebody else's group. */
export function useMembership(groupId: string | undefined): Membership | null {
  const session = useSession();
  return session?.groups.find((group) => group.groupId === groupId) ?? null;
}

/** Whether this place allows changes. The server decides; the screen only does not offer what it would refuse. */
export function mayEdit(membership: Membership | null): boolean {
  return membership?.role === 'owner' || membership?.role === 'editor';
}
