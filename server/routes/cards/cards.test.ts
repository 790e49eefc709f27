import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import type { Response } from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { cardLayerCells, cardReadingCells, cardToleranceSentences } from '../../../shared/cardWords.ts';
import {
  cardMakingSchema,
  createGrowthCardSchema,
  growthCardListSchema,
  growthCardSchema,
  sharedGrowthCardSchema,
} from '../../../shared/growthCard.ts';
import type { CreateGrowthCard, GrowthCard } from '../../../shared/growthCard.ts';
import { studySchema } from '../../../shared/study.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer, Browser } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildToleranceInput } from '../../../tests/designInputs.ts';
import { createCard } from '../../services/createCard.ts';
import {
  buildDesign,
  buildDocument,
  buildMaterial,
  buildPeople,
  buildRun,
} from '../../../tests/factories.ts';

let api: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let browser: Browser;
beforeAll(async () => (api = await startApiServer()));
beforeEach(async () => {
  people = await buildPeople(api.models);
  browser = await api.signedIn(people.editor);
});
afterAll(() => api.stop());

const { workingPoint } = buildDocument();
const wanted = (overrides: Partial<CreateGrowthCard> = {}): CreateGrowthCard => ({
  title: 'Pt/Co/Pt, cap of 3 nm',
  document: buildDocument(),
  points: [
    { id: 'red', label: 'HeNe', workingPoint },
    { id: 'green', label: 'Green', workingPoint: { ...workingPoint, wavelengthNm: 532, input: 's' } },
  ],
  signal: 'rotation',
  tolerance: { ratePercent: 3, randomPercent: 4, samples: 200, seed: 7 },
  rates: [{ layerId: 'cap', nmPerMin: 1.7 }],
  sampleId: 'NF-0417',
  bench: 'HeNe laser, Glan-Taylor polarizers, analyzer 1.5° off crossing',
  decision: { text: '3 nm Pt: φ falls by 12 %, λ/2 plate not needed. Approved for µ-Kerr.' },
  link: { expiresAt: null },
  ...overrides,
});
const groupUrl = () => `/api/v1/groups/${people.group.id}/cards`;
const make = async (given: CreateGrowthCard): Promise<GrowthCard> =>
  read(growthCardSchema, await browser.post(groupUrl()).send(given).expect(201));

/** A study of the group. */
const studyOf = async (): Promise<string> => {
  const answer = await browser
    .post(`/api/v1/groups/${people.group.id}/studies`)
    .send({ title: 'Caps', document: { question: 'Which?', items: [] } })
    .expect(201);
  return read(studySchema, answer).id;
};

/** A design of the group that has its numbers. */
const designOf = async (): Promise<string> =>
  (await buildDesign(api.models, people.group, buildToleranceInput(), { state: 'done' })).id;

/** What is stored of the group's cards. */
const kept = async () => {
  const where = { groupId: people.group.id };
  const { GrowthCard, ShareLink } = api.models;
  return { cards: await GrowthCard.count({ where }), links: await ShareLink.count({ where }) };
};
const above0: unknown = expect.toSatisfy((value: number) => value > 0);

const execute = promisify(execFile);

/** The text of each page as poppler reads it, on one line each. */
async function pagesOf(bytes: Buffer): Promise<string[]> {
  const folder = await mkdtemp(path.join(tmpdir(), 'skewlight-card-'));
  try {
    const file = path.join(folder, 'card.pdf');
    await writeFile(file, bytes);
    const { stdout } = await execute('pdftotext', ['-layout', file, '-']);
    const pages = stdout.split('\f').slice(0, -1);
    return pages.map((page) => page.replace(/\s+/g, ' '));
  } finally {
    await rm(folder, { recursive: true });
  }
}

const pdfOf = async (url: string, who: Browser = browser): Promise<Buffer> => {
  const answer = await who.get(url).buffer(true).parse(intoBuffer).expect(200);
  expect(answer.headers['content-type']).toBe('application/pdf');
  return answer.body as Buffer;
};

