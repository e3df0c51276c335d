import { z } from 'zod';

import { LIMITS } from '../limits';
import { quickLookAnswer, quickLookQuestion } from './engine';

/**
 * POST /api/quick-look. Numbers come as typed (text), so that the server says what it read; a JSON number is accepted too.
 * A value that cannot be used answers 422 problem+json, one entry of `errors` for each field, with `code` and `mends`.
 */
export const typedNumber = z.union([z.string().max(LIMITS.hzText, `At most ${LIMITS.hzText} characters.`), z.number().transform(String)]);
export const groupText = z.string().trim().min(1).max(LIMITS.groupText);
const groupPair = z.tuple([groupText, groupText]);

const readingFields = {
  j: typedNumber.nullish().transform((typed) => typed ?? ''),
  se: typedNumber.nullish().transform((typed) => typed ?? undefined),
  partner: typedNumber.nullish().transform((typed) => typed ?? undefined),
  fieldMHz: typedNumber.nullish().transform((typed) => typed ?? undefined),
};

export const singleBondFields = {
  bond: z.literal('single'),
  groups: z.object({ front: groupPair, rear: groupPair }).nullish(),
  turning: z.enum(['free', 'ring', 'unknown']).optional(),
  relation: z.string().max(80).optional(),
};
export const ringSize = z.union([z.literal(3), z.literal(4), z.literal(5), z.literal(6), z.literal(7), z.literal(8)]);
export const doubleBondFields = {
  bond: z.literal('double'),
  groups: z.object({ left: groupPair, right: groupPair }).nullish(),
  ringSize: ringSize.nullish(),
};

export const quickLookRequest = z.discriminatedUnion('bond', [
  z.strictObject({ ...singleBondFields, ...readingFields }),
  /** `smiles` in place of groups: the server finds the CH=CH and its groups; stereo marks in it are ignored */
  z.strictObject({ ...doubleBondFields, ...readingFields, smiles: z.string().trim().max(LIMITS.smiles).nullish() }),
]);
export const quickLookResponse = z.discriminatedUnion('state', [quickLookAnswer, quickLookQuestion]);

/** POST /api/structures/double-bonds: which C=C a SMILES holds, and the groups on each end. */
export const doubleBondsRequest = z.strictObject({ smiles: z.string().trim().min(1, 'Paste a SMILES first.').max(LIMITS.smiles) });
export const doubleBondsResponse = z.object({
  note: z.string().nullable(),
  bonds: z.array(z.object({
    label: z.string(),
    groups: z.object({ left: groupPair, right: groupPair }),
    ringSize: ringSize.nullable(),
  })),
});

export type QuickLookRequest = z.input<typeof quickLookRequest>;
export type QuickLookResponse = z.infer<typeof quickLookResponse>;
export type DoubleBondsResponse = z.infer<typeof doubleBondsResponse>;
