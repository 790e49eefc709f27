import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import { projectRoot } from './projectRoot.ts';

const packageSchema = z.object({ version: z.string() });

/** Of the program, as package.json says. */
export const version = packageSchema.parse(
  JSON.parse(readFileSync(path.join(projectRoot, 'package.json'), 'utf8')),
).version;
