import type { Calculation, Candidate, CaseContent, Evidence, PersonAnswer, Reading } from '@/shared/types/case';
import { partLabel, partValue } from '@/shared/text/uiCaseFields';

import { tidy } from './edits';

/**
 * Two versions of one case side by side, and their union. Everything a person can type is a *part* with a stable path:
 * `question`, `conditions.solvent`, `readings.<row id>.j`. A row that only one side has is one part as a whole, because
 * half a reading means nothing; a calculation is one part as well, because its groups mean nothing without its bond.
 */
export type Side = 'mine' | 'theirs';
export interface Difference {
  path: string;
  label: string;
  was: string | null;
  mine: string | null;
  theirs: string | null;
  /** who moved away from the version both began with */
  changedBy: Side | 'both';
  /** the figure of a reading: shown large, in the measured ink */
  isFigure: boolean;
}

type RowList = 'readings' | 'calculations' | 'candidates' | 'evidence';
const ROW_LISTS: readonly RowList[] = ['readings', 'calculations', 'candidates', 'evidence'];
const ROW_FIELDS = {
  readings: ['atomA', 'atomB', 'j', 'se', 'partner', 'nuclei', 'path', 'sign', 'where', 'method', 'note'] satisfies (keyof Reading)[],
  calculations: null,
  candidates: ['name', 'description', 'claims'] satisfies (keyof Candidate)[],
  evidence: ['kind', 'text', 'bearing', 'candidateId', 'attachmentIds'] satisfies (keyof Evidence)[],
} as const;
const COMPOUND = ['name', 'batch', 'notebook', 'structureNote'] as const;
const CONDITIONS = ['fieldMHz', 'solvent', 'temperatureK', 'concentration'] as const;
const ANSWER = ['grade', 'candidateId', 'statement', 'reasons', 'leftOpen', 'overrideReason'] as const satisfies readonly (keyof PersonAnswer)[];

type Row = Reading | Calculation | Candidate | Evidence;
type Json = unknown;

/** Same value, whatever the order of its keys. */
export function same(a: Json, b: Json): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const left = a as Record<string, Json>;
  const right = b as Record<string, Json>;
  // a key that is absent and one that is undefined are one thing once they have been through JSON
  const keys = new Set([...Object.keys(left), ...Object.keys(right)]);
  return [...keys].every((key) => same(left[key], right[key]));
}

const rowsOf = (content: CaseContent, list: RowList): Row[] => content[list];
const rowIn = (content: CaseContent, list: RowList, id: string): Row | null => rowsOf(content, list).find((row) => row.id === id) ?? null;

/** The value at a path; undefined when the part is not there. */
export function valueAt(content: CaseContent, path: string): Json {
  const [head, second, third] = path.split('.') as [string, string | undefined, string | undefined];
  if ((ROW_LISTS as readonly string[]).includes(head)) {
    const row = rowIn(content, head as RowList, second ?? '');
    if (row === null) return undefined;
    return third === undefined ? row : (row as unknown as Record<string, Json>)[third];
  }
  if (head === 'question') return content.question;
  if (head === 'answer') return second === undefined ? (content.answer ?? undefined) : (content.answer as unknown as Record<string, Json> | null)?.[second];
  return (content[head as 'compound' | 'conditions'] as unknown as Record<string, Json>)[second ?? ''];
}

/** Every part that at least one of the two sides has, in the order the case is read. */
export function partsOf(mine: CaseContent, theirs: CaseContent): string[] {
  const paths: string[] = ['question', ...COMPOUND.map((f) => `compound.${f}`), ...CONDITIONS.map((f) => `conditions.${f}`)];
  for (const list of ROW_LISTS) {
    const ids = [...new Set([...rowsOf(mine, list), ...rowsOf(theirs, list)].map((row) => row.id))];
    for (const id of ids) {
      const fields = ROW_FIELDS[list];
      const inBoth = rowIn(mine, list, id) !== null && rowIn(theirs, list, id) !== null;
      if (fields === null || !inBoth) paths.push(`${list}.${id}`);
      else paths.push(...fields.map((field) => `${list}.${id}.${field}`));
    }
  }
  if (mine.answer !== null && theirs.answer !== null) paths.push(...ANSWER.map((field) => `answer.${field}`));
  else if (mine.answer !== null || theirs.answer !== null) paths.push('answer');
  return paths;
}

