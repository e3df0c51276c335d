import { plainText } from '@/shared/format/richText';
import type { FieldError } from '@/shared/contracts/problem';
import { casesText } from '@/shared/text/cases';
import type { CaseContent } from '@/shared/types/case';
import type { CaseTrail } from '@/shared/types/trail';
import { readingLabel } from './listing';

const words = casesText.gap;

/** Does the person's answer say something else than the calculated one? */
export function differs(content: CaseContent, trail: CaseTrail): boolean {
  const { answer } = content;
  return answer !== null && (answer.grade !== trail.answer.grade || answer.candidateId !== trail.answer.candidateId);
}

function readingGaps(content: CaseContent, trail: CaseTrail): FieldError[] {
  const gaps: FieldError[] = [];
  trail.calculations.forEach((calculation, index) => {
    const at = content.readings.findIndex((reading) => reading.id === calculation.readingId);
    const reading = content.readings[at];
    if (!reading) return;
    const label = readingLabel(reading, at);
    const { result } = calculation;
    if (result.state === 'refused') {
      for (const problem of result.problems) {
        const own = problem.field === 'j' || problem.field === 'se' || problem.field === 'partner';
        const pointer = own ? `#/content/readings/${at}/${problem.field}` : problem.field === 'fieldMHz' ? '#/content/conditions/fieldMHz' : `#/content/calculations/${index}/${problem.field.split('.')[0]!}`;
        gaps.push({ pointer, detail: words.unread(label, problem.sentence), code: problem.code, mends: problem.mends });
      }
    } else if (result.state === 'question') {
      gaps.push({ pointer: `#/content/calculations/${index}/${result.field.split('.')[0]!}`, detail: words.missingFact(label, result.question) });
    }
  });
  // a reading that no calculation reads may be of any nuclei and size; it must only hold a number
  const calculated = new Set(content.calculations.map(({ readingId }) => readingId));
  content.readings.forEach((reading, at) => {
    if (!calculated.has(reading.id) && reading.j.trim() !== '' && !/\d/.test(reading.j)) {
      gaps.push({ pointer: `#/content/readings/${at}/j`, detail: words.unread(readingLabel(reading, at), words.noNumber) });
    }
  });
  return gaps;
}

function answerGaps(content: CaseContent, trail: CaseTrail): FieldError[] {
  const { answer, candidates } = content;
  if (answer === null) return [{ pointer: '#/content/answer', detail: words.noAnswer }];
  const gaps: FieldError[] = [];
  if (answer.reasons.trim() === '') gaps.push({ pointer: '#/content/answer/reasons', detail: words.noReasons });
  if (answer.grade !== 'not-decided' && answer.candidateId === null) gaps.push({ pointer: '#/content/answer/candidateId', detail: words.noCandidate });
  if (answer.candidateId !== null && answer.candidateId !== 'none' && !candidates.some(({ id }) => id === answer.candidateId)) {
    gaps.push({ pointer: '#/content/answer/candidateId', detail: words.unknownCandidate });
  }
  if (candidates.length < 2 && answer.grade !== 'not-decided') gaps.push({ pointer: '#/content/candidates', detail: words.candidates });
  if (differs(content, trail) && answer.overrideReason.trim() === '') {
    gaps.push({ pointer: '#/content/answer/overrideReason', detail: words.override(plainText(trail.answer.headline)) });
  }
  return gaps;
}

/** What a case still lacks before a colleague can review it: one sentence a gap, each at its field. [] = ready to send. */
export function gapsBeforeReview(content: CaseContent, trail: CaseTrail): FieldError[] {
  const gaps: FieldError[] = [];
  const spoken = trail.calculations.some(({ result }) => result.state === 'answered');
  if (!content.readings.some((reading) => reading.j.trim() !== '')) gaps.push({ pointer: '#/content/readings', detail: words.noReading });
  else if (content.calculations.length === 0 || (!spoken && trail.calculations.length === 0)) gaps.push({ pointer: '#/content/calculations', detail: words.noCalculation });
  gaps.push(...readingGaps(content, trail));
  content.candidates.forEach((candidate, index) => {
    if (candidate.name.trim() === '') gaps.push({ pointer: `#/content/candidates/${index}/name`, detail: words.candidateName });
  });
  gaps.push(...answerGaps(content, trail));
  return gaps;
}