function intoBuffer(response: Response, done: (error: Error | null, body: Buffer) => void): void {
  const pieces: Buffer[] = [];
  response.on('data', (piece: Buffer) => pieces.push(piece));
  response.on('end', () => done(null, Buffer.concat(pieces)));
}

/** Every number and word that the page on screen shows of a card. */
function shownOf(card: GrowthCard): string[] {
  return [
    ...card.layers.flatMap((layer) => [...Object.values(cardLayerCells(layer)), layer.block ?? '']),
    ...card.readings.flatMap(({ label, conditions, readings }) => [
      `${label}: ${conditions}`,
      ...readings.flatMap((reading) => Object.values(cardReadingCells(reading))),
    ]),
    ...cardToleranceSentences(card),
    ...[card.title, card.sampleId, card.bench, card.decision.text, card.decision.by, card.solverVersion],
    ...[...card.assumptions, ...card.sources, ...card.cautions, card.inputSha256, card.url ?? ''],
  ];
}

/** Lines are broken where they are full: what counts is that every character is there, in order. */
const squeeze = (text: string) => text.replace(/\s+/g, '').replace('≥', '>=');

describe('a growth card', () => {
  test('holds the film in the order of growth, readings with bands, and who decided', async () => {
    const card = await make(wanted());
    expect(card.layers.map(({ step, material }) => [step, material])).toEqual([
      [null, 'Si'],
      [1, 'Pt'],
      [2, 'Co'],
      [3, 'Pt'],
    ]);
    // 3 nm at 1.7 nm/min.
    expect(card.layers[3]!.seconds).toBeCloseTo((3 / 1.7) * 60, 9);
    for (const { readings } of card.readings) {
      expect(readings.map(({ label }) => label.split(',')[0])).toEqual([
        'Kerr rotation',
        'Kerr ellipticity',
        'Cross-polarized amplitude',
        'Reflectance',
      ]);
      // The nominal film lies in the middle of the films: the band is about one standard deviation to either side.
      for (const { nominal, low, high } of readings) {
        expect(low!).toBeLessThan(nominal!);
        expect(high!).toBeGreaterThan(nominal!);
      }
    }
    expect(card.decision).toMatchObject({ by: people.editor.name });
    expect(card.cautions.join(' ')).toMatch(/for planning.*Cobalt: .*IEC 60825-1/);
    expect(card.assumptions.join(' ')).toContain('Layer Co: m = (0, 0, 1).');
    expect(card.assumptions.join(' ')).not.toMatch(/No demand|Derivatives|transverse contrast|Working point/);
    expect(card.sources.join(' ')).toContain('Co: typed in, without a source (index [2.25,4.07]');
    expect(read(growthCardSchema, await browser.get(`/api/v1/cards/${card.id}`).expect(200))).toEqual(card);
    const { cards } = read(growthCardListSchema, await browser.get(groupUrl()).expect(200));
    expect(cards.map(({ id, sampleId }) => [id, sampleId])).toEqual([[card.id, 'NF-0417']]);
  });

  test('gives the same numbers again, and its row cannot be changed', async () => {
    const [first, second] = [await make(wanted()), await make(wanted())];
    expect(second.readings).toEqual(first.readings);
    expect(second.inputSha256).toBe(first.inputSha256);
    const row = await api.models.GrowthCard.findByPk(first.id, { rejectOnEmpty: true });
    await expect(row.update({ title: 'Another' })).rejects.toThrow(/never changed/);
  });

  test('opens by its own link without an account, until it is deleted', async () => {
    const card = await make(wanted());
    const token = card.url!.split('/').at(-1)!;
    const shared = `/api/v1/shared/${token}`;
    expect((await api.anonymous().get(`${shared}/subject`)).body).toEqual({ opens: 'card' });
    const seen = read(sharedGrowthCardSchema, await api.anonymous().get(`${shared}/card`).expect(200));
    expect(seen).toMatchObject({ id: card.id, layers: card.layers, readings: card.readings });
    expect(seen).not.toHaveProperty('groupId');
    expect((await pagesOf(await pdfOf(`${shared}/card.pdf`, api.anonymous())))[0]).toContain(card.title);
    const stored = await api.models.ShareLink.findOne({ where: { cardId: card.id }, raw: true });
    expect(JSON.stringify(stored)).not.toContain(token);
    await browser.delete(`/api/v1/cards/${card.id}`).expect(204);
    await api.anonymous().get(`${shared}/card`).expect(410);
  });

  test.each(['revoked', 'expired'])('and its PDF answer 410 once the link is %s', async (how) => {
    const card = await make(wanted());
    const shared = `/api/v1/shared/${card.url!.split('/').at(-1)!}`;
    const link = await api.models.ShareLink.findOne({ where: { cardId: card.id }, rejectOnEmpty: true });
    if (how === 'revoked') await browser.delete(`/api/v1/links/${link.id}`).expect(204);
    else await link.update({ expiresAt: new Date(Date.now() - 1_000) });
    for (const part of ['/card', '/card.pdf', '/subject']) {
      const answer = await api.anonymous().get(shared + part);
      expect([part, answer.status, refusalOf(answer).code]).toEqual([part, 410, 'gone']);
      expect(answer.text).not.toContain(card.title);
    }
    // The group keeps its card.
    await browser.get(`/api/v1/cards/${card.id}`).expect(200);
  });

  test('shows no more than itself: not the group, nor where it came from, nor by other routes', async () => {
    const card = await make(wanted());
    const shared = `/api/v1/shared/${card.url!.split('/').at(-1)!}`;
    const { text } = await api.anonymous().get(`${shared}/card`).expect(200);
    const { group, editor, owner } = people;
    for (const secret of [group.id, group.name, editor.id, editor.email, owner.name, 'studyId', 'designId']) {
      expect(text).not.toContain(secret);
    }
    for (const part of ['', '/study', '/design', '/data', '/result', '/input.json']) {
      await api
        .anonymous()
        .get(shared + part)
        .expect(404);
    }
    await api
      .anonymous()
      .get(`/api/v1/shared/${'x'.repeat(43)}/card.pdf`)
      .expect(404);
  });

  test('of a study carries a link that opens the study', async () => {
    const studyId = await studyOf();
    const card = await make(wanted({ studyId }));
    const token = card.url!.split('/').at(-1)!;
    expect((await api.anonymous().get(`/api/v1/shared/${token}/subject`)).body).toEqual({ opens: 'study' });
    expect((await make(wanted({ studyId, link: null }))).url).toBeNull();
  });

  test('is made once when the request is sent twice, at once or afterwards', async () => {
    const send = (overrides: Partial<CreateGrowthCard> = {}) =>
      browser.post(groupUrl()).set('Idempotency-Key', 'press-1').send(wanted(overrides));
    const [first, second] = await Promise.all([send().expect(201), send().expect(201)]);
    const ids = [first, second, await send().expect(201)].map((answer) => read(growthCardSchema, answer).id);
    expect(new Set(ids).size).toBe(1);
    expect(await kept()).toEqual({ cards: 1, links: 1 });
    const others: Partial<CreateGrowthCard>[] = [
      { decision: { text: 'Another.' } },
      { rates: [{ layerId: 'cap', nmPerMin: 1.8 }] },
      { rates: [] },
      { link: null },
      { link: { expiresAt: '2100-01-01T00:00:00Z' } },
      { studyId: await studyOf() },
      { designId: await designOf() },
    ];
    for (const other of others) expect([other, (await send(other)).status]).toEqual([other, 409]);
    expect(await kept()).toEqual({ cards: 1, links: 1 });
  });

  const leave = () => api.models.Membership.destroy({ where: { userId: people.editor.id } });
  const demote = () =>
    api.models.Membership.update({ role: 'viewer' }, { where: { userId: people.editor.id } });
  const clearStudies = () => api.models.Study.destroy({ where: { groupId: people.group.id } });
  const clearDesigns = () => api.models.Run.destroy({ where: { groupId: people.group.id } });
  test.each([
    ['the asker leaves the group', leave, 404, []],
    ['the asker becomes a viewer', demote, 403, []],
    ['its study is deleted', clearStudies, 422, ['studyId']],
    ['its design is deleted', clearDesigns, 422, ['designId']],
  ])('leaves nothing behind when %s while it is made', async (_, change, status, named) => {
    const origin = {
      ...(change === clearStudies && { studyId: await studyOf() }),
      ...(change === clearDesigns && { designId: await designOf() }),
    };
    const { pool } = api.dependencies;
    const compute = pool.bands.bind(pool);
    const bands = vi.spyOn(pool, 'bands').mockImplementationOnce(async (...given) => {
      const answer = await compute(...given);
      await change();
      return answer;
    });
    const answer = await browser.post(groupUrl()).send(wanted(origin));
    expect(bands).toHaveBeenCalledOnce();
    bands.mockRestore();
    expect(answer.status).toBe(status);
    expect(status === 422 ? issuePaths(answer) : []).toEqual(named);
    expect(await kept()).toEqual({ cards: 0, links: 0 });
  });

  test('that is cancelled too late, while it is committed, is told with its id', async () => {
    const making = async () =>
      read(cardMakingSchema, await browser.get(`${groupUrl()}-in-making/late`).expect(200));
    expect(await making()).toEqual({ progress: null, cardId: null });
    let release = () => undefined as void;
    const held = new Promise<void>((resolve) => (release = resolve));
    const reached = vi.fn(() => held);
    api.models.Activity.addHook('afterCreate', 'hold the commit', (_row, { transaction }) => {
      if (!transaction) throw new Error('a card is stored in one transaction');
      const commit = transaction.commit.bind(transaction);
      transaction.commit = () => reached().then(commit);
    });
    const sent = browser
      .post(groupUrl())
      .set('Idempotency-Key', 'late')
      .send(wanted({ link: null }));
    sent.end(() => undefined);
    await vi.waitFor(() => expect(reached).toHaveBeenCalledOnce(), { timeout: 10_000 });
    api.models.Activity.removeHook('afterCreate', 'hold the commit');
    sent.abort();
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(await making()).toMatchObject({ progress: { step: 'card' }, cardId: null });
    release();
    await vi.waitFor(async () => expect((await making()).progress).toBeNull(), { timeout: 10_000 });
    const [stored] = await api.models.GrowthCard.findAll({ where: { groupId: people.group.id } });
    expect(await making()).toEqual({ progress: null, cardId: stored!.id });
  });

  test('that is cancelled leaves nothing behind, while its films are drawn or while it is stored', async () => {
    const tolerance = { ratePercent: 3, randomPercent: 4, indexPercent: 1, samples: 20_000, seed: 7 };
    const bands = vi.spyOn(api.dependencies.pool, 'bands');
    const sent = browser.post(groupUrl()).set('Idempotency-Key', 'long').send(wanted({ tolerance }));
    sent.end(() => undefined);
    const making = async () =>
      read(cardMakingSchema, await browser.get(`${groupUrl()}-in-making/long`).expect(200)).progress;
    const isDrawing = { step: 'bands', total: 20_000, done: above0 };
    await vi.waitFor(async () => expect(await making()).toMatchObject(isDrawing), { timeout: 10_000 });
    sent.abort();
    const ended = { type: 'rejected', value: { failure: 'cancelled' } };
    await vi.waitFor(() => expect(bands.mock.settledResults[0]).toMatchObject(ended), { timeout: 10_000 });
    bands.mockRestore();
    expect(await making()).toBeNull();

    const hungUp = new AbortController();
    api.models.ShareLink.addHook('afterCreate', 'hang up', () => hungUp.abort());
    const actor = { userId: people.editor.id, name: people.editor.name };
    const given = createGrowthCardSchema.parse(wanted());
    const late = createCard(api.dependencies, actor, people.group, given, { signal: hungUp.signal });
    await expect(late).rejects.toMatchObject({ failure: 'cancelled' });
    api.models.ShareLink.removeHook('afterCreate', 'hang up');
    expect(await kept()).toEqual({ cards: 0, links: 0 });
  });

  test('is refused with the place of each mistake', async () => {
    const run = await buildRun(api.models, people.group, { state: 'done' });
    const foreign = await buildMaterial(api.models, { group: people.strangersGroup });
    const pathsOf = async (overrides: Partial<CreateGrowthCard>) => {
      const answer = await browser.post(groupUrl()).send(wanted(overrides));
      expect(answer.status).toBe(422);
      return issuePaths(answer);
    };
    expect(await pathsOf({ rates: [{ layerId: 'none', nmPerMin: 1 }] })).toEqual(['rates[0].layerId']);
    expect(await pathsOf({ designId: run.id })).toEqual(['designId']);
    expect(await pathsOf({ studyId: run.id })).toEqual(['studyId']);
    expect(await pathsOf({ decision: { text: ' ' } })).toEqual(['decision.text']);
    expect(await pathsOf({ link: { expiresAt: '2020-01-01T00:00:00Z' } })).toEqual(['link.expiresAt']);
    const document = buildDocument({ substrate: { material: foreign.id } });
    expect(await pathsOf({ document })).toEqual(['document.substrate']);
    expect(await api.models.GrowthCard.count({ where: { groupId: people.group.id } })).toBe(0);
  });

  test('is made by editors, read by members, hidden from strangers', async () => {
    const card = await make(wanted());
    const viewer = await api.signedIn(people.viewer);
    await viewer.get(`/api/v1/cards/${card.id}/card.pdf`).expect(200);
    await viewer.post(groupUrl()).send(wanted()).expect(403);
    await viewer.delete(`/api/v1/cards/${card.id}`).expect(403);
    const stranger = await api.signedIn(people.stranger);
    await stranger.get(`/api/v1/cards/${card.id}`).expect(404);
    await stranger.get(`/api/v1/cards/${card.id}/card.pdf`).expect(404);
    await api.anonymous().get(`/api/v1/cards/${card.id}`).expect(401);
  });
});

