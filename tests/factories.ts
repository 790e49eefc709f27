import { randomUUID } from 'node:crypto';
import type { Role } from '../shared/account.ts';
import type { DesignInput } from '../shared/design.ts';
import type { MaterialContent } from '../shared/material.ts';
import type { StackDocument } from '../shared/stack.ts';
import { countLayers } from '../shared/stackCase.ts';
import { hashPassword } from '../server/auth/passwords.ts';
import type { Group } from '../server/models/group.ts';
import type { Material } from '../server/models/material.ts';
import type { MaterialImport } from '../server/models/materialImport.ts';
import type { Models } from '../server/models/models.ts';
import type { Run, RunInput, SweepRun } from '../server/models/run.ts';
import { isSweepRun } from '../server/models/run.ts';
import type { ShareLink } from '../server/models/shareLink.ts';
import type { Stack } from '../server/models/stack.ts';
import type { User } from '../server/models/user.ts';
import { designTotal } from '../worker/design/runDesign.ts';
import { hashSecret, makeSecret } from '../server/services/secrets.ts';

/** Rows for tests, in a real database. Everything has a name of its own, so that tests do not meet. */

/** Of every built user. */
export const PASSWORD = 'correct horse battery';

// argon2 is slow on purpose; once a test file is enough.
let passwordHash: Promise<string> | null = null;

type UserOverrides = Partial<Pick<User, 'name' | 'email' | 'isDemo' | 'isSiteAdministrator'>>;

export async function buildUser(models: Models, overrides: UserOverrides = {}): Promise<User> {
  passwordHash ??= hashPassword(PASSWORD);
  const unique = randomUUID().slice(0, 8);
  return models.User.create({
    name: `Person ${unique}`,
    email: `person-${unique}@films.example`,
    passwordHash: await passwordHash,
    ...overrides,
  });
}

/** @param members who is in it, and as what */
export async function buildGroup(
  models: Models,
  members: [User, Role][] = [],
  overrides: Partial<Pick<Group, 'name' | 'isDemo' | 'isPersonal'>> = {},
): Promise<Group> {
  const group = await models.Group.create({ name: `Group ${randomUUID().slice(0, 8)}`, ...overrides });
  for (const [user, role] of members) {
    await models.Membership.create({ userId: user.id, groupId: group.id, role });
  }
  return group;
}

/** A group with an owner, an editor and a viewer, and somebody who is in none. */
export async function buildPeople(models: Models) {
  const owner = await buildUser(models);
  const editor = await buildUser(models);
  const viewer = await buildUser(models);
  const stranger = await buildUser(models);
  const group = await buildGroup(models, [
    [owner, 'owner'],
    [editor, 'editor'],
    [viewer, 'viewer'],
  ]);
  const strangersGroup = await buildGroup(models, [[stranger, 'owner']]);
  return { owner, editor, viewer, stranger, group, strangersGroup };
}

/** Pt 3 / Co 1 / Pt 5 on silicon with constants typed in: needs no library. */
export function buildDocument(overrides: Partial<StackDocument> = {}): StackDocument {
  return {
    incident: { index: 1 },
    layers: [
      { id: 'cap', medium: { index: [2.33, 4.14], label: 'Pt' }, thicknessNm: 3 },
      {
        id: 'film',
        medium: { index: [2.25, 4.07], voigt: [0.03, 0.01], label: 'Co' },
        thicknessNm: 1,
        m: [0, 0, 1],
      },
      { id: 'buffer', medium: { index: [2.33, 4.14], label: 'Pt' }, thicknessNm: 5 },
    ],
    substrate: { index: [3.88, 0.02], label: 'Si' },
    workingPoint: { wavelengthNm: 632.8, angleDeg: 45, input: 'p', magnetization: { mode: 'drawn' } },
    ...overrides,
  };
}

/** A stack that the fast path does not take: a run of it lasts long enough to be looked at, cancelled or lost. */
export function buildSlowDocument(): StackDocument {
  const document = buildDocument();
  const underlayer: StackDocument['substrate'] = {
    mixture: { model: 'bruggeman', fraction: 0.5, parts: [{ index: 1.5 }, { index: 2 }] },
  };
  return {
    ...document,
    layers: [...document.layers, { id: 'underlayer', medium: underlayer, thicknessNm: 40 }],
  };
}

type StackOverrides = { name?: string; document?: StackDocument; author?: User };

/** Version 1 of a stack. */
export async function buildStack(
  models: Models,
  group: Group,
  { name = 'Pt/Co/Pt', document = buildDocument(), author }: StackOverrides = {},
): Promise<Stack> {
  const stack = await models.Stack.create({ groupId: group.id, name, description: '', version: 1 });
  await models.StackVersion.create({
    stackId: stack.id,
    version: 1,
    name,
    description: '',
    document,
    layerCount: countLayers(document.layers),
    authorId: author?.id ?? null,
  });
  return stack;
}

