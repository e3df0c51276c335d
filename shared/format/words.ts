import type { Grade } from '../types/answer';
import type { CaseState } from '../types/case';
import type { Sector } from '../types/reading';
import type { Citation, Provenance } from '../types/source';

export const GRADE_WORDS: Readonly<Record<Grade, string>> = { assigned: 'assigned', tentative: 'tentative', 'not-decided': 'not decided' };

export const STATE_WORDS: Readonly<Record<CaseState, string>> = {
  draft: 'draft', 'in-review': 'in review', queried: 'queried', signed: 'signed', superseded: 'superseded', withdrawn: 'withdrawn',
};

export const PROVENANCE_WORDS: Readonly<Record<Provenance, string>> = {
  seen: 'seen in a public text', practice: 'common practice, no source', memory: 'from memory, not seen',
};

/** Klyne–Prelog sectors: short form with a true minus, and the full word. */
export const SECTOR_SHORT: Readonly<Record<Sector, string>> = { sp: 'sp', '+sc': '+sc', '+ac': '+ac', ap: 'ap', '-ac': '−ac', '-sc': '−sc' };
export const SECTOR_WORDS: Readonly<Record<Sector, string>> = {
  sp: 'synperiplanar', '+sc': '+synclinal', '+ac': '+anticlinal', ap: 'antiperiplanar', '-ac': '−anticlinal', '-sc': '−synclinal',
};

/** A source as one line. */
export function citationText({ authors, year, where }: Citation): string {
  return year === null ? `${authors}, ${where}` : `${authors}, ${where} (${year})`;
}
