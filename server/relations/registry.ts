import { z } from 'zod';

import { registryFrom } from '@/shared/engine/relations/registry';
import { tableRows } from '@/shared/engine/relations/tables';
import type { Registry, RelationRow } from '@/shared/types/relation';
import { verifyPrintedFormula } from './printedFormula';
import { relationRow } from './schema';

/** Reads rows as JSON, every field by the schema. @throws with row and field */
export function readRelations(json: readonly unknown[]): Registry {
  const rows: RelationRow[] = json.map((entry, i) => {
    const read = relationRow.safeParse(entry);
    if (!read.success) throw new Error(`relation row ${i + 1}: ${z.prettifyError(read.error)}`);
    return read.data;
  });
  return registryFrom(rows);
}

let registry: Registry | null = null;

/** The relations this server calculates with: read once, at start. */
export function relationRegistry(): Registry {
  registry ??= readRelations(tableRows);
  return registry;
}

/** Holds every printed formula against the function that calculates. @throws with row, set and angle where they differ */
export async function verifyRelations(held: Registry): Promise<void> {
  for (const row of held.rows) await verifyPrintedFormula(row);
}
