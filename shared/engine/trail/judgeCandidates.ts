import { GRADES, type Grade, type QuickLookAnswer, type QuickLookResult } from '../../types/answer';
import type { Candidate, CandidateClaim, CaseContent } from '../../types/case';
import type { CandidateFinding, CandidateVerdict, ComputedAnswer } from '../../types/trail';
import { trailText as say } from '../../text/engine/trail';

export type Results = ReadonlyMap<string, QuickLookResult>;

/** Two stretches of φ share an angle, wherever on the circle they are written. */
export function stretchesMeet(a: { fromDeg: number; toDeg: number }, b: { fromDeg: number; toDeg: number }): boolean {
  return [-720, -360, 0, 360, 720].some((turn) => a.fromDeg <= b.toDeg + turn + 1e-9 && b.fromDeg + turn <= a.toDeg + 1e-9);
}

function judgeClaim(claim: CandidateClaim, answer: QuickLookAnswer): Omit<CandidateVerdict, 'calculationId'> {
  if (answer.grade === 'not-decided') return { verdict: 'open', why: say.verdict.open(answer.headline) };
  if (claim.kind === 'geometry') {
    const found = answer.double?.geometry ?? null;
    // a =CH₂ coupling names a place of one H, not a geometry of the bond
    if (!answer.double || !found || answer.double.setting === 'terminal') return { verdict: 'open', why: say.verdict.wrongKind() };
    return found === claim.geometry ? { verdict: 'fits', why: say.verdict.fits(answer.headline) } : { verdict: 'excluded', why: say.verdict.excluded(answer.headline) };
  }
  if (!answer.single) return { verdict: 'open', why: say.verdict.wrongKind() };
  const wanted = { fromDeg: claim.fromDeg, toDeg: claim.toDeg < claim.fromDeg ? claim.toDeg + 360 : claim.toDeg };
  const meets = answer.single.arcs.some((arc) => stretchesMeet(arc, wanted));
  return meets ? { verdict: 'fits', why: say.verdict.inside() } : { verdict: 'excluded', why: say.verdict.outside() };
}

/** What the calculations say of one candidate. */
export function judgeCandidate(candidate: Candidate, content: CaseContent, results: Results): CandidateFinding {
  const verdicts = content.calculations.flatMap((calculation): CandidateVerdict[] => {
    const result = results.get(calculation.id);
    const claims = candidate.claims.filter((c) => c.calculationId === calculation.id);
    if (!result) return [];
    if (claims.length === 0) return [{ calculationId: calculation.id, verdict: 'not-tested', why: say.verdict.notTested() }];
    if (result.state !== 'answered') {
      const sentence = result.state === 'refused' ? (result.problems[0]?.sentence ?? '') : result.question;
      return [{ calculationId: calculation.id, verdict: 'open', why: say.verdict.unanswered(sentence) }];
    }
    // several claims on one calculation are alternatives within the candidate: the best of them counts
    const found = claims.map((claim) => judgeClaim(claim, result));
    const best = found.find((f) => f.verdict === 'fits') ?? found.find((f) => f.verdict === 'open') ?? found[0];
    return best ? [{ calculationId: calculation.id, ...best }] : [];
  });
  const has = (v: CandidateVerdict['verdict']): boolean => verdicts.some((x) => x.verdict === v);
  const status = has('excluded') ? 'excluded' : has('fits') ? 'fits' : has('open') ? 'open' : 'not-tested';
  return { candidateId: candidate.id, status, verdicts };
}

const strength = (g: Grade): number => GRADES.length - GRADES.indexOf(g);
const weakest = (list: readonly Grade[]): Grade => list.reduce<Grade>((a, b) => (strength(b) < strength(a) ? b : a), 'assigned');
const strongest = (list: readonly Grade[]): Grade => list.reduce<Grade>((a, b) => (strength(b) > strength(a) ? b : a), 'not-decided');

/**
 * The engine's answer to the case. Decided only when at least two candidates were all tested and one is left; then its
 * grade is the weakest link: for each excluded candidate the best grade that excludes it, and of those the least.
 */
export function computeAnswer(content: CaseContent, findings: readonly CandidateFinding[], results: Results, calculationName: (id: string) => string): ComputedAnswer {
  const name = (f: CandidateFinding): string => content.candidates.find((c) => c.id === f.candidateId)?.name || f.candidateId;
  const open = (headline: string, detail: string): ComputedAnswer => ({ grade: 'not-decided', candidateId: null, headline, detail });
  const [only] = findings;
  if (!only) return open(say.answer.noCandidates(), say.answer.noCandidatesDetail());
  if (findings.length === 1) return open(say.answer.oneCandidate(name(only)), say.answer.oneCandidateDetail());
  const untested = findings.filter((f) => f.status === 'not-tested');
  if (untested.length > 0) return open(say.answer.untested(untested.map(name)), say.answer.untestedDetail());
  const left = findings.filter((f) => f.status !== 'excluded');
  const [winner] = left;
  if (!winner) return open(say.answer.conflict(), say.answer.conflictDetail());
  if (left.length > 1) {
    const next = [...results.values()].flatMap((r) => (r.state === 'answered' && r.grade !== 'assigned' ? r.measureNext : []))[0];
    return open(say.answer.several(left.map(name)), say.answer.severalDetail(next?.title ?? null));
  }
  const excluded = findings.filter((f) => f.status === 'excluded');
  const deciders = new Set<string>();
  const grades = excluded.map((f) => {
    const by = f.verdicts.filter((v) => v.verdict === 'excluded').map((v) => ({ id: v.calculationId, result: results.get(v.calculationId) }));
    for (const { id } of by) deciders.add(id);
    return strongest(by.map(({ result }) => (result?.state === 'answered' ? result.grade : 'not-decided')));
  });
  // a candidate that is merely left over, supported by no calculation of its own, is tentative at most
  const grade = weakest([...grades, winner.status === 'fits' ? 'assigned' : 'tentative']);
  const by = [...deciders].map(calculationName);
  return { grade, candidateId: winner.candidateId, headline: say.answer.decided(name(winner)), detail: say.answer.decidedDetail(excluded.map(name), by) };
}
