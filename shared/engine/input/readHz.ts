import type { FieldName, FieldProblem, HzReading, InputNote, Mend } from '../../types/reading';
import { inputText as say } from '../../text/engine/input';
import { fixed } from '../../format/number';

/** One standard error where none is typed, in hertz (common practice, no source). */
export const DEFAULT_SE_HZ = 0.2;
/** Standard error of "about 7", in hertz (common practice, no source). */
const APPROXIMATE_SE_HZ = 1;
/** Rounding error of a value typed without decimals: 1 Hz / √12. */
const WHOLE_HZ_SE = 1 / Math.sqrt(12);
/** Below this a size is taken for a distance in ppm; above the other no H,H coupling is known (both common practice). */
const PPM_BELOW_HZ = 0.3;
const OUT_OF_RANGE_HZ = 60;
const LONGEST_TEXT = 40;

export type HzResult = { reading: HzReading; notes: InputNote[] } | { problem: FieldProblem };

interface Parsed {
  value: number;
  /** the number as it stands, decimal point in place of a comma */
  text: string;
  decimals: number;
  comma: boolean;
}

const NUMBER = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)$/;

function parseNumber(text: string): Parsed | null {
  if (!NUMBER.test(text)) return null;
  const point = text.replace(',', '.').replace(/^\+/, '').replace(/\.$/, '');
  const value = Number(point);
  if (!Number.isFinite(value)) return null;
  return { value, text: point, decimals: point.split('.')[1]?.length ?? 0, comma: text.includes(',') };
}

/** One kind of space, minus and dash, so that pasted text reads as typed text. */
const tidy = (typed: string): string =>
  typed.replace(/[\u00a0\u2000-\u200b\u202f]/g, ' ').replace(/[\u2212\ufe63\uff0d]/g, '-').trim().replace(/^[–—]/, '-');

const problem = (field: FieldName, code: string, sentence: string, mends: Mend[] = []): { problem: FieldProblem } => ({
  problem: { field, code, sentence, mends },
});

/** A distance in ppm as a mend in hertz, when the field is known and the result is a possible coupling. */
function ppmMends(field: FieldName, ppm: number, fieldMHz: number | null): Mend[] {
  if (fieldMHz === null) return [];
  const inHz = Math.abs(ppm) * fieldMHz;
  return inHz >= PPM_BELOW_HZ && inHz <= OUT_OF_RANGE_HZ ? [{ label: say.useHz(fixed(inHz, 1)), field, value: inHz.toFixed(1) }] : [];
}

/** The numbers of a text that holds nothing else, for "choose one"; a comma is decimal unless a space or a point says otherwise. */
function numbersIn(text: string): string[] {
  const separator = text.includes('.') ? /\s*(?:[,;/&]|\band\b)\s*|\s+/ : /\s*(?:[;/&]|\band\b)\s*|,?\s+/;
  const parts = text.split(separator).filter((part) => part !== '');
  return parts.every((part) => parseNumber(part) !== null) ? parts : [];
}

interface Marks {
  body: string;
  approximate: boolean;
  limit: HzReading['limit'];
  unit: string;
  se: string;
}

/** Takes off what may stand around the number: "J =", "ca.", "<", the unit, and "± 0.3". */
function takeApart(text: string): Marks {
  let body = text.replace(/^(?:[³3]?\s*J\s*(?:\([^)]*\))?|\|J\|)\s*[=:]?\s*/i, '');
  const about = /^(?:ca\.?|circa|approx\.?|approximately|about|around|[~≈])\s*/i.exec(body);
  if (about) body = body.slice(about[0].length);
  const bound = /^(<=|>=|[<>≤≥]|less than|below|up to|more than|above)\s*/i.exec(body);
  if (bound) body = body.slice(bound[0].length);
  const unit = /\s*(khz|mhz|ghz|hz|ppm|ppb|s-1|s\^-1)$/i.exec(body);
  if (unit) body = body.slice(0, -unit[0].length);
  const error = /^(.*?)\s*(?:±|\+\/-|\+-)\s*(.+)$/.exec(body);
  return {
    body: (error?.[1] ?? body).trim(),
    approximate: about !== null,
    limit: bound ? (/^(?:[>≥]|more|above)/i.test(bound[0]) ? 'lower' : 'upper') : 'none',
    unit: unit?.[1] ?? '',
    se: error?.[2]?.trim() ?? '',
  };
}

