import type { SharedStudy } from '../../shared/study.ts';
import type { Models } from '../models/models.ts';
import type { DesignRun, Run, SweepRun } from '../models/run.ts';
import { isDesignRun, isSweepRun } from '../models/run.ts';
import type { Study } from '../models/study.ts';
import { presentSharedDesign } from '../presenters/presentDesign.ts';
import { presentSharedRun } from '../presenters/presentRun.ts';
import { presentDecided } from '../presenters/presentStudy.ts';
import { isRowId } from '../routing/pathParams.ts';
import { loadStudy } from './studies.ts';
import { idsOfItems } from './studyItems.ts';

/** What somebody with a link sees: the study as it now is, with the runs and designs that still exist. */
export async function openSharedStudy(models: Models, { id }: Study): Promise<SharedStudy | null> {
  const found = await loadStudy(models, id);
  if (!found) return null;
  const { study, newest } = found;
  const { runs, designs } = idsOfItems(newest.document);
  const rows = await models.Run.findAll({
    where: { groupId: study.groupId, id: [...runs, ...designs].filter(isRowId) },
  });
  return {
    title: newest.title,
    document: newest.document,
    decided: presentDecided(study),
    updatedAt: newest.createdAt.toISOString(),
    runs: inOrder(rows.filter(isSweepRun), runs).map((run) => ({ id: run.id, run: presentSharedRun(run) })),
    designs: inOrder(rows.filter(isDesignRun), designs).map((design) => ({
      id: design.id,
      design: presentSharedDesign(design),
    })),
  };
}

/** A run that the study shows now; null for every other, also one that it showed before. */
export async function runOfStudy(models: Models, study: Study, runId: string): Promise<SweepRun | null> {
  const run = await itemOfStudy(models, study, runId, 'runs');
  return run && isSweepRun(run) ? run : null;
}

/** A design that the study shows now. */
export async function designOfStudy(
  models: Models,
  study: Study,
  designId: string,
): Promise<DesignRun | null> {
  const design = await itemOfStudy(models, study, designId, 'designs');
  return design && isDesignRun(design) ? design : null;
}

async function itemOfStudy(
  models: Models,
  { id: studyId }: Study,
  id: string,
  kind: 'runs' | 'designs',
): Promise<Run | null> {
  const found = await loadStudy(models, studyId);
  if (!found || !idsOfItems(found.newest.document)[kind].includes(id)) return null;
  return models.Run.findOne({ where: { id, groupId: found.study.groupId } });
}

function inOrder<Row extends Run>(rows: Row[], ids: string[]): Row[] {
  return ids.flatMap((id) => rows.find((row) => row.id === id) ?? []);
}
