import type { Transaction } from 'sequelize';
import type { Activity } from '../models/activity.ts';
import type { Models } from '../models/models.ts';

/** A verb on a noun; the audit trail is filtered by it. */
export type ActivityAction =
  | 'account.create'
  | 'password.request-reset'
  | 'password.reset'
  | 'session.create'
  | 'token.create'
  | 'token.revoke'
  | 'member.add'
  | 'member.change-role'
  | 'member.remove'
  | 'stack.create'
  | 'stack.update'
  | 'stack.delete'
  | 'material.create'
  | 'material.version'
  | 'material.rename'
  | 'material.delete'
  | 'import.create'
  | 'import.delete'
  | 'run.create'
  | 'run.cancel'
  | 'run.rerun'
  | 'run.delete'
  | 'design.create'
  | 'design.cancel'
  | 'design.rerun'
  | 'design.delete'
  | 'study.create'
  | 'study.update'
  | 'study.delete'
  | 'card.create'
  | 'card.delete'
  | 'link.create'
  | 'link.revoke'
  | 'link.open-in-group';

export type ActivityEntry = {
  action: ActivityAction;
  /** Null for what concerns an account only. */
  groupId: string | null;
  actor: { userId: string; name: string };
  subjectId: string | null;
  detail?: Activity['detail'];
};

/** Adds a line to the audit trail, in the transaction of what it tells, so that neither exists without the other. */
export async function recordActivity(
  models: Models,
  { action, groupId, actor, subjectId, detail = {} }: ActivityEntry,
  transaction: Transaction,
): Promise<void> {
  await models.Activity.create(
    { action, groupId, actorId: actor.userId, actorName: actor.name, subjectId, detail },
    { transaction },
  );
}
