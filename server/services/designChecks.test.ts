import { describe, expect, test } from 'vitest';
import type { DesignInput } from '../../shared/design.ts';
import { createDesignSchema } from '../../shared/design.ts';
import type { Issue } from '../../shared/error.ts';
import { describeIssues } from '../../shared/issues.ts';
import type { StackLayer, StackMedium } from '../../shared/stack.ts';
import { resolveCase } from '../../worker/dispersion/resolveCase.ts';
import {
  buildCapInput,
  buildOptimiseInput,
  buildToleranceInput,
  polarPoint,
} from '../../tests/designInputs.ts';
import { buildDocument } from '../../tests/factories.ts';
import { checkDesign, checkDesignMaterials } from './designChecks.ts';

/** What POST /designs says of a question about typed constants, as `path: message`. */
async function issuesOf(input: DesignInput | Record<string, unknown>): Promise<string[]> {
  const body = { groupId: 'any', input };
  const parsed = createDesignSchema.safeParse(body);
  if (!parsed.success) return inWords(describeIssues(parsed.error, body));
  const design = parsed.data.input;
  const issues = checkDesign(design);
  if (issues.length > 0) return inWords(issues);
  return inWords(await checkDesignMaterials(design, (one) => Promise.resolve(resolveCase(one, new Map()))));
}

const inWords = (issues: Issue[]) => issues.map(({ path, message }) => `${path}: ${message}`);

const [pt, pair] = buildCapInput().candidates;
const { tolerance } = buildToleranceInput();
const many = <One>(count: number, make: (number: number) => One) =>
  Array.from({ length: count }, (_, number) => make(number));

/** The film with a graded interface above one of its layers. */
function graded(layerId: string, gradedNm: number) {
  const { layers } = buildDocument();
  // Without blocks every item is a layer.
  const change = (layer: StackLayer) => (layer.id === layerId ? { ...layer, gradedNm } : layer);
  return buildDocument({ layers: (layers as StackLayer[]).map(change) });
}

const mixture: StackMedium = {
  mixture: { model: 'bruggeman', fraction: 0.5, parts: [{ index: 1.5 }, { index: 2 }] },
};
const withMedium = (medium: StackMedium) => [{ ...pt!, layers: [{ ...pt!.layers[0]!, medium }] }];
const variable = (layerId: string, fromNm: number, toNm: number) =>
  buildOptimiseInput({ variables: [{ layerId, fromNm, toNm }] });

