import type { Calculation, Candidate, CandidateClaim, CaseContent, Evidence, PersonAnswer, Reading } from '@/shared/types/case';

/** Pure changes to a content: each takes one and gives the next; none looks at the screen, the clock or the network. */

/** A short random text for a new row; it never leaves the case. */
export function newRowId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(9));
  return btoa(String.fromCharCode(...bytes)).replaceAll('+', '-').replaceAll('/', '_');
}

export const emptyReading = (id: string): Reading => ({
  id, atomA: '', atomB: '', nuclei: '¹H,¹H', path: '3J', j: '', se: '', partner: '', sign: 'not-measured', where: '', method: '', note: '',
});
export const emptyCandidate = (id: string): Candidate => ({ id, name: '', description: '', claims: [] });
export const emptyEvidence = (id: string): Evidence => ({ id, kind: 'noe', text: '', bearing: 'neutral', candidateId: null, attachmentIds: [] });
export const emptyAnswer = (): PersonAnswer => ({ grade: 'not-decided', candidateId: null, statement: '', reasons: '', leftOpen: '', overrideReason: '' });

const replaced = <T extends { id: string }>(rows: readonly T[], row: T): T[] =>
  rows.some((each) => each.id === row.id) ? rows.map((each) => (each.id === row.id ? row : each)) : [...rows, row];

/** Cuts links to rows that are gone: a calculation without its reading goes, a claim on it goes, evidence loses its candidate. */
export function tidy(content: CaseContent): CaseContent {
  const readingIds = new Set(content.readings.map((row) => row.id));
  const calculations = content.calculations.filter((row) => readingIds.has(row.readingId));
  const calculationIds = new Set(calculations.map((row) => row.id));
  const candidates = content.candidates.map((row) => ({ ...row, claims: row.claims.filter((claim) => calculationIds.has(claim.calculationId)) }));
  const candidateIds = new Set(candidates.map((row) => row.id));
  const known = (id: string | null) => id !== null && id !== 'none' && !candidateIds.has(id) ? null : id;
  return {
    ...content, calculations, candidates,
    evidence: content.evidence.map((row) => ({ ...row, candidateId: known(row.candidateId) })),
    answer: content.answer === null ? null : { ...content.answer, candidateId: known(content.answer.candidateId) },
  };
}

export const putReading = (content: CaseContent, reading: Reading): CaseContent => ({ ...content, readings: replaced(content.readings, reading) });
export const removeReading = (content: CaseContent, id: string): CaseContent =>
  tidy({ ...content, readings: content.readings.filter((row) => row.id !== id) });

/** One step up or down in the list; the ends stay where they are. */
export function moveReading(content: CaseContent, id: string, by: -1 | 1): CaseContent {
  const at = content.readings.findIndex((row) => row.id === id);
  const to = at + by;
  if (at < 0 || to < 0 || to >= content.readings.length) return content;
  const readings = [...content.readings];
  [readings[at], readings[to]] = [readings[to]!, readings[at]!];
  return { ...content, readings };
}

export const putCalculation = (content: CaseContent, calculation: Calculation): CaseContent => {
  const before = content.calculations.find((row) => row.id === calculation.id);
  const next = { ...content, calculations: replaced(content.calculations, calculation) };
  // another kind of bond answers another question: what candidates claimed of the old one no longer applies
  if (before === undefined || before.bond === calculation.bond) return next;
  return { ...next, candidates: next.candidates.map((row) => ({ ...row, claims: row.claims.filter((claim) => claim.calculationId !== calculation.id) })) };
};
export const removeCalculation = (content: CaseContent, id: string): CaseContent =>
  tidy({ ...content, calculations: content.calculations.filter((row) => row.id !== id) });

export const putCandidate = (content: CaseContent, candidate: Candidate): CaseContent => ({ ...content, candidates: replaced(content.candidates, candidate) });
export const removeCandidate = (content: CaseContent, id: string): CaseContent =>
  tidy({ ...content, candidates: content.candidates.filter((row) => row.id !== id) });

/** The claims of one candidate on one calculation, put in place of those it had; other calculations keep theirs. */
export const putClaims = (candidate: Candidate, calculationId: string, claims: readonly CandidateClaim[]): Candidate => ({
  ...candidate, claims: [...candidate.claims.filter((claim) => claim.calculationId !== calculationId), ...claims],
});

export const putEvidence = (content: CaseContent, evidence: Evidence): CaseContent => ({ ...content, evidence: replaced(content.evidence, evidence) });
export const removeEvidence = (content: CaseContent, id: string): CaseContent => ({ ...content, evidence: content.evidence.filter((row) => row.id !== id) });

export const putAnswer = (content: CaseContent, answer: PersonAnswer | null): CaseContent => ({ ...content, answer });

/** A tag as it is kept: trimmed, inner blanks single; the same word in another case is the same tag. */
export function addTag(content: CaseContent, typed: string): CaseContent {
  const tag = typed.trim().replace(/\s+/g, ' ');
  if (tag === '' || content.tags.some((each) => each.toLowerCase() === tag.toLowerCase())) return content;
  return { ...content, tags: [...content.tags, tag] };
}
export const removeTag = (content: CaseContent, tag: string): CaseContent => ({ ...content, tags: content.tags.filter((each) => each !== tag) });

/** Does the person's answer differ from the computed one, so that a reason is asked? */
export const differsFromComputed = (answer: Pick<PersonAnswer, 'grade' | 'candidateId'>, computed: { grade: string; candidateId: string | null }): boolean =>
  answer.grade !== computed.grade || answer.candidateId !== computed.candidateId;
