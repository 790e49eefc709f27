import { groupRole } from './policy.ts';

type GroupSubject = { id: string };

const groupIdOf = (group: GroupSubject) => group.id;

/** See the group, its members and what it holds. */
export const readGroup = groupRole('viewer', groupIdOf);

/** Put something into the group: a stack, a run. */
export const addToGroup = groupRole('editor', groupIdOf);

/** Decide on members and see every link. */
export const manageGroup = groupRole('owner', groupIdOf);
