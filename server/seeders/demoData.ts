import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import { roles } from '../../shared/account.ts';
import { capDesignSchema } from '../../shared/capDesign.ts';
import { createGrowthCardSchema } from '../../shared/growthCard.ts';
import { axisSchema } from '../../shared/run.ts';
import { createStackSchema, stackLayerSchema } from '../../shared/stack.ts';
import { projectRoot } from '../projectRoot.ts';

const peopleSchema = z.strictObject({
  group: z.string(),
  people: z.array(z.strictObject({ name: z.string(), email: z.email(), role: z.enum(roles) })),
});

const runSchema = z.strictObject({
  stack: z.string(),
  name: z.string(),
  axis: axisSchema,
  link: z.string(),
});

/** A study, with the input of its cap question without the document and of its card without what the question holds. */
const studySchema = z.strictObject({
  title: z.string(),
  question: z.string(),
  stack: z.string(),
  design: capDesignSchema.omit({ kind: true, document: true }).extend({ name: z.string() }),
  notes: z.tuple([z.string(), z.string()]),
  captions: z.strictObject({ design: z.string(), run: z.string() }),
  decision: z.string(),
  card: createGrowthCardSchema
    .pick({ title: true, rates: true, sampleId: true, bench: true, decision: true })
    .extend({ layer: stackLayerSchema }),
});

/** Of every demo account; published, and therefore refused in production. */
export const DEMO_PASSWORD = 'northgate-demo';

/** The one share token that is known to all: it exists in demo mode only. */
export const DEMO_LINK_TOKEN = 'northgate-demo-link';

const read = (file: string): unknown =>
  JSON.parse(readFileSync(path.join(projectRoot, 'data', 'demo', file), 'utf8'));

/** The invented group, its people and what they made, from data/demo. */
export function readDemoData() {
  return {
    ...peopleSchema.parse(read('people.json')),
    stacks: z.array(createStackSchema).parse(read('stacks.json')),
    run: runSchema.parse(read('run.json')),
    study: studySchema.parse(read('study.json')),
  };
}

export type DemoData = ReturnType<typeof readDemoData>;
