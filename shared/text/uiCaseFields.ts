import { GRADE_WORDS } from '../format/words';
import type { Calculation, CandidateClaim, CaseContent, EvidenceKind, Reading, SignState } from '../types/case';
import type { Grade } from '../types/answer';

/** What each field of a case is called, wherever it is typed, compared or named in a sentence. */
export const fieldWords = {
  question: 'Question',
  compound: { name: 'Compound', batch: 'Batch', notebook: 'Notebook page', structureNote: 'Structure, in words' },
  conditions: { fieldMHz: 'Field', solvent: 'Solvent', temperatureK: 'Temperature', concentration: 'Concentration' },
  readings: {
    atomA: 'First atom', atomB: 'Second atom', j: '_J_', se: '±, one standard error', partner: 'Read at the partner', nuclei: 'Nuclei', path: 'Bonds between',
    sign: 'Sign', where: 'Where it was measured', method: 'How it was read', note: 'Note',
  },
  candidates: { name: 'Candidate', description: 'Description', claims: 'Claims' },
  evidence: { kind: 'Kind of evidence', text: 'Evidence', bearing: 'Bearing', candidateId: 'Speaks of', attachmentIds: 'Files' },
  answer: { grade: 'Grade', candidateId: 'Answer', statement: 'Answer in one sentence', reasons: 'Reasons', leftOpen: 'Left open', overrideReason: 'Why not the computed answer' },
} as const;

export const evidenceKindWords: Record<EvidenceKind, string> = {
  noe: 'NOE', 'other-coupling': 'Another coupling', 'x-ray': 'X-ray', synthesis: 'Route of synthesis', literature: 'Literature', other: 'Other',
};
export const bearingWords = { for: 'for', against: 'against', neutral: 'says neither' } as const;
export const signWords: Record<SignState, string> = { 'not-measured': 'not measured', positive: 'positive', negative: 'negative' };
export const pathWords = { '1J': '¹_J_, one bond', '2J': '²_J_, geminal', '3J': '³_J_, vicinal', '4J': '⁴_J_, four bonds', '5J': '⁵_J_, five bonds' } as const;
export const pathShort = { '1J': '¹_J_', '2J': '²_J_', '3J': '³_J_', '4J': '⁴_J_', '5J': '⁵_J_' } as const;
export const turningWords = { free: 'turns freely', ring: 'in a ring', unknown: 'not told' } as const;
export const NONE_OF_THESE = 'none of these';

/** "H2–H3"; an atom that is not told stays visible as "?". */
export const readingName = (reading: Pick<Reading, 'atomA' | 'atomB'>): string => `${reading.atomA.trim() || '?'}–${reading.atomB.trim() || '?'}`;

/** A typed number with its unit; text that brings its own ("9.6 Hz", "ca. 7") is left as typed. */
export const withUnit = (typed: string, unit: string): string => (/[a-zµ°]\s*$/i.test(typed.trim()) ? typed.trim() : `${typed.trim()}\u00A0${unit}`);

/** "C(H,H,H) and H in front, …": the groups as they are held, for a comparison. */
export function calculationWords(calculation: Calculation): string {
  if (calculation.bond === 'single') {
    const groups = calculation.groups ? `front ${calculation.groups.front.join(', ')}; rear ${calculation.groups.rear.join(', ')}` : 'groups not given';
    const relation = calculation.relation && calculation.relation !== 'default' ? `; relation ${calculation.relation}` : '';
    return `single bond, ${turningWords[calculation.turning ?? 'unknown']}; ${groups}${relation}`;
  }
  const groups = calculation.groups ? `${calculation.groups.left.join(', ')} and ${calculation.groups.right.join(', ')}` : 'groups not given';
  const ring = calculation.ringSize ? `, ring of ${calculation.ringSize === 8 ? '8 or more' : calculation.ringSize}` : '';
  return `double bond${ring}; ${groups}`;
}

export const numberText = (value: number): string => `${value < 0 ? '−' : ''}${Math.abs(value)}`;
const degrees = (value: number): string => `${numberText(value)}°`;
export const claimWords = (claim: CandidateClaim): string =>
  claim.kind === 'geometry' ? claim.geometry : `_φ_ ${degrees(claim.fromDeg)} to ${degrees(claim.toDeg)}`;

export function candidateName(content: Pick<CaseContent, 'candidates'>, id: string | null): string {
  if (id === null) return 'left open';
  if (id === 'none') return NONE_OF_THESE;
  return content.candidates.find((each) => each.id === id)?.name || 'a candidate without a name';
}