describe('its PDF', () => {
  test('is one page that says everything the screen shows', async () => {
    const card = await make(wanted());
    const pages = await pagesOf(await pdfOf(`/api/v1/cards/${card.id}/card.pdf`));
    expect(pages).toHaveLength(1);
    const text = squeeze(pages[0]!);
    const missing = shownOf(card).filter((shown) => !text.includes(squeeze(shown)));
    expect(missing).toEqual([]);
    for (const symbol of ['φ', 'λ', 'µ', '°', '±', 'σ']) expect(text).toContain(symbol);
    for (const byHand of ['Rate, nm/min', 'Time, s', 'Sample', 'As grown, nm', 'Measured']) {
      expect(text).toContain(squeeze(byHand));
    }
  });

  test('of a film with many layers goes on overleaf and loses nothing', async () => {
    const layers = Array.from({ length: 60 }, (_, at) => ({
      id: `l${at}`,
      medium: {
        index: [2, 3] as [number, number],
        ...(at === 30 && { voigt: 0.01 }),
        label: `Layer ${at} from Łódź 中`,
      },
      thicknessNm: 1 + at / 7,
      ...(at === 30 && { m: [0, 0, 1] as [number, number, number] }),
    }));
    const card = await make(
      wanted({ rates: [], document: buildDocument({ layers: [{ id: 'b', repeat: 2, layers }] }) }),
    );
    const pages = await pagesOf(await pdfOf(`/api/v1/cards/${card.id}/card.pdf`));
    expect(pages.length).toBeGreaterThan(1);
    expect(pages[0]).toContain(`page 1 of ${pages.length}, continued overleaf`);
    // The table goes on under its title and columns.
    expect(pages[1]).toMatch(/^ ?Pt\/Co\/Pt, cap of 3 nm Sample id NF-0417 Step Material, role Nominal, nm/);
    const text = squeeze(pages.join(' '));
    const missing = shownOf(card).filter(
      (shown) => !text.includes(squeeze(shown.replaceAll('中', '[U+4E2D]'))),
    );
    expect(missing).toEqual([]);
  });
});
