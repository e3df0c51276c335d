import type { CautionId, NextMeasurement, QuickLookResult, RelationRef } from '../../types/answer';
import type { CaseContent, Reading } from '../../types/case';
import type { Registry } from '../../types/relation';
import type { CaseTrail, TrailStep } from '../../types/trail';
import { hzAsTyped } from '../../format/number';
import { GRADE_WORDS } from '../../format/words';
import { trailText as say } from '../../text/engine/trail';
import { readHz } from '../input/readHz';
import { cautions } from '../quick/refs';
import { ENGINE_VERSION } from '../version';
import { calculate } from './calculate';
import { computeAnswer, judgeCandidate } from './judgeCandidates';

const label = (r: Reading): string => say.readingLabel(r.atomA, r.atomB, r.j);

/** Cautions that a reading raises by what is typed beside its numbers. */
function readingCautions(r: Reading): (CautionId | false)[] {
  return [
    [r.atomA, r.atomB].some((a) => /(?:^|[^A-Za-z])(?:OH|NH\d?|SH)/.test(a)) && 'exchange-partner',
    r.path !== '3J' && r.sign === 'not-measured' && 'sign-not-measured',
    /second[- ]order|strongly coupled|AA.?BB|AA.?XX/i.test(`${r.note} ${r.method}`) && 'second-order',
  ];
}

function readingStep(r: Reading, used: QuickLookResult | undefined): TrailStep {
  const flags = cautions(readingCautions(r));
  const made = used?.state === 'answered' ? used.steps.find((s) => s.key === 'reading') : undefined;
  if (made) {
    const extra = flags.filter((f) => !made.flags.some((m) => m.id === f.id));
    return { ...made, key: `reading:${r.id}`, title: label(r), flags: [...made.flags, ...extra] };
  }
  const read = readHz(r.j, 'j', null);
  return {
    key: `reading:${r.id}`, ink: 'measured', reviewStep: 'reciprocity', title: label(r),
    summary: 'problem' in read ? say.notRead(r.j) : hzAsTyped(read.reading),
    inputs: [{ label: say.fields.j ?? '', value: say.value(r.j, r.se) }, ...(r.partner ? [{ label: say.fields.partner ?? '', value: r.partner }] : []), ...(used ? [] : [{ label: label(r), value: say.unused() }])],
    flags,
  };
}

/** The calculated steps of one calculation, keyed to it. */
function calculationSteps(id: string, name: string, result: QuickLookResult): TrailStep[] {
  if (result.state === 'answered') {
    return result.steps.filter((s) => s.key !== 'reading').map((s) => ({ ...s, key: `${s.key}:${id}`, title: `${s.title}, ${name}` }));
  }
  const summary = result.state === 'question' ? result.question : result.problems.map((p) => p.sentence).join(' ');
  return [{ key: `relation:${id}`, ink: 'calculated', reviewStep: 'domain', title: name, summary, inputs: [], flags: [] }];
}

const asksAbsolute = (content: CaseContent): boolean =>
  /\babsolute\b|\(\d*[RS]\)|\b[RS] or [RS]\b/.test([content.question, ...content.candidates.map((c) => c.name)].join(' '));

const unique = <T>(list: readonly T[], key: (item: T) => string): T[] => [...new Map(list.map((item) => [key(item), item])).values()];

/**
 * Everything the engine makes of a case: one quick look a calculation, what they say of each candidate, the computed
 * answer, and the steps a reviewer reads. Evidence is listed and not weighed. Pure: the same content and relations give
 * the same digits, whatever the order of entries.
 */
