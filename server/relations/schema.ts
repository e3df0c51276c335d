import { z } from 'zod';

/** The JSON form of a relation row. Every field is checked at start: a table with a slip must not calculate. */
const provenance = z.enum(['seen', 'practice', 'memory']);
const text = z.string().min(1);
const hz = z.number();
const range = z.tuple([hz, hz]).refine(([a, b]) => a <= b, 'a range runs from the smaller value to the larger');
const group = z.string().regex(/^[A-Z][a-z]?(\([-=#A-Za-z,]*\))?$/, 'a group is its first atom and its neighbours, as in C(=O,O)');
const sourced = z.strictObject({ jHz: hz, name: text, provenance, source: text });

const base = {
  id: z.string().regex(/^[a-z0-9-]+\/[a-z0-9-]+$/),
  version: z.int().positive(),
  status: z.enum(['current', 'superseded', 'doubtful']),
  name: text, path: text, nuclei: text, formula: text, mathFormula: text,
  parameterSets: z.array(z.strictObject({
    id: z.string(), use: text, groups: z.int().nonnegative().nullable(), values: z.record(z.string(), z.number()), provenance, source: text,
  })).min(1),
  degreeParameters: z.array(text),
  inputs: z.array(z.strictObject({ name: text, label: text, unit: z.string(), domain: text })).min(1),
  domain: z.array(text).min(1),
  spreadHz: hz.positive(), spreadOutsideHz: hz.positive(), spreadProvenance: provenance, spreadNote: text,
  citation: z.strictObject({ authors: text, year: z.int().nullable(), where: text, doi: z.string().startsWith('10.').optional() }),
  provenance, provenanceNote: text,
  failures: z.array(text).min(1),
  checks: z.array(z.strictObject({
    name: text, phiDeg: z.number(), set: z.string(),
    substituents: z.array(z.strictObject({ dchiAlpha: z.number(), dchiBeta: z.array(z.number()), xi: z.union([z.literal(1), z.literal(-1)]) })),
    measuredHz: range, toleranceHz: hz.positive(), provenance, source: text,
  })),
  checkedBy: text,
};

export const relationRow = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('three-term'), form: z.enum(['fourier', 'power']), ...base }),
  z.strictObject({ kind: z.literal('two-branch'), ...base }),
  z.strictObject({
    kind: z.literal('generalised'), ...base,
    electronegativity: z.strictObject({ name: text, values: z.record(z.string(), z.number()), provenance, source: text }),
  }),
  z.strictObject({
    kind: z.literal('class-table'), ...base,
    classes: z.array(z.strictObject({ id: text, name: text, mixed: z.boolean(), undecidedHz: range.nullable(), undecidedProvenance: provenance })).min(1),
    compounds: z.array(z.strictObject({
      name: text, left: z.tuple([group, group]), right: z.tuple([group, group]), cisHz: hz.nullable(), transHz: hz.nullable(),
      geminalHz: hz.nonnegative().nullable(), doubtful: z.boolean(), provenance, source: text, note: text.optional(),
    })).min(1),
    rings: z.array(z.strictObject({ ringSize: z.int().min(3).max(8), parent: sourced, rangeHz: range, source: text, provenance, others: z.array(sourced.extend({ bears: z.enum(['hetero', 'conjugated']) })) })).min(1),
    carbonCouplings: z.array(z.strictObject({ geometry: z.enum(['cis', 'trans']), jHz: hz, name: text, provenance, source: text })).min(1),
  }),
]);
