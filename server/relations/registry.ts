import { z } from 'zod';

import { registryFrom } from '@/shared/engine/relations/registry';
import { tableRows } from '@/shared/engine/relations/tables';
import type { Registry, RelationRow } from '@/shared/types/relation';
import { verifyPrintedFormula } from './printedFormula';
import { relationRow } from './schema';

/** Reads rows as JSON: every field by the schema, every printed formula against the function. @throws with row and field */
export function readRelations(json: readonly unknown[]): Registry {
  const rows: RelationRow[] = json.map((entry, i) => {
    const read = relationRow.safeParse(entry);
    if (!read.success) throw new Error(`relation row ${i + 1}: ${z.prettifyError(read.error)}`);
    verifyPrintedFormula(read.data);
    return read.data;
  });
  return registryFrom(rows);
}

let registry: Registry | null = null;

/** The relations this server calculates with: read and verified once, at start. */
export function relationRegistry(): Registry {
  registry ??= readRelations(tableRows);
  return registry;
}
