import { groupRole } from './policy.ts';

type RunSubject = { groupId: string };

const groupIdOf = (run: RunSubject) => run.groupId;

export const readRun = groupRole('viewer', groupIdOf);

export const changeRun = groupRole('editor', groupIdOf);
