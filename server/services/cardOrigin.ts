import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { createGrowthCardSchema } from '../../shared/growthCard.ts';
import { invalid } from '../errors.ts';
import type { Models } from '../models/models.ts';
import { isDesignRun } from '../models/run.ts';
import { isRowId } from '../routing/pathParams.ts';
import { shareableRun, shareableStudy } from './links.ts';
import type { LinkSubject } from './links.ts';

type Wanted = Pick<z.output<typeof createGrowthCardSchema>, 'studyId' | 'designId' | 'link'>;

/**
 * The study or design that a card comes from, as what its link opens; null for a card that stands alone.
 *
 * @param transaction of the card's storing: until it ends, nobody can delete the study or design
 * @throws Refusal 422 when there is none in the group, or both are named; 409 when the design to link to has no numbers
 */
export async function cardOrigin(
  models: Models,
  groupId: string,
  { studyId, designId, link }: Wanted,
  transaction?: Transaction,
): Promise<LinkSubject | null> {
  if (studyId !== undefined && designId !== undefined) {
    throw invalid([{ path: 'designId', message: 'must be left out where studyId is given' }]);
  }
  const held = transaction && { transaction, lock: transaction.LOCK.SHARE };
  if (studyId !== undefined) {
    const study = isRowId(studyId)
      ? await models.Study.findOne({ where: { id: studyId, groupId }, ...held })
      : null;
    if (!study) throw invalid([{ path: 'studyId', message: 'there is no such study in this group' }]);
    return shareableStudy(study);
  }
  if (designId === undefined) return null;
  const design = isRowId(designId)
    ? await models.Run.findOne({ where: { id: designId, groupId }, ...held })
    : null;
  if (!design || !isDesignRun(design)) {
    throw invalid([{ path: 'designId', message: 'there is no such design in this group' }]);
  }
  // Without a link it does not matter whether the design has its numbers.
  return link === null ? null : shareableRun(design);
}
