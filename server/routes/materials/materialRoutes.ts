import { Op } from 'sequelize';
import { z } from 'zod';
import { materialListSchema, materialSchema } from '../../../shared/material.ts';
import { materialUsesSchema, materialVersionListSchema } from '../../../shared/materialEdit.ts';
import { exportMaterialCsv } from '../../../worker/import/exportMaterialCsv.ts';
import { notFound } from '../../errors.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { readGroup } from '../../policies/group.ts';
import { readMaterial as mayRead } from '../../policies/material.ts';
import { presentMaterial, presentMaterialSummary } from '../../presenters/presentMaterial.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute } from '../../routing/route.ts';
import { plainFileName } from '../../services/fileNames.ts';
import { materialHistory } from '../../services/materialHistory.ts';
import { materialUses } from '../../services/materialUses.ts';

const listMaterials = route({
  method: 'get',
  path: '/groups/:groupId/materials',
  summary: "The shipped library and the group's own materials, by name.",
  noun: 'group',
  policy: readGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: materialListSchema },
  async handler({ dependencies: { models, materials }, subject }) {
    const rows = await models.Material.findAll({
      where: { groupId: { [Op.or]: [null, subject.id] } },
      order: [
        ['name', 'ASC'],
        ['id', 'ASC'],
      ],
    });
    const summaries = rows.map(async (row) => {
      const facts = await materials.factsOf(row.id, row.version);
      return facts ? [presentMaterialSummary(row, row.version, facts)] : [];
    });
    return { materials: (await Promise.all(summaries)).flat() };
  },
});

const version = z.coerce.number().int().min(1).max(2_147_483_647);

const readMaterial = route({
  method: 'get',
  path: '/materials/:materialId',
  summary: 'A material with its constants, sources and curves; the newest version unless one is named.',
  noun: 'material',
  policy: mayRead,
  query: z.strictObject({ version: version.optional() }),
  load: ({ dependencies, params }) => dependencies.models.Material.findByPk(params.materialId),
  answer: { status: 200, schema: materialSchema },
  async handler({ dependencies, subject, query }) {
    const wanted = query.version ?? subject.version;
    const stored = await dependencies.materials.versionOf(subject.id, wanted);
    if (!stored) throw notFound(`version ${wanted} of ${subject.name}`);
    return presentMaterial(subject, stored, await dependencies.pool.curves(stored.content));
  },
});

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { materialId: string } }) =>
  dependencies.models.Material.findByPk(params.materialId);

const listVersions = route({
  method: 'get',
  path: '/materials/:materialId/versions',
  summary: 'Who made which version, when, why, and what it changed; newest first.',
  noun: 'material',
  policy: mayRead,
  load,
  answer: { status: 200, schema: materialVersionListSchema },
  handler: async ({ dependencies, subject }) => ({
    versions: await materialHistory(dependencies.materials, subject),
  }),
});

const listUses = route({
  method: 'get',
  path: '/materials/:materialId/uses',
  summary: "The stacks, runs and mixtures of the asker's groups that use it.",
  noun: 'material',
  policy: mayRead,
  load,
  answer: { status: 200, schema: materialUsesSchema },
  handler: ({ dependencies, actor, subject }) =>
    materialUses(dependencies.models, subject, [...actor.roles.keys()]),
});

const exportMaterial = streamRoute({
  method: 'get',
  path: '/materials/:materialId/export.csv',
  summary: 'One version as CSV with its sources, which an import reads back to the same numbers.',
  noun: 'material',
  policy: mayRead,
  query: z.strictObject({ version: version.optional() }),
  load,
  answer: { contentType: 'text/csv' },
  async handler({ dependencies, subject, query, response }) {
    const wanted = query.version ?? subject.version;
    const content = await dependencies.materials.contentOf(subject.id, wanted);
    if (!content) throw notFound(`version ${wanted} of ${subject.name}`);
    const { name, formula, notes } = subject;
    // Sampled in the pool: a formula may be somebody's.
    const curves = await dependencies.pool.curves(content);
    const text = exportMaterialCsv(
      { name, formula, class: subject.class, notes, content, version: wanted },
      curves,
    );
    const fileName = `${plainFileName(`${formula}-${name}`, 'material')}-v${wanted}.csv`;
    response.attachment(fileName).type('text/csv; charset=utf-8').send(text);
  },
});

export const materialRoutes: Route[] = [listMaterials, readMaterial, listVersions, listUses, exportMaterial];
