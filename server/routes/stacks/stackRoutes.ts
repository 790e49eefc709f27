import { createStackSchema, stackListSchema, stackSchema, updateStackSchema } from '../../../shared/stack.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { addToGroup, readGroup } from '../../policies/group.ts';
import { changeStack, readStack as mayRead } from '../../policies/stack.ts';
import { presentStack, presentStackSummary } from '../../presenters/presentStack.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { createStack, deleteStack, listStacks, loadStack, updateStack } from '../../services/stacks.ts';

const listStacksOfGroup = route({
  method: 'get',
  path: '/groups/:groupId/stacks',
  summary: 'The stacks of a group, the one saved last first.',
  noun: 'group',
  policy: readGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: stackListSchema },
  async handler({ dependencies, subject }) {
    const stacks = await listStacks(dependencies.models, subject.id);
    return { stacks: stacks.map(({ stack, newest }) => presentStackSummary(stack, newest)) };
  },
});

const createStackInGroup = route({
  method: 'post',
  path: '/groups/:groupId/stacks',
  summary: 'Put a new stack into a group.',
  noun: 'group',
  policy: addToGroup,
  body: createStackSchema,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 201, schema: stackSchema },
  async handler({ dependencies, actor, subject, body }) {
    const { stack, newest } = await createStack(dependencies.models, actor, subject.id, body);
    return presentStack(stack, newest);
  },
});

const loadRow = ({ dependencies, params }: { dependencies: AppDependencies; params: { stackId: string } }) =>
  dependencies.models.Stack.findByPk(params.stackId);

const readStack = route({
  method: 'get',
  path: '/stacks/:stackId',
  summary: 'A stack in its newest version.',
  noun: 'stack',
  policy: mayRead,
  async load({ dependencies, params }) {
    const found = await loadStack(dependencies.models, params.stackId);
    return found && { ...found, groupId: found.stack.groupId };
  },
  answer: { status: 200, schema: stackSchema },
  handler: ({ subject }) => presentStack(subject.stack, subject.newest),
});

const saveStack = route({
  method: 'patch',
  path: '/stacks/:stackId',
  summary: 'Save a new version; refused when somebody saved since the version that the edit started from.',
  noun: 'stack',
  policy: changeStack,
  body: updateStackSchema,
  load: loadRow,
  answer: { status: 200, schema: stackSchema },
  async handler({ dependencies, actor, subject, body }) {
    const { stack, newest } = await updateStack(dependencies.models, actor, subject.id, body);
    return presentStack(stack, newest);
  },
});

const removeStack = route({
  method: 'delete',
  path: '/stacks/:stackId',
  summary: 'Delete a stack; its runs stay as they are.',
  noun: 'stack',
  policy: changeStack,
  load: loadRow,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => deleteStack(dependencies.models, actor, subject),
});

export const stackRoutes: Route[] = [
  listStacksOfGroup,
  createStackInGroup,
  readStack,
  saveStack,
  removeStack,
];
