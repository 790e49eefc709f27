import { Op } from 'sequelize';
import type { MediumInput } from '../../shared/medium.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { ResolutionError } from '../../worker/dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import { materialKey } from '../../worker/sweep/sweepInput.ts';
import { conflict } from '../errors.ts';
import type { AppDependencies } from '../dependencies.ts';
import { isDesignRun } from '../models/run.ts';
import type { DesignRun, SweepRun } from '../models/run.ts';
import { filmAt } from './designMedia.ts';
import { recordActivity } from './recordActivity.ts';
import { loadRunMaterials } from './runMaterials.ts';
import { resolveOneSafely } from './resolveSafely.ts';
import { mapNamedMaterials, namedMaterialsOf } from './runMedia.ts';
import type { NamesMaterial } from './runMedia.ts';
import { createStack } from './stacks.ts';
import type { StackWithVersion } from './stacks.ts';

type Person = { userId: string; name: string };

/** What a link opens that is made of a stack. */
export type StackRun = SweepRun | DesignRun;

/**
 * Puts the stack of a shared run, as it was computed, into a group; of a design its film as drawn, at its first working point.
 *
 * A material that is another group's own cannot be named there: its constants at the working point take its place.
 *
 * @throws Refusal 409 when such a material is not known at the wavelength of the working point
 */
export async function openSharedRun(
  dependencies: Pick<AppDependencies, 'models' | 'materials' | 'pool'>,
  actor: Person,
  run: StackRun,
  groupId: string,
): Promise<StackWithVersion> {
  const { models } = dependencies;
  const computed = documentOf(run);
  const foreign = await foreignMaterials(dependencies, computed, groupId);
  const document = foreign.size === 0 ? computed : await withConstants(dependencies, run, foreign);
  const replaced =
    foreign.size > 0 ? ` Own materials of its group stand as constants at the working point.` : '';
  const opened = await createStack(models, actor, groupId, {
    // The share view does not show what the stack is called in its group.
    name: run.name,
    description: `From the shared ${isDesignRun(run) ? 'design' : 'run'} "${run.name}".${replaced}`,
    document,
  });
  await models.sequelize.transaction((transaction) =>
    recordActivity(
      models,
      { action: 'link.open-in-group', groupId, actor, subjectId: opened.stack.id, detail: { run: run.name } },
      transaction,
    ),
  );
  return opened;
}

function documentOf(run: StackRun): StackDocument {
  if (!isDesignRun(run)) return run.input.document;
  const { document, points } = run.input.design;
  return filmAt(document, points[0]!);
}

/** Ids of the stack's materials that are out of the group's reach. */
async function foreignMaterials(
  { models }: Pick<AppDependencies, 'models'>,
  document: StackDocument,
  groupId: string,
): Promise<Set<string>> {
  const ids = namedMaterialsOf(document).map(({ material }) => material);
  const inReach = await models.Material.findAll({
    attributes: ['id'],
    where: { id: ids, groupId: { [Op.or]: [null, groupId] } },
  });
  const reached = new Set(inReach.map(({ id }) => id));
  return new Set(ids.filter((id) => !reached.has(id)));
}

async function withConstants(
  { materials: store, pool }: Pick<AppDependencies, 'materials' | 'pool'>,
  run: StackRun,
  foreign: Set<string>,
): Promise<StackDocument> {
  const materials = await loadRunMaterials(store, run);
  const known = new Map(materials.map((material) => [materialKey(material), material]));
  const document = documentOf(run);
  const constants = new Map<NamesMaterial, Constants>();
  for (const named of namedMaterialsOf(document)) {
    if (!foreign.has(named.material)) continue;
    constants.set(named, await constantsOf(pool, named, document.workingPoint.wavelengthNm, known));
  }
  return mapNamedMaterials(document, (named) => {
    const found = constants.get(named);
    if (!found) return named;
    const name = materials.find(({ id }) => id === named.material)?.name;
    // A part of a mixture carries an m and no label; a medium of the stack is the other way round.
    return { ...found, ...('m' in named ? { m: named.m } : { label: name }) };
  });
}

type Constants = Omit<MediumInput, 'm'>;

/** @throws Refusal 409 when the material is not known at that wavelength */
async function constantsOf(
  pool: AppDependencies['pool'],
  { material, version, assumeConstant }: NamesMaterial,
  wavelengthNm: number,
  known: ReadonlyMap<string, ResolvableMaterial>,
): Promise<Constants> {
  const vacuum = { index: 1 };
  // With m the Voigt constant is put in too.
  const substrate = { material, version, assumeConstant, m: [0, 0, 1] as [number, number, number] };
  const one = { wavelengthNm, angleDeg: 0, incident: vacuum, layers: [], substrate };
  try {
    const { m: _m, ...constants } = (await resolveOneSafely(pool, one, known)).substrate;
    return constants;
  } catch (error) {
    if (!(error instanceof ResolutionError)) throw error;
    throw conflict(
      `The stack uses materials of its own group, which cannot be taken along: ${error.message}`,
    );
  }
}
