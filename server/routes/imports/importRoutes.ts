import { LIMITS } from '../../../shared/limits.ts';
import {
  importMappingSchema,
  importPreviewSchema,
  materialImportSchema,
  pasteImportSchema,
} from '../../../shared/materialImport.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { addToGroup } from '../../policies/group.ts';
import { deleteImport as mayDelete, readImport as mayRead } from '../../policies/materialImport.ts';
import { presentImport, presentPreview } from '../../presenters/presentImport.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute, uploadRoute } from '../../routing/route.ts';
import { plainFileName, shownFileName } from '../../services/fileNames.ts';
import { convertImport } from '../../services/importConversion.ts';
import { createImport, deleteImport, readImportBytes } from '../../services/imports.ts';

const createImportInGroup = uploadRoute({
  method: 'post',
  path: '/groups/:groupId/imports',
  summary:
    'Send a table of constants, as a file or as pasted text; it is read beside, ask for it again while it is `reading`. The same file sent twice is one import.',
  noun: 'group',
  policy: addToGroup,
  upload: { part: 'file', maxBytes: LIMITS.importBytes },
  body: pasteImportSchema,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 202, schema: materialImportSchema },
  async handler({ dependencies, actor, subject, given }) {
    const file =
      'file' in given
        ? given.file
        : { fileName: given.body.fileName, bytes: Buffer.from(given.body.text, 'utf8') };
    const row = await createImport(dependencies, actor, subject, {
      ...file,
      fileName: shownFileName(file.fileName),
    });
    return presentImport(row, dependencies.jobs.imports.progressOf(row.id));
  },
});

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { importId: string } }) =>
  dependencies.models.MaterialImport.findByPk(params.importId);

const readImport = route({
  method: 'get',
  path: '/imports/:importId',
  summary: 'A file with its columns, once it is read, or why it was refused.',
  noun: 'import',
  policy: mayRead,
  load,
  answer: { status: 200, schema: materialImportSchema },
  handler: ({ dependencies, subject }) =>
    presentImport(subject, dependencies.jobs.imports.progressOf(subject.id)),
});

const readImportFile = streamRoute({
  method: 'get',
  path: '/imports/:importId/file',
  summary: 'The file as it came.',
  noun: 'import',
  policy: mayRead,
  load,
  answer: { contentType: 'application/octet-stream' },
  async handler({ dependencies, subject, response }) {
    const bytes = await readImportBytes(dependencies.models, subject);
    // Never as what it may claim to be: a browser would show a page that somebody sent as a table.
    response
      .attachment(plainFileName(subject.fileName, 'table'))
      .type('application/octet-stream')
      .send(bytes);
  },
});

const previewImport = route({
  method: 'post',
  path: '/imports/:importId/preview',
  summary: 'The constants that the file gives with this mapping; nothing is stored.',
  noun: 'import',
  policy: mayRead,
  body: importMappingSchema,
  load,
  answer: { status: 200, schema: importPreviewSchema },
  handler: async ({ dependencies, subject, body }) =>
    presentPreview(await convertImport(dependencies, subject, body, '')),
});

const removeImport = route({
  method: 'delete',
  path: '/imports/:importId',
  summary: 'Discard a file; refused while a material rests on it.',
  noun: 'import',
  policy: mayDelete,
  load,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => deleteImport(dependencies.models, actor, subject),
});

export const importRoutes: Route[] = [
  createImportInGroup,
  readImport,
  readImportFile,
  previewImport,
  removeImport,
];
