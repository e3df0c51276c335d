import type { CaseResponse } from '@/shared/contracts/cases';
import type { CaseContent, Reading } from '@/shared/types/case';
import type { FieldProblem } from '@/shared/types/reading';

import { same } from './versions';

type Trail = CaseResponse['trail'];

/** How a reading stands to its partner's splitting: agreed, not read, or apart by more than the errors allow. */
export function partnerState(reading: Reading, trail: Trail): 'agrees' | 'not-read' | 'differs' {
  if (reading.partner.trim() === '') return 'not-read';
  const flagged = trail.steps.some((step) => step.key === `reading:${reading.id}` && step.flags.some((flag) => flag.id === 'partner-differs'))
    || trail.calculations.some((each) => each.readingId === reading.id && each.result.state === 'answered' && each.result.cautions.some((caution) => caution.id === 'partner-differs'));
  return flagged ? 'differs' : 'agrees';
}

/** What the engine refused of a reading, by field; [] when it was read. */
export const problemsOf = (reading: Reading, trail: Trail): FieldProblem[] =>
  trail.calculations.flatMap((each) => (each.readingId === reading.id && each.result.state === 'refused' ? each.result.problems : []));

/** Is this row on the server as it stands on screen? */
export const isOnServer = (reading: Reading, server: CaseContent): boolean => {
  const there = server.readings.find((row) => row.id === reading.id);
  return there !== undefined && same(there, reading);
};