/** What differs between my version and the one on the server, seen from the version both began with. */
export function differences(base: CaseContent, mine: CaseContent, theirs: CaseContent): Difference[] {
  return partsOf(mine, theirs).flatMap((path) => {
    const [was, ours, others] = [valueAt(base, path), valueAt(mine, path), valueAt(theirs, path)];
    if (same(ours, others)) return [];
    return [{
      path,
      label: partLabel(path, mine, theirs),
      was: partValue(path, was, base),
      mine: partValue(path, ours, mine),
      theirs: partValue(path, others, theirs),
      changedBy: same(was, ours) ? 'theirs' as const : same(was, others) ? 'mine' as const : 'both' as const,
      isFigure: /^readings\.[^.]+\.(j|se|partner)$/.test(path),
    }];
  });
}

/** How many filled parts are the same on both sides. */
export function sameParts(mine: CaseContent, theirs: CaseContent): number {
  return partsOf(mine, theirs).filter((path) => {
    const value = valueAt(mine, path);
    return value !== undefined && value !== null && value !== '' && same(value, valueAt(theirs, path));
  }).length;
}

/** Where nobody chose: what only the other side changed is taken from there, all else is kept as typed here. */
export const usualChoice = (difference: Pick<Difference, 'changedBy'>): Side => (difference.changedBy === 'theirs' ? 'theirs' : 'mine');

/**
 * One content out of two. Starts from the server's, puts in each part chosen from mine; rows keep the order of the
 * server with my own new ones after the row they followed; tags and former names are united, so that neither side
 * loses one. Links to rows that are gone are cut (`tidy`).
 */
export function merge(base: CaseContent, mine: CaseContent, theirs: CaseContent, choices: Readonly<Record<string, Side>> = {}): CaseContent {
  const merged = structuredClone(theirs);
  for (const difference of differences(base, mine, theirs)) {
    if ((choices[difference.path] ?? usualChoice(difference)) === 'mine') put(merged, mine, difference.path);
  }
  merged.tags = united(base.tags, mine.tags, theirs.tags);
  merged.compound.formerNames = [...new Set([...theirs.compound.formerNames, ...mine.compound.formerNames])];
  return tidy(merged);
}

/** Three-way union of a set: what either side added stays, what either side removed goes. */
export function united(base: readonly string[], mine: readonly string[], theirs: readonly string[]): string[] {
  const kept = theirs.filter((tag) => mine.includes(tag) || !base.includes(tag));
  const added = mine.filter((tag) => !theirs.includes(tag) && !base.includes(tag));
  return [...kept, ...added];
}

function put(target: CaseContent, from: CaseContent, path: string): void {
  const [head, second, third] = path.split('.') as [string, string | undefined, string | undefined];
  const value = structuredClone(valueAt(from, path));
  if ((ROW_LISTS as readonly string[]).includes(head)) {
    const list = head as RowList;
    if (third !== undefined) {
      const row = rowIn(target, list, second ?? '');
      if (row !== null) (row as unknown as Record<string, Json>)[third] = value;
    } else putRow(target, from, list, second ?? '');
    return;
  }
  if (head === 'question') { target.question = from.question; return; }
  if (head === 'answer') {
    if (second === undefined || target.answer === null) target.answer = structuredClone(from.answer);
    else (target.answer as unknown as Record<string, Json>)[second] = value;
    return;
  }
  (target[head as 'compound' | 'conditions'] as unknown as Record<string, Json>)[second ?? ''] = value;
}

/** Adds, replaces or removes a whole row so that it is as in `from`. */
function putRow(target: CaseContent, from: CaseContent, list: RowList, id: string): void {
  const rows = target[list] as Row[];
  const at = rows.findIndex((row) => row.id === id);
  const source = rowsOf(from, list);
  const row = source.find((each) => each.id === id);
  if (row === undefined) { if (at >= 0) rows.splice(at, 1); return; }
  if (at >= 0) { rows[at] = structuredClone(row); return; }
  const before = source[source.indexOf(row) - 1];
  const after = before === undefined ? -1 : rows.findIndex((each) => each.id === before.id);
  rows.splice(before === undefined ? 0 : after < 0 ? rows.length : after + 1, 0, structuredClone(row));
}
