import type { z } from 'zod';

import { Problem } from '@/server/http/problems';
import { resolveAlkene, type DoubleBond } from '@/server/structures/doubleBonds';
import type { FieldError } from '@/shared/contracts/problem';
import type { quickLookRequest } from '@/shared/contracts/quickLook';
import { quickLook } from '@/shared/engine';
import { problemText } from '@/shared/text/problems';
import { quickLookText } from '@/shared/text/quickLook';
import type { DoubleBondInput, QuickLookAnswer, QuickLookInput, QuickLookQuestion, QuickLookRefusal } from '@/shared/types/answer';
import type { FieldProblem } from '@/shared/types/reading';
import type { Registry } from '@/shared/types/relation';

export type QuickLookReply = QuickLookAnswer | QuickLookQuestion;

/** `groups.front` names a place in the request: `#/groups/front`. */
const errorOf = ({ field, code, sentence, mends }: FieldProblem): FieldError => ({ pointer: `#/${field.replaceAll('.', '/')}`, detail: sentence, code, mends });

/** What the engine refuses is bad input to whoever asked: each field with its sentence and its mends. */
function refused({ problems }: QuickLookRefusal): Problem {
  return new Problem('invalid-input', problems.length === 1 ? problems[0]?.sentence ?? problemText.checkFields : problemText.checkFields, { errors: problems.map(errorOf) });
}

function answered(input: QuickLookInput, registry: Registry): QuickLookReply {
  const result = quickLook(input, registry);
  if (result.state === 'refused') throw refused(result);
  return result;
}

/** What a choice puts into the request in place of the SMILES. */
const asInputs = ({ groups, ringSize }: DoubleBond): string => JSON.stringify({ groups, ringSize });

/** A structure with several CH=CH: which one is meant is a question to the person. */
function whichBond(input: DoubleBondInput, bonds: readonly DoubleBond[], registry: Registry): QuickLookQuestion {
  const { engineVersion, reading, notes } = answered({ ...input, groups: null, ringSize: null }, registry);
  return {
    state: 'question', engineVersion, bond: 'double', field: 'smiles', question: quickLookText.whichBond(bonds.length), why: quickLookText.whichBondWhy, reading, notes,
    choices: bonds.map((bond) => ({ label: bond.label, field: 'groups', value: asInputs(bond) })),
  };
}

async function bySmiles(smiles: string, input: DoubleBondInput, registry: Registry): Promise<QuickLookReply> {
  const found = await resolveAlkene(smiles);
  if ('sentence' in found) throw new Problem('invalid-input', found.sentence, { errors: [{ pointer: '#/smiles', detail: found.sentence, code: 'smiles' }] });
  const reply = 'choose' in found ? whichBond(input, found.choose, registry) : answered({ ...input, groups: found.bond.groups, ringSize: found.bond.ringSize }, registry);
  return found.note === null ? reply : { ...reply, notes: [...reply.notes, { field: 'smiles', code: 'stereo-ignored', text: found.note }] };
}

/** One measured coupling read by the engine. @throws Problem invalid-input with each field that cannot be used */
export function lookAt(request: z.output<typeof quickLookRequest>, registry: Registry): QuickLookReply | Promise<QuickLookReply> {
  if (request.bond === 'single') return answered(request, registry);
  const { smiles, ...input } = request;
  if (!smiles) return answered(input, registry);
  if (input.groups) throw new Problem('invalid-input', quickLookText.smilesOrGroups, { errors: [{ pointer: '#/smiles', detail: quickLookText.smilesOrGroups, code: 'smiles-and-groups' }] });
  return bySmiles(smiles, input, registry);
}
