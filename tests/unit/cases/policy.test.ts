import { abilities, CASE_ACTS, mayCreateCase, refusal, type CaseAct, type CaseFacts } from '@/server/features/cases/policy';
import { CASE_STATES, type CaseState } from '@/shared/types/case';
import { PROJECT_ROLES, type ProjectRole } from '@/shared/types/roles';

const facts = (more: Partial<CaseFacts>): CaseFacts => ({
  role: 'chemist', isAuthor: false, savedRevision: null, state: 'draft', isHolder: false, heldBy: null, peerReview: false,
  openQueries: [], answeredQueries: [], uncheckedSteps: [], revisionSubmitted: true, successor: null, ...more,
});

/** Letters of the states in which an act is allowed: d draft, r in review, q queried, s signed, u superseded, w withdrawn. */
const LETTER: Record<CaseState, string> = { draft: 'd', 'in-review': 'r', queried: 'q', signed: 's', superseded: 'u', withdrawn: 'w' };
const allowedIn = (act: CaseAct, more: Partial<CaseFacts>): string => CASE_STATES.filter((state) => refusal(act, facts({ ...more, state })) === null).map((state) => LETTER[state]).join('');

type Row = Record<CaseAct, string>;
const none: Row = Object.fromEntries(CASE_ACTS.map((act) => [act, ''])) as Row;

/** The whole table, written out by hand from the rules in the brief; nothing here is computed from the policy. */
const AUTHOR: Record<ProjectRole, Row> = {
  reader: none,
  chemist: { ...none, edit: 'dq', attach: 'dq', comment: 'drqs', submit: 'dq', answerQuery: 'rq', withdraw: 'drqs', supersede: 's', reopen: 'rq', addend: 's' },
  reviewer: { ...none, edit: 'dq', attach: 'dq', comment: 'drqs', submit: 'dq', answerQuery: 'rq', withdraw: 'drqs', supersede: 's', reopen: 'rq', addend: 's' },
  lead: { ...none, edit: 'dq', attach: 'dq', comment: 'drqs', submit: 'dq', answerQuery: 'rq', withdraw: 'drqs', supersede: 's', reopen: 'rq', addend: 's' },
};
const OTHER: Record<ProjectRole, Row> = {
  reader: none,
  chemist: { ...none, edit: 'dq', attach: 'dq', comment: 'drqs', addend: 's' },
  reviewer: { ...none, edit: 'dq', attach: 'dq', comment: 'drqs', claim: 'rq', addend: 's' },
  lead: { ...none, edit: 'dq', attach: 'dq', comment: 'drqs', claim: 'rq', withdraw: 'drqs', supersede: 's', reopen: 'rq', addend: 's' },
};
const HOLDER: Record<ProjectRole, Row> = {
  reader: { ...none, release: 'rq' },
  chemist: { ...OTHER.chemist, edit: 'd', attach: 'd', release: 'rq' },
  reviewer: { ...OTHER.reviewer, edit: 'd', attach: 'd', release: 'rq', check: 'rq', query: 'rq', answerQuery: 'rq', sign: 'r' },
  lead: { ...OTHER.lead, edit: 'd', attach: 'd', release: 'rq', check: 'rq', query: 'rq', answerQuery: 'rq', sign: 'r' },
};

