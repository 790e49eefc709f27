import type { Transaction } from 'sequelize';
import type { Issue } from '../../shared/error.ts';
import type { StudyDocument } from '../../shared/study.ts';
import { invalid } from '../errors.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import { isDesignRun, isSweepRun } from '../models/run.ts';
import { isRowId } from '../routing/pathParams.ts';
import type { NameOfItem } from './studyChanges.ts';

/** Ids of the runs and designs that a study shows, each once, in the order in which they stand. */
export function idsOfItems({ items }: StudyDocument): { runs: string[]; designs: string[] } {
  const runs = items.flatMap((item) => (item.kind === 'run' ? [item.runId] : []));
  const designs = items.flatMap((item) => (item.kind === 'design' ? [item.designId] : []));
  return { runs: [...new Set(runs)], designs: [...new Set(designs)] };
}

/**
 * Refuses runs and designs that are not the group's. One that the stored version shows already may stay: it may have been
 * deleted since.
 *
 * @param stored the version before; null for a new study
 * @throws Refusal 422 with paths such as `document.items[2].runId`
 */
export async function refuseForeignItems(
  models: Models,
  groupId: string,
  document: StudyDocument,
  stored: StudyDocument | null,
  transaction: Transaction,
): Promise<void> {
  const before = stored ? idsOfItems(stored) : { runs: [], designs: [] };
  const inGroup = await namesInGroup(models, groupId, [document], transaction);
  const known = {
    runs: new Set([...before.runs, ...inGroup.runs.keys()]),
    designs: new Set([...before.designs, ...inGroup.designs.keys()]),
  };
  const issues = document.items.flatMap((item, position): Issue[] => {
    const path = `document.items[${position}]`;
    if (item.kind === 'run' && !known.runs.has(item.runId)) {
      return [{ path: `${path}.runId`, message: 'there is no such run in this group' }];
    }
    if (item.kind === 'design' && !known.designs.has(item.designId)) {
      return [{ path: `${path}.designId`, message: 'there is no such design in this group' }];
    }
    return [];
  });
  if (issues.length > 0) throw invalid(issues);
}

/** What the runs and designs of these documents are called today. */
export async function namesOfItems(
  models: Models,
  groupId: string,
  documents: StudyDocument[],
  transaction: Transaction,
): Promise<NameOfItem> {
  const { runs, designs } = await namesInGroup(models, groupId, documents, transaction);
  return (item) => (item.kind === 'run' ? runs.get(item.runId) : designs.get(item.designId)) ?? null;
}

async function namesInGroup(
  models: Models,
  groupId: string,
  documents: StudyDocument[],
  transaction: Transaction,
): Promise<{ runs: Map<string, string>; designs: Map<string, string> }> {
  const ids = documents.map(idsOfItems).flatMap(({ runs, designs }) => [...runs, ...designs]);
  const rows = await models.Run.findAll({
    attributes: ['id', 'name', 'kind'],
    where: { groupId, id: ids.filter(isRowId) },
    transaction,
  });
  const names = (some: Run[]) => new Map(some.map(({ id, name }) => [id, name]));
  return { runs: names(rows.filter(isSweepRun)), designs: names(rows.filter(isDesignRun)) };
}
