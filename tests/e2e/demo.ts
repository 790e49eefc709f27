import type { BrowserContext } from 'playwright-core';
import type { z } from 'zod';
import { sessionSchema } from '../../shared/account.ts';
import { runListSchema } from '../../shared/run.ts';
import type { CreateStack, Stack, StackDocument } from '../../shared/stack.ts';
import { stackListSchema, stackSchema } from '../../shared/stack.ts';

/** What the API answers to the person of this browser, read with the schema of the client. */
export async function ask<Schema extends z.ZodType>(
  context: BrowserContext,
  path: string,
  schema: Schema,
  data?: unknown,
): Promise<z.output<Schema>> {
  const answer = await context.request.fetch(
    `/api/v1${path}`,
    data === undefined ? {} : { method: 'POST', data },
  );
  if (!answer.ok()) throw new Error(`${path} answers ${answer.status()}: ${await answer.text()}`);
  return schema.parse(await answer.json());
}

export async function demoGroupId(context: BrowserContext): Promise<string> {
  const { groups } = await ask(context, '/session', sessionSchema);
  const demo = groups.find(({ isDemo }) => isDemo);
  if (!demo) throw new Error('This person is not in the demo group.');
  return demo.groupId;
}

/** The stack whose name begins so, with its document. */
export async function demoStack(context: BrowserContext, name: string): Promise<Stack> {
  const { stacks } = await ask(context, `/groups/${await demoGroupId(context)}/stacks`, stackListSchema);
  const found = stacks.find((stack) => stack.name.startsWith(name));
  if (!found) throw new Error(`There is no stack "${name}" in the demo group.`);
  return ask(context, `/stacks/${found.id}`, stackSchema);
}

export async function demoRunId(context: BrowserContext): Promise<string> {
  const { runs } = await ask(context, `/groups/${await demoGroupId(context)}/runs`, runListSchema);
  const demo = runs.find(({ isDemo }) => isDemo);
  if (!demo) throw new Error('There is no demo run.');
  return demo.id;
}

/** A stack for one test, so that the demo's own stay as they are for the others. */
export async function newStack(
  context: BrowserContext,
  name: string,
  change = (document: StackDocument) => document,
): Promise<Stack> {
  const { document, description } = await demoStack(context, 'Pt/Co/Pt');
  const body: CreateStack = { name, description, document: change(document) };
  return ask(context, `/groups/${await demoGroupId(context)}/stacks`, stackSchema, body);
}