describe('what keeps a design question from being answered', () => {
  // Limits of shared/limits.ts; no physics.
  test.each<[string, DesignInput | Record<string, unknown>, RegExp]>([
    [
      'a range without end',
      buildCapInput({ range: { fromNm: 0, toNm: Infinity, points: 9 } }),
      /^input\.range\.toNm: must be a finite number/,
    ],
    [
      'a range beyond any film',
      buildCapInput({ range: { fromNm: 0, toNm: 1e308, points: 9 } }),
      /^input\.range\.toNm: must be <= 10000000/,
    ],
    [
      'bounds beyond any film',
      variable('cap', 0, 1e308),
      /^input\.variables\[0\]\.toNm: must be <= 10000000/,
    ],
    [
      'bounds the wrong way round',
      variable('cap', 3, 2),
      /^input\.variables\[0\]\.toNm: must be greater than fromNm/,
    ],
    ['bounds of an absent layer', variable('other', 0, 3), /^input\.variables\[0\]\.layerId: names no layer/],
    [
      'a layer varied twice',
      buildOptimiseInput({ variables: many(2, () => ({ layerId: 'cap', fromNm: 0, toNm: 3 })) }),
      /^input\.variables\[1\]\.layerId: is used twice/,
    ],
    [
      'ten thousand candidates',
      buildCapInput({ candidates: many(10_000, (number) => ({ ...pt!, id: String(number) })) }),
      /^input\.candidates: must have at most 12 entries, got 10000/,
    ],
    [
      'a million thicknesses',
      buildCapInput({ range: { fromNm: 0, toNm: 9, points: 1e6 } }),
      /^input\.range\.points: must be <= 400/,
    ],
    [
      'a thousand million samples',
      buildToleranceInput({ tolerance: { ...tolerance, samples: 1e9 } }),
      /^input\.tolerance\.samples: must be <= 20000/,
    ],
    ['no candidates', buildCapInput({ candidates: [] }), /^input\.candidates: must have at least 1 entry/],
    ['no working points', buildToleranceInput({ points: [] }), /^input\.points: must have at least 1 entry/],
    [
      'two points of one name',
      buildToleranceInput({ points: [polarPoint, polarPoint] }),
      /^input\.points\[1\]\.id: is used twice/,
    ],
    [
      'numbers as text',
      { ...buildToleranceInput(), tolerance: { ...tolerance, seed: '3' } },
      /^input\.tolerance\.seed: must be a number/,
    ],
    [
      'nothing for the film',
      { ...buildToleranceInput(), document: null },
      /^input\.document: must be an object/,
    ],
    [
      'an unknown kind',
      { ...buildToleranceInput(), kind: 'anneal' },
      /^input\.kind: must be "cap" or "optimise" or "tolerance", got "anneal"/,
    ],
    [
      'errors of a material twice',
      buildToleranceInput({
        tolerance: {
          ...tolerance,
          materials: many(2, () => ({ material: '{"index":[2.33,4.14]}', ratePercent: 1 })),
        },
      }),
      /^input\.tolerance\.materials\[1\]\.material: is named twice/,
    ],
    [
      'no room for a graded interface in the thinnest cap',
      buildCapInput({ document: graded('film', 1), range: { fromNm: 0, toNm: 9, points: 9 } }),
      /^input\.range\.fromNm: must be at least 0\.5 nm: the graded interface/,
    ],
    [
      '... nor in a fixed layer',
      buildCapInput({
        document: graded('film', 1),
        candidates: [{ ...pair!, layers: [pair!.layers[0]!, { ...pair!.layers[1]!, fixedNm: 0.4 }] }],
      }),
      /^input\.candidates\[0\]\.layers\[1\]\.fixedNm: must be at least 0\.5 nm/,
    ],
    [
      '... nor in a layer at its bound',
      { ...variable('cap', 0.4, 3), document: graded('film', 1) },
      /^input\.variables\[0\]\.fromNm: must be at least 0\.5 nm/,
    ],
    [
      'a cap that cannot be graded into the film',
      buildCapInput({ document: graded('film', 1), candidates: withMedium(mixture) }),
      /^input\.candidates\[0\]\.layers\[0\]\.medium: cannot grade .* mixture/,
    ],
    [
      '... nor into the substrate alone',
      buildCapInput({
        document: buildDocument({ layers: [], substrateGradedNm: 1 }),
        replaces: [],
        candidates: withMedium(mixture),
      }),
      /^input\.candidates\[0\]\.layers\[0\]\.medium: cannot grade .* mixture/,
    ],
  ])('%s', async (_what, input, expected) => {
    const found = await issuesOf(input);
    expect(found).toHaveLength(1);
    expect(found[0]).toMatch(expected);
  });

  test('nothing, where a film is odd and can be answered all the same', async () => {
    const slab = { backside: { thicknessNm: 5e5, exit: { index: 1 } } };
    const answered = [
      buildCapInput({ document: graded('film', 1) }),
      buildCapInput({
        document: buildDocument({ layers: [] }),
        replaces: [],
        candidates: withMedium(mixture),
      }),
      buildToleranceInput({ document: buildDocument({ layers: [] }) }),
      buildToleranceInput({
        document: buildDocument(slab),
        tolerance: { ...tolerance, ratePercent: 0, randomPercent: 0 },
      }),
      { ...variable('cap', 0.5, 3), document: graded('film', 1) },
    ];
    for (const input of answered) expect(await issuesOf(input)).toEqual([]);
  });
});
