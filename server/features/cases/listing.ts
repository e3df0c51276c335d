import { plainText } from '@/shared/format/richText';
import { NBSP } from '@/shared/format/number';
import type { Grade } from '@/shared/types/answer';
import type { CaseContent, Reading } from '@/shared/types/case';
import type { CaseTrail } from '@/shared/types/trail';
import { searchText } from './searchText';

/** "H2–H3": how a reading is named wherever it is meant. */
export function readingLabel(reading: Pick<Reading, 'atomA' | 'atomB' | 'nuclei'>, index: number): string {
  const atoms = [reading.atomA, reading.atomB].map((atom) => atom.trim()).filter((atom) => atom !== '');
  return atoms.length > 0 ? atoms.join('–') : `Reading ${index + 1}`;
}

/** The reading that the log shows: the first one a calculation rests on, else the first that holds a number. */
function keyReading(content: CaseContent): { label: string; jText: string } | null {
  const calculated = content.calculations.map((calculation) => content.readings.findIndex((reading) => reading.id === calculation.readingId)).find((i) => i >= 0);
  const index = calculated ?? content.readings.findIndex((reading) => reading.j.trim() !== '');
  const reading = content.readings[index];
  if (!reading || reading.j.trim() === '') return null;
  const typed = reading.j.trim();
  return { label: readingLabel(reading, index).slice(0, 80), jText: (/[a-z]\s*$/i.test(typed) ? typed : `${typed}${NBSP}Hz`).slice(0, 80) };
}

export interface Listing {
  question: string;
  compound: string;
  batch: string;
  notebook: string;
  keyLabel: string | null;
  keyJText: string | null;
  answerGrade: Grade;
  answerText: string;
  answerJudged: boolean;
  untested: number;
}

const cut = (text: string, max: number) => ([...text].length <= max ? text : `${[...text].slice(0, max - 1).join('')}…`);

/** The columns of the log, from a content and its trail. A person's answer goes before the calculated one. */
export function listingOf(content: CaseContent, trail: CaseTrail): Listing {
  const key = keyReading(content);
  const { answer } = content;
  const named = answer === null || answer.candidateId === null ? undefined : content.candidates.find((candidate) => candidate.id === answer.candidateId)?.name;
  const text = answer === null ? trail.answer.headline : answer.statement.trim() || named?.trim() || trail.answer.headline;
  return {
    question: content.question, compound: content.compound.name.trim(), batch: content.compound.batch.trim(), notebook: content.compound.notebook.trim(),
    keyLabel: key?.label ?? null, keyJText: key?.jText ?? null,
    answerGrade: answer?.grade ?? trail.answer.grade, answerText: cut(text, 600), answerJudged: answer !== null, untested: trail.notTested.length,
  };
}

/** Everything that a search looks through: the code, the names (earlier ones too), the page, the readings' atoms, the answer. */
export function searchTextOf(code: string, authorName: string, content: CaseContent, listing: Listing): string {
  const { compound } = content;
  return searchText([
    code, plainText(content.question), compound.name, compound.batch, compound.notebook, ...compound.formerNames, compound.structureNote.slice(0, 400),
    authorName, plainText(listing.answerText), ...content.tags, ...content.candidates.slice(0, 12).map((candidate) => plainText(candidate.name)),
    ...content.readings.slice(0, 40).flatMap((reading) => [reading.atomA, reading.atomB]), content.conditions.solvent,
  ]);
}
