import { useEffect } from 'react';
import { useParams } from 'react-router-dom';
import type { Membership } from '../../../../shared/account.ts';
import { rememberGroup, useRememberedGroup } from '../../../lib/rememberedGroup.ts';
import { useSession } from './useSession.ts';

/** The group of the address; where the address names none, the one worked in last; else the first. */
export function useCurrentGroup(): Membership | null {
  const session = useSession();
  const { groupId } = useParams();
  const remembered = useRememberedGroup();
  const find = (id: string | null | undefined) => session?.groups.find((group) => group.groupId === id);
  const named = find(groupId);
  useEffect(() => {
    if (named) rememberGroup(named.groupId);
  }, [named]);
  return named ?? find(remembered) ?? session?.groups[0] ?? null;
}
