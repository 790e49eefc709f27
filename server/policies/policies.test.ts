import { describe, expect, test } from 'vitest';
import type { Role } from '../../shared/account.ts';
import { Refusal } from '../errors.ts';
import type { Actor } from './actor.ts';
import { revokeApiToken } from './apiToken.ts';
import { deleteCard, readCard } from './growthCard.ts';
import { addToGroup, manageGroup, readGroup } from './group.ts';
import { changeMaterial, readMaterial } from './material.ts';
import { deleteImport, readImport } from './materialImport.ts';
import { changeMember, removeMember } from './member.ts';
import { anyone, signedIn, signedInWithSession } from './policy.ts';
import { changeRun, readRun } from './run.ts';
import { revokeLink } from './shareLink.ts';
import { changeStack, readStack } from './stack.ts';
import { changeStudy, readStudy } from './study.ts';

const actorWith = (role: Role | null, via: Actor['via'] = 'session'): Actor => ({
  userId: 'me',
  name: 'Me',
  email: 'me@films.example',
  isSiteAdministrator: false,
  via,
  roles: new Map<string, Role>([['other', 'owner'], ...(role ? [['g', role] as const] : [])]),
});

const outcomes = (decide: (actor: Actor) => string) =>
  ([null, 'viewer', 'editor', 'owner'] as const).map((role) => decide(actorWith(role)));

const inGroup = { groupId: 'g' };
const someone = { groupId: 'g', userId: 'someone' };

describe('what somebody outside, a viewer, an editor and an owner may', () => {
  test.each([
    ['read a group', (actor: Actor) => readGroup.decide(actor, { id: 'g' }), 'hide allow allow allow'],
    ['add to a group', (actor: Actor) => addToGroup.decide(actor, { id: 'g' }), 'hide refuse allow allow'],
    ['manage a group', (actor: Actor) => manageGroup.decide(actor, { id: 'g' }), 'hide refuse refuse allow'],
    ['change a member', (actor: Actor) => changeMember.decide(actor, someone), 'hide refuse refuse allow'],
    ['remove a member', (actor: Actor) => removeMember.decide(actor, someone), 'hide refuse refuse allow'],
    [
      'remove themself',
      (actor: Actor) => removeMember.decide(actor, { groupId: 'g', userId: 'me' }),
      'hide allow allow allow',
    ],
    ['read a stack', (actor: Actor) => readStack.decide(actor, inGroup), 'hide allow allow allow'],
    ['change a stack', (actor: Actor) => changeStack.decide(actor, inGroup), 'hide refuse allow allow'],
    ['read a run', (actor: Actor) => readRun.decide(actor, inGroup), 'hide allow allow allow'],
    ['change a run', (actor: Actor) => changeRun.decide(actor, inGroup), 'hide refuse allow allow'],
    ['read a study', (actor: Actor) => readStudy.decide(actor, inGroup), 'hide allow allow allow'],
    ['change a study', (actor: Actor) => changeStudy.decide(actor, inGroup), 'hide refuse allow allow'],
    ['read a card', (actor: Actor) => readCard.decide(actor, inGroup), 'hide allow allow allow'],
    ['delete a card', (actor: Actor) => deleteCard.decide(actor, inGroup), 'hide refuse allow allow'],
    ['revoke a link', (actor: Actor) => revokeLink.decide(actor, inGroup), 'hide refuse allow allow'],
    [
      'read a material of the group',
      (actor: Actor) => readMaterial.decide(actor, inGroup),
      'hide allow allow allow',
    ],
    [
      'read a shipped material',
      (actor: Actor) => readMaterial.decide(actor, { groupId: null }),
      'allow allow allow allow',
    ],
    [
      'change a material of the group',
      (actor: Actor) => changeMaterial.decide(actor, inGroup),
      'hide refuse allow allow',
    ],
    [
      'change a shipped material',
      (actor: Actor) => changeMaterial.decide(actor, { groupId: null }),
      'refuse refuse refuse refuse',
    ],
    ['read an import', (actor: Actor) => readImport.decide(actor, inGroup), 'hide allow allow allow'],
    ['delete an import', (actor: Actor) => deleteImport.decide(actor, inGroup), 'hide refuse allow allow'],
    [
      'revoke their own token',
      (actor: Actor) => revokeApiToken.decide(actor, { userId: 'me' }),
      'allow allow allow allow',
    ],
    [
      "revoke another person's token",
      (actor: Actor) => revokeApiToken.decide(actor, { userId: 'someone' }),
      'hide hide hide hide',
    ],
  ])('%s', (_what, decide, expected) => {
    expect(outcomes(decide).join(' ')).toBe(expected);
  });
});

describe('who is let in at all', () => {
  const statusOf = (admit: () => unknown) => {
    try {
      admit();
      return 200;
    } catch (error) {
      return error instanceof Refusal ? error.status : 500;
    }
  };

  test.each([
    ['anyone', anyone, [200, 200, 200]],
    ['signed in', signedIn, [401, 200, 200]],
    ['signed in (cookie only)', signedInWithSession, [401, 403, 200]],
    ['a group policy', readGroup, [401, 200, 200]],
    ['a material policy', readMaterial, [401, 200, 200]],
    ['a token policy', revokeApiToken, [401, 403, 200]],
    ['a member policy', removeMember, [401, 200, 200]],
  ])('%s: nobody, a token, a session', (_name, policy, expected) => {
    const callers = [null, actorWith(null, 'token'), actorWith(null)];
    expect(callers.map((caller) => statusOf(() => policy.admit(caller)))).toEqual(expected);
  });
});
