import { groupRole } from './policy.ts';

type CardSubject = { groupId: string };

const groupIdOf = (card: CardSubject) => card.groupId;

export const readCard = groupRole('viewer', groupIdOf);

export const deleteCard = groupRole('editor', groupIdOf);
