import type { z } from 'zod';

import { fieldProblem } from '@/server/http/problems';
import { resolveAlkene } from '@/server/structures/doubleBonds';
import type { quickLookRequest } from '@/shared/contracts/quickLook';
import { casesText } from '@/shared/text/cases';
import type { QuickLookInput } from '@/shared/types/answer';

/** A quick look as the engine takes it: a SMILES is read into the groups of its one C=C. @throws Problem when it names none, or several */
export async function resolveQuickLook(request: z.output<typeof quickLookRequest>): Promise<QuickLookInput> {
  if (request.bond === 'single') return request;
  const { smiles, ...input } = request;
  if (!smiles || input.groups) return input;
  const found = await resolveAlkene(smiles);
  if ('sentence' in found) throw fieldProblem('quickLook/smiles', found.sentence);
  if ('choose' in found) throw fieldProblem('quickLook/smiles', casesText.chooseBond);
  return { ...input, groups: found.bond.groups, ringSize: found.bond.ringSize };
}
