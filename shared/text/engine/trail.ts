import type { CandidateFinding, CandidateVerdict } from '../../types/trail';
import { NBSP } from '../../format/number';

const names = (list: readonly string[]): string => (list.length < 2 ? (list[0] ?? '') : `${list.slice(0, -1).join(', ')} and ${list[list.length - 1] ?? ''}`);

/** Sentences about a whole case. */
export const trailText = {
  names,
  /** `H2–H3`; a reading without atoms is named by its number */
  readingLabel: (atomA: string, atomB: string, j = '') => (atomA && atomB ? `${atomA}–${atomB}` : atomA || atomB || `Reading ${j.trim()}`.trim()),
  missingReading: () => 'The calculation names a reading that is not in the case: choose another reading.',
  wrongPath: (path: string, nuclei: string) => `This reading is ${path}(${nuclei || 'not told'}): the relations held read ³_J_(H,H) only.`,
  notRead: (typed: string) => `${typed || 'nothing'} as typed`,
  unused: () => 'Used by no calculation.',
  evidence: { title: 'Other evidence', none: 'None entered.', summary: (f: number, a: number, n: number) => `${f} for, ${a} against, ${n} neutral. Listed, not weighed by the engine.` },
  candidates: {
    title: 'Candidates',
    none: 'No candidate entered.',
    status: { fits: 'fits', excluded: 'excluded', open: 'open', 'not-tested': 'not tested' } satisfies Record<CandidateFinding['status'], string>,
    noneOfThese: 'none of these',
    noneValue: 'kept open',
    noneExcluded: 'all candidates excluded',
  },
  verdict: {
    fits: (headline: string) => `Fits: ${headline}.`,
    excluded: (headline: string) => `Excluded: ${headline}.`,
    open: (headline: string) => `Open: ${headline}.`,
    unanswered: (sentence: string) => `Open: ${sentence}`,
    wrongKind: () => 'Open: the claim does not speak about this kind of bond.',
    outside: () => `Excluded: outside every arc allowed at 95${NBSP}%.`,
    inside: () => 'Fits: within an allowed arc.',
    notTested: () => 'No claim on this calculation.',
  } satisfies Record<string, ((s: string) => CandidateVerdict['why']) | (() => CandidateVerdict['why'])>,
  answer: {
    title: 'Computed answer',
    grade: 'grade',
    noCandidates: () => 'No answer without candidates',
    noCandidatesDetail: () => 'Enter at least two, so that the alternative is tested too.',
    oneCandidate: (name: string) => `${name} stands alone: no alternative was tested`,
    oneCandidateDetail: () => 'Enter at least one more candidate.',
    untested: (list: readonly string[]) => `${names(list)} ${list.length === 1 ? 'was' : 'were'} not tested`,
    untestedDetail: () => 'Say what each candidate makes of a calculation; until then no grade is given.',
    decided: (name: string) => `${name} is the only candidate left`,
    decidedDetail: (list: readonly string[], by: readonly string[]) => `${names(list)} ${list.length === 1 ? 'is' : 'are'} excluded by ${names(by)}. None of these stays possible.`,
    conflict: () => 'None of these fits',
    conflictDetail: () => 'Every candidate is excluded: check the readings, the relations’ domains and the list of candidates.',
    several: (list: readonly string[]) => (list.length === 2 ? `Both remain: ${list[0] ?? ''}, and ${list[1] ?? ''}` : `${list.length} candidates remain`),
    severalDetail: (what: string | null) => (what === null ? 'The readings do not part them.' : `What would part them: ${what}.`),
  },
  person: { title: 'Answer', grade: 'grade', candidate: 'candidate', none: 'none of these', open: 'left open', reasons: 'reasons', override: 'differs from the computed answer, because' },
  value: (j: string, se: string) => (se === '' ? j : `${j} ± ${se}`),
  first: {
    doubleQuestion: 'Cis or trans at the double bond?',
    doubleEzQuestion: 'E or Z at the double bond?',
    singleQuestion: 'Which dihedral angle on this bond?',
    cis: (d: string | null) => (d ? `${d} (cis)` : 'cis'),
    trans: (d: string | null) => (d ? `${d} (trans)` : 'trans'),
  },
  fields: {
    question: 'Question', tags: 'Tags', compound: 'Compound', name: 'name', batch: 'batch', notebook: 'notebook page', structureNote: 'structure note', formerNames: 'former names',
    conditions: 'Conditions', fieldMHz: 'field / MHz', solvent: 'solvent', temperatureK: 'temperature / K', concentration: 'concentration',
    readings: 'Readings', reading: 'Reading', atomA: 'first atom', atomB: 'second atom', nuclei: 'nuclei', path: 'path', j: '_J_ / Hz', se: '± / Hz', partner: 'partner / Hz', sign: 'sign',
    where: 'where', method: 'method', note: 'note', calculations: 'Calculations', calculation: 'Calculation', readingId: 'reading', bond: 'bond', groups: 'groups', turning: 'turning',
    relation: 'relation', ringSize: 'ring size', candidates: 'Candidates', candidate: 'Candidate', description: 'description', claims: 'claims', evidence: 'Evidence', kind: 'kind',
    text: 'text', bearing: 'bearing', candidateId: 'candidate', attachmentIds: 'files', answer: 'Answer', grade: 'grade', statement: 'statement', reasons: 'reasons', leftOpen: 'left open',
    overrideReason: 'reason for differing', order: 'order', format: 'format',
  } as Readonly<Record<string, string>>,
} as const;