const answered = { answeredQueries: [1] };
describe.each(PROJECT_ROLES)('a %s', (role) => {
  it.each(CASE_ACTS)('as the author may %s only in the states of the table', (act) => {
    expect(allowedIn(act, { role, isAuthor: true, ...(act === 'answerQuery' ? answered : {}) })).toBe(AUTHOR[role][act]);
  });
  it.each(CASE_ACTS)('as somebody else may %s only in the states of the table', (act) => {
    expect(allowedIn(act, { role, ...(act === 'answerQuery' ? answered : {}) })).toBe(OTHER[role][act]);
  });
  it.each(CASE_ACTS)('as the holder may %s only in the states of the table', (act) => {
    expect(allowedIn(act, { role, isHolder: true, ...(act === 'answerQuery' ? answered : {}) })).toBe(HOLDER[role][act]);
  });
  it('reviews nothing that they wrote, even as the holder', () => {
    for (const more of [{ isAuthor: true }, { savedRevision: 2 }]) {
      for (const act of ['claim', 'check', 'query', 'sign'] as const) expect(allowedIn(act, { role, isHolder: true, peerReview: true, ...more })).toBe('');
    }
  });
  it('does nothing in a project they are not in', () => {
    for (const act of CASE_ACTS) expect(allowedIn(act, { role: null, isAuthor: true, isHolder: true })).toBe('');
  });
  it('opens a case from chemist up', () => {
    expect(mayCreateCase(role)).toBe(role !== 'reader');
  });
});

describe('what else an act hangs on', () => {
  it('keeps whoever holds the review from changing what is reviewed', () => {
    for (const act of ['edit', 'attach'] as const) {
      expect(refusal(act, facts({ role: 'lead', state: 'queried', isHolder: true }))?.kind).toBe('not-allowed');
      expect(refusal(act, facts({ role: 'lead', state: 'queried' }))).toBeNull();
    }
  });
  const review = { role: 'reviewer', state: 'in-review', isHolder: true } as const;
  it('lets chemists review each other where the project says so', () => {
    expect(allowedIn('claim', { role: 'chemist', peerReview: true })).toBe('rq');
    expect(allowedIn('claim', { role: 'reader', peerReview: true })).toBe('');
  });
  it('signs only when every query is closed, every step checked and the revision was sent', () => {
    expect(refusal('sign', facts(review))).toBeNull();
    expect(refusal('sign', facts({ ...review, openQueries: [2] }))?.sentence).toBe('Sign opens when query 2 is closed.');
    expect(refusal('sign', facts({ ...review, answeredQueries: [1], uncheckedSteps: ['other evidence'] }))?.sentence).toBe('Sign opens when query 1 is closed and other evidence is checked.');
    expect(refusal('sign', facts({ ...review, revisionSubmitted: false }))?.kind).toBe('wrong-state');
  });
  it('names who holds the case', () => {
    const heldBy = { name: 'Rafe Okonjo', until: '1 Dec 2026, 14:40 UTC' };
    for (const act of ['claim', 'check', 'query', 'sign'] as const) {
      expect(refusal(act, facts({ role: 'reviewer', state: 'in-review', heldBy }))).toEqual({ kind: 'held-by-another', sentence: 'Rafe Okonjo holds this case until 1 Dec 2026, 14:40 UTC.' });
    }
    expect(refusal('release', facts({ role: 'reviewer', state: 'in-review', heldBy }))?.kind).toBe('held-by-another');
    expect(refusal('release', facts({ role: 'lead', state: 'in-review', heldBy }))).toBeNull();
    expect(refusal('release', facts({ role: 'lead', isAuthor: true, state: 'in-review', heldBy }))?.kind).toBe('held-by-another');
  });
  it('sends nothing back with an open query, and supersedes a case once', () => {
    expect(refusal('submit', facts({ isAuthor: true, state: 'queried', openQueries: [1, 3] }))?.sentence).toBe('Answer queries 1 and 3 first.');
    expect(refusal('supersede', facts({ isAuthor: true, state: 'signed', successor: 'HAZ-0031' }))?.sentence).toBe('HAZ-0031 is being prepared to supersede this case.');
    expect(refusal('answerQuery', facts({ isAuthor: true, state: 'queried' }))?.sentence).toBe('There is no query to answer.');
  });
  it('gives a sentence for each act that is refused, and none for the others', () => {
    for (const role of PROJECT_ROLES) for (const state of CASE_STATES) {
      const may = abilities(facts({ role, state }));
      for (const act of CASE_ACTS) {
        expect(act in may.why).toBe(!may[act]);
        if (!may[act]) expect(may.why[act]).toMatch(/^[A-Z].*\.$/);
      }
    }
  });
});
