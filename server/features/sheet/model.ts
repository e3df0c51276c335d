import type { SheetAnswer, SheetModel } from '@/server/pdf/model';
import { differs } from '@/server/features/cases/gaps';
import { GRADE_WORDS, STATE_WORDS } from '@/shared/format/words';
import { sheetText as words } from '@/shared/text/sheet';
import { calculatedPart } from './calculated';
import { groupedHash, isSigned, reviewSignatures, sentences, time, type SheetInput } from './input';
import { judgedPart } from './judged';
import { literal } from '@/server/pdf/textLayout';
import { conditionsText, measuredPart } from './measured';

/** The person's answer first; the calculated one beside it when they differ, or alone while nobody has judged. */
function answersOf({ content, trail }: SheetInput): SheetAnswer[] {
  const { answer } = content;
  const computed: SheetAnswer = {
    ink: 'calculated', label: answer ? words.calculatedAnswer : words.calculatedOnly, grade: trail.answer.grade, gradeWord: GRADE_WORDS[trail.answer.grade],
    sentence: trail.answer.headline, detail: trail.answer.detail,
  };
  if (!answer) return [computed];
  const named = answer.candidateId === 'none' ? words.noneOfThese : content.candidates.find(({ id }) => id === answer.candidateId)?.name.trim() ?? '';
  const judged: SheetAnswer = {
    ink: 'judged', label: words.answer, grade: answer.grade, gradeWord: GRADE_WORDS[answer.grade],
    sentence: literal(answer.statement.trim() || named) || trail.answer.headline,
    detail: sentences(answer.statement.trim() !== '' && named !== '' && !answer.statement.includes(named) ? `${words.candidate}: ${literal(named)}.` : '', answer.leftOpen.trim() === '' ? '' : words.leftOpen(literal(answer.leftOpen))),
  };
  if (!differs(content, trail)) return [judged];
  return [{ ...judged, detail: sentences(judged.detail, words.differs) }, computed];
}

function markOf(input: SheetInput): SheetModel['mark'] {
  const { found } = input.record;
  if (isSigned(input)) {
    if (found.state === 'superseded') return { word: words.superseded, sentence: words.supersededBy(input.successor ?? '') };
    if (found.state === 'withdrawn') return { word: words.withdrawn, sentence: words.withdrawnSentence(input.withdrawnBecause) };
    return null;
  }
  if (input.revision.number !== found.revision) return { word: words.draft, sentence: words.draftOld };
  if (found.state === 'withdrawn') return { word: `${words.draft}, ${words.withdrawn}`, sentence: words.withdrawnSentence(input.withdrawnBecause) };
  return { word: words.draft, sentence: words.draftOf(STATE_WORDS[found.state]) };
}

function openPart({ content, trail }: SheetInput): SheetModel['open'] {
  const grade = content.answer?.grade ?? trail.answer.grade;
  const items: [string, string][] = trail.measureNext.map(({ title, detail }) => [words.nextMeasurement, sentences(title, detail)]);
  return { lead: grade === 'not-decided' ? words.openNotDecided : words.openDecided, items };
}

/** The finished report of one revision. Every date comes from the record; the clock is not read. */
export function sheetModel(input: SheetInput): SheetModel {
  const { record, revision, content, trail } = input;
  const signed = isSigned(input);
  const last = reviewSignatures(input).at(-1);
  const subtitle = [conditionsText(content.conditions), content.compound.notebook.trim() === '' ? '' : `notebook ${literal(content.compound.notebook.trim())}`, `author ${literal(input.authorName)}`];
  return {
    code: record.found.code, revision: revision.number, projectName: literal(input.projectName), question: literal(content.question), subtitle: subtitle.filter((part) => part !== '').join(' · '),
    author: input.authorName, at: last?.signedAt ?? revision.savedAt, mark: markOf(input), answers: answersOf(input), measured: measuredPart(input),
    ...calculatedPart(input), judged: judgedPart(input), open: openPart(input), cautions: trail.cautions.map(({ text }) => text),
    provenance: [
      [words.contentHash, input.hashHolds ? groupedHash(revision.contentHash) : `${groupedHash(revision.contentHash)}. ${words.hashWrong}`],
      [words.saved, words.savedBy(literal(revision.savedByName), time(input, revision.savedAt))],
      [words.engine, trail.engineVersion],
      [words.relations, trail.relations.map(({ id, version }) => `${id}@${version}`).join(', ') || '–'],
      [words.times, words.timesIn(input.zone.replace(/_/g, ' '))],
    ],
    footer: { left: (signed ? words.signedRevision : words.draftRevision)(groupedHash(revision.contentHash, 24)), middle: words.engineFoot(trail.engineVersion) },
  };
}
