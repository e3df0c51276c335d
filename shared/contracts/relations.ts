import { z } from 'zod';

import { arc, provenance, relationRef, root } from './engine';
import { groupText } from './quickLook';

/**
 * GET /api/relations: every held relation, as the rows the engine runs on (`row` is the JSON of
 * shared/engine/relations/tables, so that the device may run the same engine) with what a reader needs beside them.
 */
export const relationSummary = relationRef.extend({
  status: z.enum(['current', 'superseded', 'doubtful']),
  kind: z.string(),
  coupling: z.string(),
  domain: z.string(),
  failures: z.array(z.string()),
  checkedBy: z.string(),
  parameters: z.array(z.object({ set: z.string().nullable(), name: z.string(), value: z.number(), unit: z.string(), provenance })),
  applies: z.array(z.object({ verdict: z.enum(['yes', 'doubtful', 'no']), text: z.string() })),
  checks: z.array(z.object({ name: z.string(), phiDeg: z.number().nullable(), calculatedHz: z.number(), measured: z.string(), source: z.string() })),
  row: z.record(z.string(), z.unknown()),
});
export const relationsResponse = z.object({ engineVersion: z.string(), relations: z.array(relationSummary) });

export const substituent = z.strictObject({
  dchiAlpha: z.number().min(-3).max(3), dchiBeta: z.array(z.number().min(-3).max(3)).max(4), xi: z.union([z.literal(1), z.literal(-1)]),
});
const curveInputs = {
  relation: z.string().min(1).max(80),
  /** set letter of the generalised equation; default by the number of groups */
  set: z.enum(['B', 'C', 'D', 'E']).optional(),
  groups: z.object({ front: z.tuple([groupText, groupText]), rear: z.tuple([groupText, groupText]) }).optional(),
  substituents: z.array(substituent).max(4).optional(),
};
/** POST /api/relations/evaluate: J from φ. */
export const evaluateRequest = z.strictObject({ ...curveInputs, phiDeg: z.number().min(-360).max(360) });
export const evaluateResponse = z.object({ relation: relationRef, phiDeg: z.number(), jHz: z.number(), worked: z.string() });
/** POST /api/relations/invert: all φ in (−180, 180] from J, and the arcs within `toleranceHz`. */
export const invertRequest = z.strictObject({ ...curveInputs, jHz: z.number().min(-100).max(100), toleranceHz: z.number().positive().max(20).optional() });
export const invertResponse = z.object({
  relation: relationRef, jHz: z.number(), roots: z.array(root), arcs: z.array(arc), reach: z.object({ minHz: z.number(), maxHz: z.number() }),
});

export type RelationSummary = z.infer<typeof relationSummary>;
export type RelationsResponse = z.infer<typeof relationsResponse>;
export type EvaluateResponse = z.infer<typeof evaluateResponse>;
export type InvertResponse = z.infer<typeof invertResponse>;
