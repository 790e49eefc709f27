import { groupRole } from './policy.ts';

type StackSubject = { groupId: string };

const groupIdOf = (stack: StackSubject) => stack.groupId;

export const readStack = groupRole('viewer', groupIdOf);

export const changeStack = groupRole('editor', groupIdOf);
