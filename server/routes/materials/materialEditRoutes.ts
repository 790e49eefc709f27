import { materialCurvesSchema, materialSchema } from '../../../shared/material.ts';
import type { Material as PresentedMaterial } from '../../../shared/material.ts';
import {
  createMaterialSchema,
  createMaterialVersionSchema,
  previewMaterialSchema,
  renameMaterialSchema,
} from '../../../shared/materialEdit.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { notFound } from '../../errors.ts';
import type { Material } from '../../models/material.ts';
import { addToGroup, readGroup } from '../../policies/group.ts';
import { changeMaterial } from '../../policies/material.ts';
import { presentMaterial } from '../../presenters/presentMaterial.ts';
import { readIdempotencyKey } from '../../routing/readIdempotencyKey.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { contentOfDraft } from '../../services/materialDraft.ts';
import {
  createMaterial,
  createMaterialVersion,
  deleteMaterial,
  renameMaterial,
} from '../../services/materials.ts';

type OfGroup = { dependencies: AppDependencies; params: { groupId: string } };
type OfMaterial = { dependencies: AppDependencies; params: { materialId: string } };

const loadGroup = ({ dependencies, params }: OfGroup) => dependencies.models.Group.findByPk(params.groupId);
const loadMaterial = ({ dependencies, params }: OfMaterial) =>
  dependencies.models.Material.findByPk(params.materialId);

/** The material in its newest version. */
async function presentNewest(
  { materials, pool }: AppDependencies,
  material: Material,
): Promise<PresentedMaterial> {
  const stored = await materials.versionOf(material.id, material.version);
  if (!stored) throw notFound('material');
  return presentMaterial(material, stored, await pool.curves(stored.content));
}

const createMaterialInGroup = route({
  method: 'post',
  path: '/groups/:groupId/materials',
  summary:
    'Put a new material into a group, from constants, an import, a mixture or a file that Skewlight exported. With an Idempotency-Key header a request sent twice makes one.',
  noun: 'group',
  policy: addToGroup,
  body: createMaterialSchema,
  load: loadGroup,
  answer: { status: 201, schema: materialSchema },
  async handler({ dependencies, actor, subject, body, request }) {
    const key = readIdempotencyKey(request);
    return presentNewest(dependencies, await createMaterial(dependencies, actor, subject.id, body, key));
  },
});

const previewMaterial = route({
  method: 'post',
  path: '/groups/:groupId/materials/preview',
  summary: 'The curves of constants before they are kept; nothing is stored.',
  noun: 'group',
  policy: readGroup,
  body: previewMaterialSchema,
  load: loadGroup,
  answer: { status: 200, schema: materialCurvesSchema },
  async handler({ dependencies, subject, body }) {
    const content = await contentOfDraft(dependencies, subject.id, body.content, null);
    return dependencies.pool.curves(content);
  },
});

const addVersion = route({
  method: 'post',
  path: '/materials/:materialId/versions',
  summary:
    'Other constants as a new version; refused when somebody made one since the version that the edit started from. Constants equal to the newest make no version.',
  noun: 'material',
  policy: changeMaterial,
  body: createMaterialVersionSchema,
  load: loadMaterial,
  answer: { status: 201, schema: materialSchema },
  handler: async ({ dependencies, actor, subject, body }) =>
    presentNewest(dependencies, await createMaterialVersion(dependencies, actor, subject, body)),
});

const nameMaterial = route({
  method: 'patch',
  path: '/materials/:materialId',
  summary: 'Change what a material is called; its constants stay.',
  noun: 'material',
  policy: changeMaterial,
  body: renameMaterialSchema,
  load: loadMaterial,
  answer: { status: 200, schema: materialSchema },
  handler: async ({ dependencies, actor, subject, body }) =>
    presentNewest(dependencies, await renameMaterial(dependencies.models, actor, subject, body)),
});

const removeMaterial = route({
  method: 'delete',
  path: '/materials/:materialId',
  summary: 'Delete a material; refused, with what uses it, while it is in use.',
  noun: 'material',
  policy: changeMaterial,
  load: loadMaterial,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => deleteMaterial(dependencies.models, actor, subject),
});

export const materialEditRoutes: Route[] = [
  createMaterialInGroup,
  previewMaterial,
  addVersion,
  nameMaterial,
  removeMaterial,
];
