import { Op } from 'sequelize';
import { z } from 'zod';
import { materialListSchema, materialSchema } from '../../../shared/material.ts';
import { materialCurves } from '../../../worker/dispersion/materialCurves.ts';
import { notFound } from '../../errors.ts';
import { readGroup } from '../../policies/group.ts';
import { readMaterial as mayRead } from '../../policies/material.ts';
import { presentMaterial, presentMaterialSummary } from '../../presenters/presentMaterial.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';

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
    return presentMaterial(subject, stored, materialCurves(stored.content));
  },
});

export const materialRoutes: Route[] = [listMaterials, readMaterial];
