import { literal } from '@/server/pdf/textLayout';
import type { SheetModel } from '@/server/pdf/model';
import { readingLabel } from '@/server/features/cases/listing';
import { formulaDigits } from '@/shared/format/formula';
import { NBSP } from '@/shared/format/number';
import { sheetText as words } from '@/shared/text/sheet';
import type { Conditions, Reading } from '@/shared/types/case';
import { groupedHash, type SheetInput } from './input';

const told = (text: string): boolean => text.trim() !== '';
/** A bare number gets its unit; whatever else was typed stands as typed. */
const withUnit = (typed: string, unit: string): string => (/^[\d.,\s]+$/.test(typed.trim()) ? `${typed.trim()}${NBSP}${unit}` : typed.trim());

/** "500 MHz, CDCl₃, 298 K": what was told of the spectrum. */
export function conditionsText(conditions: Conditions): string {
  return [
    told(conditions.fieldMHz) ? withUnit(conditions.fieldMHz, 'MHz') : '',
    formulaDigits(conditions.solvent.trim()),
    told(conditions.temperatureK) ? withUnit(conditions.temperatureK, 'K') : '',
    formulaDigits(conditions.concentration.trim()),
  ].filter(told).join(', ');
}

const SUPERSCRIPT: Record<Reading['path'], string> = { '1J': '¹', '2J': '²', '3J': '³', '4J': '⁴', '5J': '⁵' };
export const pathText = ({ path, nuclei }: Pick<Reading, 'path' | 'nuclei'>): string => `${SUPERSCRIPT[path]}_J_${told(nuclei) ? `(${nuclei.trim().replace(/^\(|\)$/g, '')})` : ''}`;

const minus = (typed: string): string => literal(typed.trim().replace(/^-(?=\d)/, '−'));

function notes(input: SheetInput): string[] {
  const { readings, calculations } = input.content;
  const labels = (which: (reading: Reading) => boolean) => readings.flatMap((reading, i) => (which(reading) ? [readingLabel(reading, i)] : [])).join(', ');
  const found: string[] = readings.length > 0 ? [words.seNote] : [];
  const defaulted = new Set(input.trail.calculations.filter(({ result }) => result.state === 'answered' && result.reading.seSource === 'default').map(({ readingId }) => readingId));
  const limits = new Set(input.trail.calculations.filter(({ result }) => result.state === 'answered' && result.reading.limit !== 'none').map(({ readingId }) => readingId));
  const calculated = new Set(calculations.map(({ readingId }) => readingId));
  if (defaulted.size > 0) found.push(words.seDefaulted(labels(({ id }) => defaulted.has(id))));
  if (limits.size > 0) found.push(words.limitNote(labels(({ id }) => limits.has(id))));
  const unsigned = labels(({ id, sign, path }) => sign === 'not-measured' && (path !== '3J' || !calculated.has(id)));
  if (unsigned !== '') found.push(words.signNote(unsigned));
  if (readings.length === 0) found.push(words.noReadings);
  for (const [i, reading] of readings.entries()) if (told(reading.note)) found.push(`${readingLabel(reading, i)}: ${literal(reading.note.trim())}`);
  return found;
}

export function measuredPart(input: SheetInput): SheetModel['measured'] {
  const { content, record } = input;
  const { compound } = content;
  const facts: [string, string][] = [];
  const name = [compound.name, compound.batch].map((part) => literal(part.trim())).filter(told).join(', ');
  if (told(name)) facts.push([words.compound, name]);
  if (compound.formerNames.length > 0) facts.push([words.formerly, compound.formerNames.map(literal).join('; ')]);
  if (told(compound.structureNote)) facts.push([words.structure, literal(compound.structureNote.trim())]);
  if (content.tags.length > 0) facts.push([words.tags, content.tags.map(literal).join(', ')]);
  const cited = new Set(content.evidence.flatMap(({ attachmentIds }) => attachmentIds));
  const files = record.attachments.filter(({ id }) => cited.has(id));
  return {
    summary: words.readings(content.readings.length), facts,
    readings: content.readings.map((reading, i) => ({
      coupling: literal(readingLabel(reading, i)), path: pathText(reading), jTyped: minus(reading.j), seTyped: minus(reading.se), partnerTyped: told(reading.partner) ? minus(reading.partner) : '–',
      from: [reading.where, reading.method].map((part) => literal(part.trim())).filter(told).join('; '),
    })),
    notes: notes(input),
    files: files.length === 0 ? null : {
      caption: words.files,
      columns: [{ head: words.file, share: 45, align: 'left' }, { head: words.size, share: 15, align: 'number' }, { head: words.hash, share: 40, align: 'left' }],
      rows: files.map((file) => ({ cells: [literal(file.fileName), `${file.bytes}${NBSP}B`, `${groupedHash(file.sha256, 24)}…`] })),
    },
  };
}
