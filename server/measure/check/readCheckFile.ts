import { readFile } from 'node:fs/promises';

import { z } from 'zod';

import { asRecord } from '../lib/read';
import { Refusal } from '../lib/refusal';
import { type Check, EXPECT_KINDS } from './types';

const check = z.object({
  id: z.string(),
  family: z.string(),
  relation: z.string(),
  given: z.record(z.string(), z.unknown()),
  expect_kind: z.enum(EXPECT_KINDS),
  expected: z.unknown(),
  never: z.array(z.string()).optional(),
  tolerance: z.number().nonnegative().optional(),
  unit: z.string().optional(),
  how: z.string(),
  in_reference: z.boolean().optional(),
});

/** Reads a check file; what is kept of a check is what the schema names, so no adapter ever sees `for_reader`. */
export async function readCheckFile(path: string): Promise<Check[]> {
  return parseChecks(await readJson(path), path);
}

export function parseChecks(content: unknown, path: string): Check[] {
  const read = z.array(check).safeParse(rowsOf(content, 'checks'));
  if (!read.success) {
    const first = read.error.issues[0];
    throw new Refusal(`${path} is not a check file: ${first?.path.join('.') ?? ''} ${first?.message ?? ''}`.trim());
  }
  return read.data;
}

/** The rows of a file, which lie bare or under a name of their own. */
export const rowsOf = (content: unknown, name: string): unknown => (Array.isArray(content) ? content : asRecord(content)?.[name]);

export async function readJson(path: string): Promise<unknown> {
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch {
    throw new Refusal(`${path} cannot be read: give the path of a JSON file.`);
  }
  try {
    return JSON.parse(text) as unknown;
  } catch (error) {
    throw new Refusal(`${path} is not JSON: ${error instanceof Error ? error.message : String(error)}`);
  }
}