/**
 * Reads a coupling in hertz as someone types it. Nothing is guessed silently: what was understood comes back as notes,
 * what cannot be used as one problem with mends. The digits stay as typed.
 * @param fieldMHz  ¹H frequency, to offer a ppm distance in Hz; null when not told
 */
export function readHz(typed: string, field: 'j' | 'partner', fieldMHz: number | null): HzResult {
  const text = tidy(typed);
  if (text === '') return problem(field, 'empty', say.empty(field));
  if (text.length > LONGEST_TEXT) return problem(field, 'too-long', say.tooLong(field));
  const marks = takeApart(text);
  const range = /^(\d+(?:[.,]\d+)?)\s*(?:-|–|—|to)\s*(\d+(?:[.,]\d+)?)$/.exec(marks.body);
  const parsed = range ? null : parseNumber(marks.body);
  if (!range && !parsed) {
    const numbers = numbersIn(marks.body);
    if (numbers.length > 1) {
      return problem(field, 'two-numbers', say.twoNumbers(field, typed), numbers.slice(0, 4).map((n) => ({ label: say.useHz(n.replace('-', '−')), field, value: n })));
    }
    return problem(field, 'not-a-number', say.notANumber(field, typed));
  }
  const notes: InputNote[] = [];
  let number: Parsed;
  let rangeSe: number | null = null;
  if (parsed) number = parsed;
  else {
    const from = parseNumber(range?.[1] ?? '');
    const to = parseNumber(range?.[2] ?? '');
    if (!from || !to || from.value === to.value) return problem(field, 'not-a-number', say.notANumber(field, typed));
    const middle = (from.value + to.value) / 2;
    rangeSe = Math.abs(to.value - from.value) / 2;
    number = { value: middle, text: String(middle), decimals: Math.max(from.decimals, to.decimals) + 1, comma: from.comma || to.comma };
    notes.push({ field, code: 'range', text: say.noteRange(from.text, to.text, middle, rangeSe) });
  }
  const unit = marks.unit.toLowerCase();
  if (unit === 'ppm' || unit === 'ppb') {
    const ppm = unit === 'ppm' ? number.value : number.value / 1000;
    return problem(field, 'ppm', say.ppm(typed, fieldMHz !== null), ppmMends(field, ppm, fieldMHz));
  }
  if (unit === 'khz') {
    const value = Number((number.value * 1000).toPrecision(12));
    return problem(field, 'unit', say.otherUnit(field, 'kHz'), value >= PPM_BELOW_HZ && value <= OUT_OF_RANGE_HZ ? [{ label: say.useHz(String(value)), field, value: String(value) }] : []);
  }
  if (unit !== '' && unit !== 'hz') return problem(field, 'unit', say.otherUnit(field, marks.unit));
  const size = Math.abs(number.value);
  if (size === 0) return problem(field, 'zero', say.zero(), [{ label: say.useLimit('1'), field, value: '< 1' }]);
  if (marks.limit !== 'none' && number.value < 0) {
    return problem(field, 'limit-negative', say.limitNegative(), [{ label: say.useLimit(number.text.replace('-', '')), field, value: `< ${number.text.replace('-', '')}` }]);
  }
  if (size < PPM_BELOW_HZ && marks.limit !== 'upper') return problem(field, 'ppm-suspected', say.ppmSuspected(typed, fieldMHz !== null), ppmMends(field, size, fieldMHz));
  if (size > OUT_OF_RANGE_HZ) return problem(field, 'too-large', say.tooLarge(number.value));

  if (number.comma) notes.push({ field, code: 'decimal-comma', text: say.noteComma(marks.body, number.text) });
  if (unit === 'hz') notes.push({ field, code: 'unit-typed', text: say.noteUnit(number.text) });
  if (marks.limit !== 'none') notes.push({ field, code: 'limit', text: say.noteLimit(number.text, marks.limit === 'upper') });
  const reading: HzReading = { typed, jHz: number.value, decimals: number.decimals, limit: marks.limit, seHz: DEFAULT_SE_HZ, seSource: 'default' };
  if (rangeSe !== null) return { reading: { ...reading, seHz: rangeSe, seSource: 'approximate' }, notes };
  if (marks.se !== '') {
    const se = parseNumber(marks.se);
    if (!se || se.value <= 0) return problem(field, 'not-a-number', say.notANumber(field, typed));
    notes.push({ field, code: 'range', text: say.noteError(number.text, se.text) });
    return { reading: { ...reading, seHz: se.value, seSource: 'typed' }, notes };
  }
  if (marks.approximate) {
    notes.push({ field, code: 'approximate', text: say.noteApproximate(number.text, APPROXIMATE_SE_HZ) });
    return { reading: { ...reading, seHz: APPROXIMATE_SE_HZ, seSource: 'approximate' }, notes };
  }
  return { reading, notes };
}

