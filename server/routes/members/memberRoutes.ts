import {
  addMemberSchema,
  changeRoleSchema,
  memberListSchema,
  memberSchema,
} from '../../../shared/account.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { manageGroup, readGroup } from '../../policies/group.ts';
import { changeMember, removeMember as mayRemove } from '../../policies/member.ts';
import { presentMember } from '../../presenters/presentMember.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { addMember, changeRole, removeMember } from '../../services/members.ts';

type GroupParams = { dependencies: AppDependencies; params: { groupId: string } };
type MemberParams = { dependencies: AppDependencies; params: { groupId: string; userId: string } };

const loadGroup = ({ dependencies, params }: GroupParams) =>
  dependencies.models.Group.findByPk(params.groupId);

/** The member's place rather than the row: somebody outside must not learn whether that person is in the group. */
async function loadMember({ dependencies, params }: MemberParams) {
  const { groupId, userId } = params;
  const group = await dependencies.models.Group.findByPk(groupId);
  return group && { groupId, userId };
}

const listMembers = route({
  method: 'get',
  path: '/groups/:groupId/members',
  summary: 'Who is in the group, and as what.',
  noun: 'group',
  policy: readGroup,
  load: loadGroup,
  answer: { status: 200, schema: memberListSchema },
  async handler({ dependencies, subject }) {
    const memberships = await dependencies.models.Membership.findAll({
      where: { groupId: subject.id },
      include: 'user',
      order: [['createdAt', 'ASC']],
    });
    return { members: memberships.flatMap((one) => (one.user ? [presentMember(one, one.user)] : [])) };
  },
});

const createMember = route({
  method: 'post',
  path: '/groups/:groupId/members',
  summary: 'Take an existing account into the group.',
  noun: 'group',
  policy: manageGroup,
  body: addMemberSchema,
  load: loadGroup,
  answer: { status: 201, schema: memberSchema },
  async handler({ dependencies, actor, subject, body }) {
    const { membership, user } = await addMember(dependencies.models, actor, subject.id, body);
    return presentMember(membership, user);
  },
});

const updateMember = route({
  method: 'patch',
  path: '/groups/:groupId/members/:userId',
  summary: "Change a member's role. The last owner stays one.",
  noun: 'group',
  policy: changeMember,
  body: changeRoleSchema,
  load: loadMember,
  answer: { status: 200, schema: memberSchema },
  async handler({ dependencies, actor, subject, body }) {
    const { membership, user } = await changeRole(dependencies.models, actor, subject, body.role);
    return presentMember(membership, user);
  },
});

const deleteMember = route({
  method: 'delete',
  path: '/groups/:groupId/members/:userId',
  summary: 'Remove a member, or leave the group. The last owner stays.',
  noun: 'group',
  policy: mayRemove,
  load: loadMember,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => removeMember(dependencies.models, actor, subject),
});

export const memberRoutes: Route[] = [listMembers, createMember, updateMember, deleteMember];
