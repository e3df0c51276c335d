import { readRelations } from '@/server/relations/registry';
import { tableRows } from '@/shared/engine/relations/tables';
import type { AngleRow, Registry } from '@/shared/types/relation';

let held: Registry | null = null;

/** The relations the product runs on, read and verified as at its start; once a test file. */
export function heldForTests(): Registry {
  held ??= readRelations(tableRows);
  return held;
}

/** A held relation that gives angles. */
export function angleRow(id: string): AngleRow {
  const row = heldForTests().find(id);
  if (!row || row.kind === 'class-table') throw new Error(`${id} is not held`);
  return row;
}
