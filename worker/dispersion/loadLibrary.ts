import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Issue } from '../../shared/error.ts';
import { describeIssues } from '../../shared/issues.ts';
import { libraryEntrySchema } from '../../shared/material.ts';
import type { LibraryEntry } from '../../shared/material.ts';
import { checkContent } from './checkContent.ts';

/**
 * The shipped constants, one file per material, in the order of their ids.
 *
 * @param directory `data/library` of the project, given by the caller: the code may run bundled from elsewhere
 * @throws Error that names the file and everything wrong with it
 */
export function loadLibrary(directory: string): LibraryEntry[] {
  const files = readdirSync(directory)
    .filter((file) => file.endsWith('.json'))
    .sort();
  return files.map((file) => readEntry(join(directory, file), file.slice(0, -'.json'.length)));
}

function readEntry(path: string, id: string): LibraryEntry {
  let json: unknown;
  try {
    json = JSON.parse(readFileSync(path, 'utf8'));
  } catch (error) {
    throw new Error(`${path}: not readable as JSON`, { cause: error });
  }
  const parsed = libraryEntrySchema.safeParse(json);
  if (!parsed.success) throw refusal(path, describeIssues(parsed.error, json));
  const issues = checkContent(parsed.data.content).map(({ path: at, message }) => ({
    path: `content.${at}`,
    message,
  }));
  if (parsed.data.id !== id) {
    issues.push({ path: 'id', message: `must be the name of the file, got ${parsed.data.id}` });
  }
  if (issues.length > 0) throw refusal(path, issues);
  return parsed.data;
}

function refusal(path: string, issues: Issue[]): Error {
  return new Error(`${path}: ${issues.map((issue) => `${issue.path}: ${issue.message}`).join('; ')}`);
}
