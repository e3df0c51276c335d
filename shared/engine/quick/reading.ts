import type { QuickLookInput } from '../../types/answer';
import type { FieldProblem, HzReading, InputNote } from '../../types/reading';
import type { Hz } from '../../types/units';
import { readField, readHz, withError } from '../input/readHz';

/** The numbers of a quick look, read; problems of every field together, so that all can be mended at once. */
export interface Readings {
  reading: HzReading;
  partner: HzReading | null;
  fieldMHz: number | null;
  notes: InputNote[];
}

export function readAll(input: QuickLookInput): Readings | { problems: FieldProblem[] } {
  const field = readField(input.fieldMHz);
  const fieldMHz = 'problem' in field ? null : field.fieldMHz;
  const problems: FieldProblem[] = 'problem' in field ? [field.problem] : [];
  const main = readHz(input.j, 'j', fieldMHz);
  if ('problem' in main) problems.push(main.problem);
  // ± is read even when J is not, so that both can be mended in one go
  const full = 'problem' in main ? withError({ reading: { typed: '', jHz: 1, decimals: 1, limit: 'none', seHz: 0.2, seSource: 'default' }, notes: [] }, input.se) : withError(main, input.se);
  if ('problem' in full) problems.push(full.problem);
  let partner: HzReading | null = null;
  const notes: InputNote[] = 'problem' in full ? [] : [...full.notes];
  if (input.partner !== undefined && input.partner.trim() !== '') {
    const read = readHz(input.partner, 'partner', fieldMHz);
    if ('problem' in read) problems.push(read.problem);
    else {
      // the partner's line was read in the same spectrum: it carries the same error unless it says its own
      partner = read.reading.seSource === 'default' && !('problem' in full) ? { ...read.reading, seHz: full.reading.seHz, seSource: full.reading.seSource } : read.reading;
      notes.push(...read.notes);
    }
  }
  if (problems.length > 0 || 'problem' in full) return { problems };
  return { reading: full.reading, partner, fieldMHz, notes };
}

/** How far the partners are apart, and σ of that difference; null when the partner was not read or a limit leaves it open. */
export function partnerGap(reading: HzReading, partner: HzReading | null): { gapHz: Hz; sigmaHz: Hz; differs: boolean } | null {
  if (!partner) return null;
  const sigmaHz = Math.hypot(reading.seHz, partner.seHz);
  const size = (r: HzReading): [Hz, Hz] => {
    const j = Math.abs(r.jHz);
    return r.limit === 'upper' ? [0, j] : r.limit === 'lower' ? [j, Infinity] : [j, j];
  };
  const [a0, a1] = size(reading);
  const [b0, b1] = size(partner);
  const gapHz = Math.max(0, a0 - b1, b0 - a1);
  return { gapHz, sigmaHz, differs: gapHz > 2 * sigmaHz * (1 + 1e-12) };
}
