import type { CaseContent } from '@/shared/types/case';

import type { CaseSheet } from '../caseContext';
import { placeOf } from './fieldSentences';

/** The sheet in which a gap is mended. A pointer counts rows; the row's id is looked up in the content it was made from. */
export function sheetFor(pointer: string, content: CaseContent): CaseSheet {
  const index = Number(/\/(\d+)(?:\/|$)/.exec(pointer)?.[1] ?? NaN);
  switch (placeOf(pointer)) {
    case 'conditions': return { kind: 'conditions' };
    case 'readings': return { kind: 'reading', id: content.readings[index]?.id ?? null };
    case 'calculations': {
      const row = content.calculations[index];
      const reading = content.readings.find((each) => each.id === row?.readingId) ?? content.readings.find((each) => each.path === '3J');
      if (reading === undefined) return { kind: 'reading', id: null };
      return { kind: 'calculation', readingId: reading.id, id: row?.id ?? null };
    }
    case 'candidates': return { kind: 'candidate', id: content.candidates[index]?.id ?? null };
    case 'evidence': return { kind: 'evidence', id: content.evidence[index]?.id ?? null };
    case 'answer': return { kind: 'answer' };
    default: return { kind: 'compound' };
  }
}
