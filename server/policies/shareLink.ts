import { groupRole } from './policy.ts';

type ShareLinkSubject = { groupId: string };

export const revokeLink = groupRole('editor', (link: ShareLinkSubject) => link.groupId);
