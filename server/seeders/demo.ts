import { hashPassword } from '../auth/passwords.ts';
import type { Group } from '../models/group.ts';
import type { Models } from '../models/models.ts';
import type { User } from '../models/user.ts';
import { createStack } from '../services/stacks.ts';
import type { DemoData } from './demoData.ts';
import { DEMO_PASSWORD } from './demoData.ts';
import { withSeedLock } from './seedLock.ts';

export type Demo = { group: Group; lead: User };

/**
 * Makes the demo group, its people and its stacks where they are missing. What somebody deleted or changed since
 * stays so: the audit trail tells what was made before.
 */
export function seedDemo(models: Models, data: DemoData): Promise<Demo> {
  return withSeedLock(models.sequelize, async () => {
    const group = await findOrCreateGroup(models, data.group);
    const users = await Promise.all(data.people.map((person) => findOrCreateUser(models, person)));
    for (const [position, { role }] of data.people.entries()) {
      await models.Membership.findOrCreate({
        where: { userId: users[position]!.id, groupId: group.id },
        defaults: { userId: users[position]!.id, groupId: group.id, role },
      });
    }
    const [lead] = users;
    if (!lead) throw new Error('data/demo/people.json names nobody');
    await createMissingStacks(models, data, group, lead);
    return { group, lead };
  });
}

async function findOrCreateGroup(models: Models, name: string): Promise<Group> {
  const found = await models.Group.findOne({ where: { isDemo: true } });
  return found ?? models.Group.create({ name, isDemo: true });
}

async function findOrCreateUser(models: Models, { name, email }: DemoData['people'][number]): Promise<User> {
  const found = await models.User.findOne({ where: { email } });
  return (
    found ??
    models.User.create({ name, email, passwordHash: await hashPassword(DEMO_PASSWORD), isDemo: true })
  );
}

async function createMissingStacks(models: Models, data: DemoData, group: Group, lead: User): Promise<void> {
  const lines = await models.Activity.findAll({ where: { groupId: group.id, action: 'stack.create' } });
  const made = new Set(lines.map((line) => line.detail['name']));
  const actor = { userId: lead.id, name: lead.name };
  // The list shows the one saved last first: made in reverse, it reads as the file does.
  for (const { name, description = '', document } of [...data.stacks].reverse()) {
    if (!made.has(name))
      await createStack(models, actor, group.id, { name, description, document, isDemo: true });
  }
}
