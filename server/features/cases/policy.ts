import { casesText } from '@/shared/text/cases';
import type { CaseState } from '@/shared/types/case';
import type { ProjectRole } from '@/shared/types/roles';

/**
 * Who may do what with a case. Pure: plain facts in, a sentence or null out, so that every cell of the
 * role × state × act table is one unit test. The independence rule (nobody reviews what they wrote) stands above
 * every role and cannot be switched off.
 */
export const CASE_ACTS = [
  'edit', 'submit', 'comment', 'attach', 'claim', 'release', 'check', 'query', 'answerQuery',
  'sign', 'withdraw', 'supersede', 'reopen', 'addend',
] as const;
export type CaseAct = (typeof CASE_ACTS)[number];

export interface CaseFacts {
  /** role in the case's project; null = not a member (such a person never sees the case at all) */
  role: ProjectRole | null;
  isAuthor: boolean;
  /** the first revision this person saved of the case; the author counts by `isAuthor` */
  savedRevision: number | null;
  state: CaseState;
  /** this person holds a claim that has not run out */
  isHolder: boolean;
  /** somebody else holds a claim that has not run out */
  heldBy: { name: string; until: string } | null;
  /** the project lets chemists review each other's cases */
  peerReview: boolean;
  /** numbers of queries by state */
  openQueries: number[];
  answeredQueries: number[];
  /** names of review steps not yet checked on the present revision */
  uncheckedSteps: string[];
  /** false when a change has not been sent to review yet */
  revisionSubmitted: boolean;
  /** code of the case that is being prepared to supersede this one */
  successor: string | null;
}

/** Why an act is refused: who asks, or where the case stands, or who holds it. */
export interface Refusal {
  kind: 'not-allowed' | 'wrong-state' | 'held-by-another';
  sentence: string;
}

const RANK: Record<ProjectRole, number> = { reader: 1, chemist: 2, reviewer: 3, lead: 4 };
const atLeast = (role: ProjectRole, floor: ProjectRole) => RANK[role] >= RANK[floor];
const words = casesText.refused;
const person = (sentence: string): Refusal => ({ kind: 'not-allowed', sentence });
const standing = (sentence: string): Refusal => ({ kind: 'wrong-state', sentence });
const held = (sentence: string): Refusal => ({ kind: 'held-by-another', sentence });
const inReview = (state: CaseState) => state === 'in-review' || state === 'queried';

/** May this person hold reviews of this case at all, whatever its state? */
function independent(facts: CaseFacts, role: ProjectRole): Refusal | null {
  if (facts.isAuthor) return person(words.ownCase);
  if (facts.savedRevision !== null) return person(words.savedRevision(facts.savedRevision));
  if (!atLeast(role, facts.peerReview ? 'chemist' : 'reviewer')) return person(words.notReviewer);
  return null;
}

function holder(facts: CaseFacts, role: ProjectRole): Refusal | null {
  const dependent = independent(facts, role);
  if (dependent) return dependent;
  if (!inReview(facts.state)) return standing(words.notInReview(facts.state));
  if (facts.heldBy) return held(words.heldBy(facts.heldBy.name, facts.heldBy.until));
  return facts.isHolder ? null : standing(words.takeFirst);
}

/** May the content be changed? Whoever holds the review would lose it by a save, so the holder asks instead. */
function open(facts: CaseFacts): Refusal | null {
  if (facts.state !== 'draft' && facts.state !== 'queried') return standing(words.readOnly(facts.state));
  return facts.state === 'queried' && facts.isHolder ? person(words.holderAsks) : null;
}

const RULES: Record<CaseAct, (facts: CaseFacts, role: ProjectRole) => Refusal | null> = {
  edit: open,
  attach: open,
  comment: (facts) => (facts.state === 'superseded' || facts.state === 'withdrawn' ? standing(words.closed(facts.state)) : null),
  submit: (facts) => {
    if (!facts.isAuthor) return person(words.authorSubmits);
    if (facts.state !== 'draft' && facts.state !== 'queried') return standing(words.alreadySent(facts.state));
    return facts.openQueries.length > 0 ? standing(words.answerFirst(facts.openQueries)) : null;
  },
  claim: (facts, role) => {
    const dependent = independent(facts, role);
    if (dependent) return dependent;
    if (!inReview(facts.state)) return standing(words.notInReview(facts.state));
    if (facts.heldBy) return held(words.heldBy(facts.heldBy.name, facts.heldBy.until));
    return null;
  },
  release: (facts, role) => {
    if (!inReview(facts.state)) return standing(words.notInReview(facts.state));
    if (facts.isHolder) return null;
    if (!facts.heldBy) return standing(words.nobodyHolds);
    return role === 'lead' && !facts.isAuthor ? null : held(words.heldBy(facts.heldBy.name, facts.heldBy.until));
  },
  check: holder,
  query: holder,
  answerQuery: (facts, role) => {
    if (!inReview(facts.state)) return standing(words.notInReview(facts.state));
    if (facts.openQueries.length + facts.answeredQueries.length === 0) return standing(words.noQuery);
    if (facts.isAuthor) return null;
    return holder(facts, role) ? person(words.authorAnswers) : null;
  },
  sign: (facts, role) => {
    const refused = holder(facts, role);
    if (refused) return refused;
    const unclosed = [...facts.openQueries, ...facts.answeredQueries].sort((a, b) => a - b);
    if (unclosed.length > 0 || facts.uncheckedSteps.length > 0) return standing(words.signOpens(unclosed, facts.uncheckedSteps));
    if (!facts.revisionSubmitted || facts.state !== 'in-review') return standing(words.changedUnsent);
    return null;
  },
  withdraw: (facts, role) => {
    if (facts.state === 'superseded' || facts.state === 'withdrawn') return standing(words.closed(facts.state));
    if (role === 'lead') return null;
    return facts.isAuthor ? null : person(words.authorOrLead);
  },
  supersede: (facts, role) => {
    if (facts.state !== 'signed') return standing(words.onlySigned);
    if (role !== 'lead' && !facts.isAuthor) return person(words.authorOrLead);
    return facts.successor ? standing(words.successor(facts.successor)) : null;
  },
  reopen: (facts, role) => {
    if (!inReview(facts.state)) return standing(words.notInReview(facts.state));
    if (role === 'lead') return null;
    return facts.isAuthor ? null : person(words.authorOrLead);
  },
  addend: (facts) => (facts.state === 'signed' ? null : standing(words.onlySigned)),
};

/** @returns null when the act is allowed now, else one sentence that says why it is not and what would open it, with its kind */
export function refusal(act: CaseAct, facts: CaseFacts): Refusal | null {
  if (facts.role === null) return person(words.notMember);
  // whoever became a reader while holding a case may still give it back
  if (facts.role === 'reader' && !(act === 'release' && facts.isHolder)) return person(words.readerOnly);
  return RULES[act](facts, facts.role);
}

/** Every act at once, for the `may` of an answer: screens never guess. */
export function abilities(facts: CaseFacts): Record<CaseAct, boolean> & { why: Record<string, string> } {
  const why: Record<string, string> = {};
  const may = {} as Record<CaseAct, boolean>;
  for (const act of CASE_ACTS) {
    const refused = refusal(act, facts);
    may[act] = refused === null;
    if (refused) why[act] = refused.sentence;
  }
  return { ...may, why };
}

/** Who may write a case into a project. */
export const mayCreateCase = (role: ProjectRole | null): boolean => role !== null && atLeast(role, 'chemist');
