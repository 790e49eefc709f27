import type { Stack as PresentedStack, StackSummary } from '../../shared/stack.ts';
import type { Stack } from '../models/stack.ts';
import type { StackVersion } from '../models/stackVersion.ts';

/** @param newest the stack's newest version, with its author */
export function presentStackSummary(stack: Stack, newest: StackVersion): StackSummary {
  return {
    id: stack.id,
    groupId: stack.groupId,
    name: stack.name,
    description: stack.description,
    version: newest.version,
    layerCount: newest.layerCount,
    isDemo: stack.isDemo,
    updatedAt: newest.createdAt.toISOString(),
    updatedBy: newest.author?.name ?? null,
  };
}

/** @param newest the stack's newest version, with its author */
export function presentStack(stack: Stack, newest: StackVersion): PresentedStack {
  return { ...presentStackSummary(stack, newest), document: newest.document };
}