/** An invented absorbing magnet, known from 400 to 800 nm. */
export function buildContent(overrides: Partial<MaterialContent> = {}): MaterialContent {
  const source = {
    citation: 'Invented for a test',
    doi: null,
    licence: null,
    sample: null,
    method: null,
    confidence: 'invented for the demo' as const,
    caution: null,
  };
  return {
    index: { kind: 'table', wavelengthsNm: [400, 600, 800], n: [2, 2.2, 2.4], k: [3, 3.5, 4] },
    indexSource: source,
    voigt: {
      kind: 'table',
      wavelengthsNm: [400, 800],
      q: [
        [0.02, 0.01],
        [0.03, 0.01],
      ],
    },
    voigtSource: source,
    ...overrides,
  };
}

type MaterialOverrides = { id?: string; name?: string; group?: Group | null; contents?: MaterialContent[] };

/** A material with one version for each of the contents; without a group it is of the shipped library. */
export async function buildMaterial(
  models: Models,
  { id, name = 'Testium', group = null, contents = [buildContent()] }: MaterialOverrides = {},
): Promise<Material> {
  const material = await models.Material.create({
    id: id ?? `testium-${randomUUID().slice(0, 8)}`,
    groupId: group?.id ?? null,
    name,
    formula: 'Te',
    class: 'magnet',
    preferred: false,
    notes: [],
    version: contents.length,
  });
  for (const [position, content] of contents.entries()) {
    await models.MaterialVersion.create({ materialId: material.id, version: position + 1, content });
  }
  return material;
}

type ImportOverrides = Partial<
  Pick<MaterialImport, 'fileName' | 'state' | 'readingAt' | 'createdAt' | 'tableJson' | 'exported'>
> & { text?: string };

/** A file of constants as its sender left it, which nobody reads unless told to. */
export async function buildImport(
  models: Models,
  group: Group,
  { text = 'nm,n,k\n400,2,3\n600,2.2,3.5\n800,2.4,4\n', ...overrides }: ImportOverrides = {},
): Promise<MaterialImport> {
  const bytes = Buffer.from(text, 'utf8');
  return models.MaterialImport.create({
    groupId: group.id,
    createdById: null,
    fileName: 'table.csv',
    sha256: hashSecret(text),
    bytes,
    size: bytes.length,
    ...overrides,
  });
}

export function buildRunInput(overrides: Partial<RunInput> = {}): RunInput {
  return {
    document: buildDocument(),
    axis: { kind: 'angle', from: 0, to: 80, points: 81, spacing: 'linear' },
    readings: ['rotationP', 'ellipticityP'],
    materials: [],
    ...overrides,
  };
}

type RunOverrides = Partial<
  Pick<
    Run,
    'name' | 'state' | 'done' | 'stackId' | 'stackName' | 'stackVersion' | 'createdById' | 'createdAt'
  >
> & { input?: RunInput };

/** A run's row as it is stored, without numbers; queued unless told otherwise. */
export async function buildRun(
  models: Models,
  group: Group,
  { input = buildRunInput(), ...overrides }: RunOverrides = {},
): Promise<SweepRun> {
  const run = await models.Run.create({
    groupId: group.id,
    stackId: null,
    stackVersion: null,
    stackName: null,
    name: 'Angle sweep',
    createdById: null,
    input,
    materials: [],
    assumptions: ['Built for a test.'],
    warnings: [],
    total: input.axis.points,
    solverVersion: 'test',
    inputSha256: hashSecret(JSON.stringify(input)),
    ...overrides,
  });
  if (!isSweepRun(run)) throw new Error(`Built a run of kind ${run.kind}.`);
  return run;
}

/** A design question's row as it is stored, without an answer. */
export function buildDesign(
  models: Models,
  group: Group,
  design: DesignInput,
  overrides: Partial<Pick<Run, 'name' | 'state'>> = {},
): Promise<Run> {
  return models.Run.create({
    groupId: group.id,
    stackId: null,
    stackVersion: null,
    stackName: null,
    name: 'Question',
    kind: design.kind,
    createdById: null,
    input: { design, materials: [] },
    materials: [],
    assumptions: ['Built for a test.'],
    warnings: [],
    total: designTotal(design),
    solverVersion: 'test',
    inputSha256: hashSecret(JSON.stringify(design)),
    ...overrides,
  });
}

type LinkOverrides = Partial<Pick<ShareLink, 'label' | 'expiresAt' | 'revokedAt' | 'createdById'>>;

/** A share link of the run, and the token that opens it. */
export async function buildShareLink(
  models: Models,
  run: Run,
  overrides: LinkOverrides = {},
): Promise<{ link: ShareLink; token: string }> {
  const token = makeSecret();
  const link = await models.ShareLink.create({
    runId: run.id,
    groupId: run.groupId,
    tokenHash: hashSecret(token),
    label: '',
    createdById: null,
    expiresAt: null,
    ...overrides,
  });
  return { link, token };
}
