import { QueryTypes, type Sequelize } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import type { CaseDeps } from '@/server/features/cases/deps';
import type { ReviewRow, ReviewsResponse } from '@/shared/contracts/reviews';
import type { ProjectRole } from '@/shared/types/roles';
import { REVIEW_STEPS } from '@/shared/types/trail';

const REVIEWS: ReadonlySet<ProjectRole> = new Set(['reviewer', 'lead']);

/** A worklist is read by people: beyond this it is the log, with its filters, that helps. */
const MOST = 200;

interface Raw {
  id: string; code: string; project_id: string; project_name: string; question: string; answer_grade: ReviewRow['answer']['grade']; answer_text: string;
  state: ReviewRow['state']; author_id: string; author_name: string; reviewer_id: string | null; reviewer_name: string | null; held_until: Date | null;
  due_on: string | null; submitted_at: Date | null; changed_at: Date; open_queries: number | string; answered_queries: number | string; checks: number | string;
  untested: number; revision: number; submitted_revision: number | null; peer_review: number; saved: number;
}

/** Cases in review in these projects, oldest first, with what a row of the worklist tells. */
function casesInReview(db: Sequelize, who: Actor): Promise<Raw[]> {
  return db.query<Raw>(
    `SELECT c.id, c.code, c.project_id, p.name AS project_name, c.question, c.answer_grade, c.answer_text, c.state, c.author_id, a.name AS author_name,
            c.reviewer_id, r.name AS reviewer_name, c.held_until, DATE_FORMAT(c.due_on, '%Y-%m-%d') AS due_on, c.submitted_at, c.changed_at, c.untested, c.revision,
            c.submitted_revision, p.peer_review,
            (SELECT COUNT(*) FROM review_queries q WHERE q.case_id = c.id AND q.state = 'open') AS open_queries,
            (SELECT COUNT(*) FROM review_queries q WHERE q.case_id = c.id AND q.state = 'answered') AS answered_queries,
            (SELECT COUNT(*) FROM review_checks k WHERE k.case_id = c.id AND k.revision = c.revision) AS checks,
            EXISTS (SELECT 1 FROM case_revisions v WHERE v.case_id = c.id AND v.saved_by_id = :who) AS saved
       FROM cases c JOIN projects p ON p.id = c.project_id JOIN users a ON a.id = c.author_id LEFT JOIN users r ON r.id = c.reviewer_id
      WHERE c.project_id IN (:projects) AND c.state IN ('in-review', 'queried')
      ORDER BY c.submitted_at, c.id LIMIT 2000`,
    { replacements: { who: who.id, projects: [...who.projectIds] }, type: QueryTypes.SELECT });
}

function present(raw: Raw, now: Date): ReviewRow {
  const held = raw.reviewer_id !== null && raw.held_until !== null && raw.held_until > now;
  const [open, answered, checked] = [Number(raw.open_queries), Number(raw.answered_queries), Number(raw.checks)];
  return {
    caseId: raw.id, code: raw.code, projectName: raw.project_name, question: raw.question, answer: { grade: raw.answer_grade, text: raw.answer_text }, state: raw.state,
    author: { id: raw.author_id, name: raw.author_name }, reviewer: held && raw.reviewer_id ? { id: raw.reviewer_id, name: raw.reviewer_name ?? '' } : null,
    heldUntil: held && raw.held_until ? raw.held_until.toISOString() : null, dueOn: raw.due_on, waitingSince: (raw.submitted_at ?? raw.changed_at).toISOString(),
    openQueries: open, answeredQueries: answered, checked, checksTotal: REVIEW_STEPS.length,
    readyToSign: raw.state === 'in-review' && open + answered === 0 && checked === REVIEW_STEPS.length && raw.submitted_revision === raw.revision, untested: raw.untested,
  };
}

const mayReview = (who: Actor, raw: Raw): boolean => {
  const role = who.roleIn(raw.project_id);
  return role !== null && raw.author_id !== who.id && Number(raw.saved) === 0 && (REVIEWS.has(role) || (raw.peer_review === 1 && role === 'chemist'));
};

/** The worklist: what this person holds, could take, and what others hold; their own cases apart, since an author does not sign them. */
export const reviewReads = (deps: Pick<CaseDeps, 'db' | 'now'>) => async (who: Actor): Promise<ReviewsResponse> => {
  const answer: ReviewsResponse = { heldByYou: [], waiting: [], heldByOthers: [], yourCases: [] };
  if (who.projectIds.length === 0) return answer;
  const now = deps.now();
  for (const raw of await casesInReview(deps.db, who)) {
    const row = present(raw, now);
    if (row.author.id === who.id) answer.yourCases.push(row);
    else if (row.reviewer?.id === who.id) answer.heldByYou.push(row);
    else if (mayReview(who, raw)) (row.reviewer ? answer.heldByOthers : answer.waiting).push(row);
  }
  answer.waiting.splice(MOST);
  answer.heldByOthers.splice(MOST);
  return answer;
};

/**
 * How many cases wait for this person: the ones they hold and, when their role lets them review, the free ones. The badge on
 * Reviews. Cases that wait for their author's answer count only for whoever holds them.
 */
export async function countWaiting(db: Sequelize, who: Actor, now: Date): Promise<number> {
  const reviewing = who.projects.filter(({ role }) => REVIEWS.has(role)).map(({ id }) => id);
  const peers = who.projects.filter(({ role }) => role === 'chemist').map(({ id }) => id);
  if (reviewing.length + peers.length === 0) return 0;
  const none = ['00000000-0000-0000-0000-000000000000'];
  const [row] = await db.query<{ n: number | string }>(
    `SELECT COUNT(*) AS n FROM cases c JOIN projects p ON p.id = c.project_id
      WHERE c.project_id IN (:projects) AND c.state IN ('in-review', 'queried') AND c.author_id <> :who
        AND (c.project_id IN (:reviewing) OR p.peer_review = 1)
        AND ((c.reviewer_id = :who AND c.held_until > :now) OR ((c.reviewer_id IS NULL OR c.held_until IS NULL OR c.held_until <= :now) AND c.state = 'in-review'))
        AND NOT EXISTS (SELECT 1 FROM case_revisions v WHERE v.case_id = c.id AND v.saved_by_id = :who)`,
    {
      replacements: { who: who.id, now, projects: [...reviewing, ...peers], reviewing: reviewing.length > 0 ? reviewing : none }, type: QueryTypes.SELECT,
    });
  return Number(row?.n ?? 0);
}