const rowOf = <T extends { id: string }>(rows: readonly T[], id: string | undefined): T | undefined => rows.find((row) => row.id === id);

/** "_J_, H3–H4eq": the name of a part of a case in a comparison of versions. */
export function partLabel(path: string, mine: CaseContent, theirs: CaseContent): string {
  const [head, id, field] = path.split('.') as [string, string | undefined, string | undefined];
  const find = <T extends { id: string }>(pick: (content: CaseContent) => readonly T[]): T | undefined => rowOf(pick(mine), id) ?? rowOf(pick(theirs), id);
  switch (head) {
    case 'question': return fieldWords.question;
    case 'compound': return fieldWords.compound[id as keyof typeof fieldWords.compound];
    case 'conditions': return fieldWords.conditions[id as keyof typeof fieldWords.conditions];
    case 'answer': return id === undefined ? fieldWords.answer.candidateId : fieldWords.answer[id as keyof typeof fieldWords.answer];
    case 'readings': {
      const row = find((content) => content.readings);
      const name = row ? readingName(row) : 'reading';
      return field === undefined ? `Reading ${name}` : `${fieldWords.readings[field as keyof typeof fieldWords.readings]}, ${name}`;
    }
    case 'calculations': {
      const row = find((content) => content.calculations);
      const reading = row && (rowOf(mine.readings, row.readingId) ?? rowOf(theirs.readings, row.readingId));
      return `Calculation${reading ? ` of ${readingName(reading)}` : ''}`;
    }
    case 'candidates': {
      const name = find((content) => content.candidates)?.name || 'without a name';
      return field === undefined ? `Candidate ${name}` : `${fieldWords.candidates[field as keyof typeof fieldWords.candidates]}, ${name}`;
    }
    default: {
      const row = find((content) => content.evidence);
      const name = row ? evidenceKindWords[row.kind] : '';
      return field === undefined ? `Evidence, ${name}` : `${fieldWords.evidence[field as keyof typeof fieldWords.evidence]}, ${name}`;
    }
  }
}

const HZ_FIELDS = new Set(['j', 'se', 'partner']);

/** The value of a part as a reader sees it; null = empty or not there. `content` gives the names that the value points to. */
export function partValue(path: string, value: unknown, content: CaseContent): string | null {
  if (value === undefined || value === null || value === '') return /candidateId$/.test(path) && value === null ? 'left open' : null;
  const [head, second, third] = path.split('.') as [string, string | undefined, string | undefined];
  const field = third ?? second ?? '';
  if (head === 'readings' && third === undefined) { const row = value as Reading; return `${readingName(row)}${row.j === '' ? '' : `, ${withUnit(row.j, 'Hz')}`}`; }
  if (head === 'calculations') return calculationWords(value as Calculation);
  if (head === 'candidates' && third === undefined) return (value as { name: string }).name || 'without a name';
  if (head === 'evidence' && third === undefined) return (value as { text: string }).text || null;
  if (head === 'answer' && second === undefined) { const answer = value as NonNullable<CaseContent['answer']>; return `${GRADE_WORDS[answer.grade]}: ${candidateName(content, answer.candidateId)}`; }
  if (field === 'claims') return (value as CandidateClaim[]).map(claimWords).join('; ') || null;
  if (field === 'attachmentIds') { const count = (value as string[]).length; return count === 0 ? null : count === 1 ? '1 file' : `${count} files`; }
  if (field === 'candidateId') return candidateName(content, value as string);
  if (field === 'grade') return GRADE_WORDS[value as Grade];
  if (field === 'sign') return signWords[value as SignState];
  if (field === 'path' && head === 'readings') return pathWords[value as keyof typeof pathWords];
  if (head === 'evidence' && field === 'kind') return evidenceKindWords[value as EvidenceKind];
  if (field === 'bearing') return bearingWords[value as keyof typeof bearingWords];
  // what is left of the content's fields is text
  const text = typeof value === 'string' ? value : JSON.stringify(value);
  if (head === 'readings' && HZ_FIELDS.has(field)) return withUnit(text, 'Hz');
  if (field === 'fieldMHz') return withUnit(text, 'MHz');
  if (field === 'temperatureK') return withUnit(text, 'K');
  return text;
}

/** Limits that a form says before the server has to. */
export const tooLong = (text: string, limit: number): string | undefined =>
  text.length > limit ? `${text.length - limit} characters too many: at most ${limit}.` : undefined;