/**
 * Gives a reading its standard error: what was typed, else what the text said ("ca.", a range), else the default; a
 * value without decimals carries at least its rounding error.
 */
export function withError(result: { reading: HzReading; notes: InputNote[] }, typedSe: string | undefined): HzResult {
  const { reading, notes } = result;
  const text = tidy(typedSe ?? '').replace(/^(?:±|\+\/-|\+-)\s*/, '').replace(/\s*hz$/i, '');
  if (text === '') {
    if (reading.seSource !== 'default') return { reading, notes };
    if (reading.decimals === 0 && reading.limit === 'none') {
      const coarse: InputNote = { field: 'j', code: 'digits-coarse', text: say.noteCoarse(reading.typed) };
      return { reading: { ...reading, seHz: Math.max(DEFAULT_SE_HZ, WHOLE_HZ_SE) }, notes: [...notes, coarse] };
    }
    return { reading, notes: [...notes, { field: 'se', code: 'default-error', text: say.noteDefaultError() }] };
  }
  const mends: Mend[] = [{ label: say.useHz(fixed(DEFAULT_SE_HZ, 1)), field: 'se', value: String(DEFAULT_SE_HZ) }];
  if (text.length > LONGEST_TEXT) return problem('se', 'too-long', say.tooLong('se'), mends);
  const se = parseNumber(text);
  if (!se) return problem('se', 'not-a-number', say.notANumber('se', typedSe ?? ''), mends);
  if (se.value === 0) return problem('se', 'zero', say.seZero(), mends);
  if (se.value < 0) return problem('se', 'negative', say.seNegative(), mends);
  if (se.value > 5) return problem('se', 'too-large', say.seLarge(se.value), mends);
  const all = se.comma ? [...notes, { field: 'se' as const, code: 'decimal-comma' as const, text: say.noteComma(text, se.text) }] : notes;
  if (reading.seSource === 'approximate' && se.value < reading.seHz) return { reading, notes: all };
  return { reading: { ...reading, seHz: se.value, seSource: 'typed' }, notes: all };
}

/** The ¹H frequency in MHz, or null when not told. */
export function readField(typed: string | undefined): { fieldMHz: number | null } | { problem: FieldProblem } {
  const text = tidy(typed ?? '').replace(/\s*mhz$/i, '');
  if (text === '') return { fieldMHz: null };
  const field = text.length > LONGEST_TEXT ? null : parseNumber(text);
  if (!field || field.value < 20 || field.value > 1500) return problem('fieldMHz', 'field', say.fieldRange(typed ?? ''));
  return { fieldMHz: field.value };
}

/** For mends and choices: a size as it was typed, without the sign. */
export const sizeText = (reading: HzReading): string => Math.abs(reading.jHz).toFixed(reading.decimals);
