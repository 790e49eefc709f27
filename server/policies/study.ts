import { groupRole } from './policy.ts';

type StudySubject = { groupId: string };

const groupIdOf = (study: StudySubject) => study.groupId;

export const readStudy = groupRole('viewer', groupIdOf);

export const changeStudy = groupRole('editor', groupIdOf);
