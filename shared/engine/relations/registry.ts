import { RELATION_KINDS, type ClassTableRow, type Registry, type RelationRow } from '../../types/relation';
import { alkeneModel } from '../alkenes/model';

/**
 * The relations at hand, found by `id` (its current version, or the newest doubtful one) or by `id@version`.
 * @throws RangeError when two rows share id and version
 */
export function registryFrom(rows: readonly RelationRow[]): Registry {
  const byRef = new Map<string, RelationRow>();
  for (const row of rows) {
    const exact = `${row.id}@${row.version}`;
    if (byRef.has(exact)) throw new RangeError(`two rows are called ${exact}`);
    byRef.set(exact, row);
    const newest = byRef.get(row.id);
    if (row.status !== 'superseded' && (!newest || newest.version < row.version)) byRef.set(row.id, row);
  }
  const table = [...byRef.values()].find((row): row is ClassTableRow => row.kind === 'class-table' && row.status === 'current');
  return Object.freeze({ rows: Object.freeze([...rows]), find: (ref: string) => byRef.get(ref), alkenes: table ? alkeneModel(table) : null });
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);

/** Tells a relation row from other JSON by the parts that the engine reads. The server checks every field at start. */
export function isRelationRow(json: unknown): json is RelationRow {
  return (
    isRecord(json) && typeof json.id === 'string' && Number.isInteger(json.version) && (RELATION_KINDS as readonly unknown[]).includes(json.kind) &&
    Array.isArray(json.parameterSets) && json.parameterSets.every((s) => isRecord(s) && isRecord(s.values) && Object.values(s.values).every(Number.isFinite)) &&
    (json.kind !== 'generalised' || isRecord(json.electronegativity)) && (json.kind !== 'class-table' || Array.isArray(json.compounds))
  );
}

/** The same from JSON, as `GET /api/relations` gives it. @throws RangeError on anything that is no relation row */
export function registryFromJson(rows: readonly unknown[]): Registry {
  return registryFrom(
    rows.map((row, i) => {
      if (!isRelationRow(row)) throw new RangeError(`entry ${i + 1} of the relations is no relation row`);
      return row;
    }),
  );
}
