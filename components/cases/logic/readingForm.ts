import { readField, readHz, withError } from '@/shared/engine/input/readHz';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import type { CaseContent, Reading } from '@/shared/types/case';
import type { FieldProblem, InputNote } from '@/shared/types/reading';

type NumberField = 'j' | 'se' | 'partner';
export interface ReadingCheck {
  errors: Partial<Record<NumberField | 'atoms', string>>;
  problems: FieldProblem[];
  notes: InputNote[];
}

/**
 * What the engine makes of a reading as typed, told in the form before it is kept. Only H,H couplings have a range that a
 * number can fall out of; for other nuclei the digits are kept as they are.
 */
export function checkReading(reading: Reading, conditions: CaseContent['conditions']): ReadingCheck {
  const errors: ReadingCheck['errors'] = {};
  if (reading.atomA.trim() === '' || reading.atomB.trim() === '') errors.atoms = uiCaseParts.readings.atomsEmpty;
  if (reading.j.trim() === '') { errors.j = uiCaseParts.readings.jEmpty; return { errors, problems: [], notes: [] }; }
  if (!isProtonPair(reading)) return { errors, problems: [], notes: [] };
  const field = readField(conditions.fieldMHz);
  const mhz = 'fieldMHz' in field ? field.fieldMHz : null;
  const read = readHz(reading.j, 'j', mhz);
  const withSe = 'problem' in read ? read : withError(read, reading.se.trim() === '' ? undefined : reading.se);
  const partner = reading.partner.trim() === '' ? null : readHz(reading.partner, 'partner', mhz);
  const results = [withSe, ...(partner === null ? [] : [partner])];
  const problems = results.flatMap((result) => ('problem' in result ? [result.problem] : []));
  for (const problem of problems) if (problem.field === 'j' || problem.field === 'se' || problem.field === 'partner') errors[problem.field] ??= problem.sentence;
  return { errors, problems, notes: results.flatMap((result) => ('problem' in result ? [] : result.notes)) };
}

/** "¹H,¹H" in any of its spellings; an empty field means it as well. */
export const isProtonPair = (reading: Pick<Reading, 'nuclei'>): boolean => /^(?:[¹1]?H\s*[,;/ -]?\s*[¹1]?H)?$/i.test(reading.nuclei.trim());

/** The next atom pair when readings are typed in a row: it begins at the atom where the last one ended. */
export const nextAtoms = (last: Pick<Reading, 'atomB'>): { atomA: string; atomB: string } => ({ atomA: last.atomB.trim(), atomB: '' });