export function caseTrail(content: CaseContent, registry: Registry): CaseTrail {
  const results = new Map(content.calculations.map((c) => [c.id, calculate(c, content, registry)]));
  const nameOf = (calculationId: string): string => {
    const calculation = content.calculations.find((c) => c.id === calculationId);
    const reading = content.readings.find((r) => r.id === calculation?.readingId);
    return reading ? label(reading) : calculationId;
  };
  const candidates = content.candidates.map((c) => judgeCandidate(c, content, results));
  const answer = computeAnswer(content, candidates, results, nameOf);
  const answered = [...results.values()].flatMap((r) => (r.state === 'answered' ? [r] : []));
  const notTested = content.candidates.filter((_, i) => candidates[i]?.status === 'not-tested').map((c) => c.name || c.id);
  const flags = cautions([
    candidates.length < 2 && 'one-candidate',
    notTested.length > 0 && 'untested-candidate',
    candidates.length > 0 && candidates.every((c) => c.status === 'excluded') && 'candidates-conflict',
    asksAbsolute(content) && 'relative-only',
    ...answered.flatMap((a) => a.cautions.map((c) => c.id)),
    ...content.readings.flatMap(readingCautions),
  ]);
  // open calculations first: their next measurement is the one that could turn the answer
  const next: NextMeasurement[] = unique([...answered].sort((a, b) => Number(a.grade !== 'not-decided') - Number(b.grade !== 'not-decided')).flatMap((a) => a.measureNext), (n) => n.id);
  const relations: RelationRef[] = unique(answered.flatMap((a) => (a.relation ? [a.relation] : [])), (r) => `${r.id}@${r.version} ${r.name} ${r.spreadHz}`);
  const firstUse = (r: Reading): QuickLookResult | undefined => {
    const calculation = content.calculations.find((c) => c.readingId === r.id);
    return calculation ? results.get(calculation.id) : undefined;
  };
  const steps: TrailStep[] = [
    ...content.readings.map((r) => readingStep(r, firstUse(r))),
    ...content.calculations.flatMap((c) => calculationSteps(c.id, nameOf(c.id), results.get(c.id) ?? calculate(c, content, registry))),
    evidenceStep(content),
    candidatesStep(content, candidates, flags),
    { key: 'answer', ink: 'calculated', reviewStep: null, title: say.answer.title, summary: answer.headline, inputs: [{ label: say.answer.grade, value: GRADE_WORDS[answer.grade] }], flags: flags.filter((f) => f.id === 'relative-only') },
    ...personStep(content),
  ];
  return {
    format: 1, engineVersion: ENGINE_VERSION, relations,
    calculations: content.calculations.map((c) => ({ calculationId: c.id, readingId: c.readingId, result: results.get(c.id) ?? calculate(c, content, registry) })),
    candidates, notTested, answer, cautions: flags, measureNext: answer.grade === 'assigned' ? next.slice(0, 2) : next.slice(0, 6), steps,
  };
}

function evidenceStep({ evidence }: CaseContent): TrailStep {
  const count = (bearing: 'for' | 'against' | 'neutral'): number => evidence.filter((e) => e.bearing === bearing).length;
  return {
    key: 'evidence', ink: 'judged', reviewStep: 'other-evidence', title: say.evidence.title,
    summary: evidence.length === 0 ? say.evidence.none : say.evidence.summary(count('for'), count('against'), count('neutral')),
    inputs: evidence.map((e) => ({ label: `${e.kind}, ${e.bearing}`, value: e.text, ref: `evidence:${e.id}` })), flags: [],
  };
}

function candidatesStep(content: CaseContent, findings: CaseTrail['candidates'], flags: CaseTrail['cautions']): TrailStep {
  const status = (id: string): string => say.candidates.status[findings.find((f) => f.candidateId === id)?.status ?? 'not-tested'];
  const conflict = flags.some((f) => f.id === 'candidates-conflict');
  return {
    key: 'candidates', ink: 'calculated', reviewStep: 'alternatives', title: say.candidates.title,
    summary: content.candidates.length === 0 ? say.candidates.none : content.candidates.map((c) => `${c.name || c.id}: ${status(c.id)}`).join('; '),
    inputs: [
      ...content.candidates.map((c) => ({ label: c.name || c.id, value: status(c.id), ref: `candidate:${c.id}` })),
      { label: say.candidates.noneOfThese, value: conflict ? say.candidates.noneExcluded : say.candidates.noneValue },
    ],
    flags: flags.filter((f) => ['one-candidate', 'untested-candidate', 'candidates-conflict'].includes(f.id)),
  };
}

function personStep(content: CaseContent): TrailStep[] {
  const { answer } = content;
  if (!answer) return [];
  const candidate = answer.candidateId === 'none' ? say.person.none : (content.candidates.find((c) => c.id === answer.candidateId)?.name ?? '');
  const given = [
    [say.person.grade, GRADE_WORDS[answer.grade]], [say.person.candidate, candidate], [say.person.reasons, answer.reasons],
    [say.person.open, answer.leftOpen], [say.person.override, answer.overrideReason],
  ] as const;
  return [{
    key: 'judged', ink: 'judged', reviewStep: null, title: say.person.title, summary: answer.statement || GRADE_WORDS[answer.grade],
    inputs: given.filter(([, value]) => value !== '').map(([l, value]) => ({ label: l, value })), flags: [],
  }];
}
