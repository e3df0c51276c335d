import type { RelationSummary } from '@/shared/contracts/relations';
import type { Registry } from '@/shared/types/relation';

export interface HeldRelations {
  registry: Registry;
  summaries: RelationSummary[];
}

let held: Promise<HeldRelations> | null = null;

async function load(): Promise<HeldRelations> {
  const [{ relationRegistry }, { relationSummary }] = await Promise.all([import('./registry'), import('./summary')]);
  const registry = relationRegistry();
  return { registry, summaries: registry.rows.map(relationSummary) };
}

/** The relations the product runs on: read and summed up once. A row with a slip rejects, and start stops with its name. */
export function heldRelations(): Promise<HeldRelations> {
  held ??= load();
  return held;
}
