import { groupRole } from './policy.ts';

type ImportSubject = { groupId: string };

const groupIdOf = (row: ImportSubject) => row.groupId;

/** See a file and what it would give. */
export const readImport = groupRole('viewer', groupIdOf);

export const deleteImport = groupRole('editor', groupIdOf);
