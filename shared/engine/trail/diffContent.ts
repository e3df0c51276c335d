import type { CaseContent } from '../../types/case';
import { trailText } from '../../text/engine/trail';
import { canonicalJson } from './canonicalJson';

/** One changed field. null = not there. */
export interface FieldChange {
  path: string;
  label: string;
  before: string | null;
  after: string | null;
}

interface Row {
  id: string;
}

const word = (key: string): string => trailText.fields[key] ?? key;

/** A field's value as a reader compares it. */
function shown(value: unknown): string {
  if (value === null || value === undefined) return '';
  if (typeof value === 'string') return value;
  if (Array.isArray(value) && value.every((v) => typeof v === 'string')) return value.join(', ');
  return canonicalJson(value);
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);

function fields(before: object, after: object, path: string, label: string, out: FieldChange[], skip: readonly string[] = []): void {
  const a = new Map<string, unknown>(Object.entries(before));
  const b = new Map<string, unknown>(Object.entries(after));
  for (const key of new Set([...a.keys(), ...b.keys()])) {
    if (skip.includes(key) || canonicalJson(a.get(key) ?? null) === canonicalJson(b.get(key) ?? null)) continue;
    out.push({ path: `${path}.${key}`, label: `${label}, ${word(key)}`, before: shown(a.get(key)), after: shown(b.get(key)) });
  }
}

/** Rows matched by id: added, removed, each changed field, and the order when nothing else tells two lists apart. */
function rows<T extends Row>(before: readonly T[], after: readonly T[], path: string, kind: string, name: (row: T) => string, out: FieldChange[]): void {
  const was = new Map(before.map((r) => [r.id, r]));
  const is = new Map(after.map((r) => [r.id, r]));
  for (const [id, row] of was) {
    if (!is.has(id)) out.push({ path: `${path}.${id}`, label: `${word(kind)} ${name(row)}`.trim(), before: summary(row), after: null });
  }
  for (const [id, row] of is) {
    const old = was.get(id);
    if (old) fields(old, row, `${path}.${id}`, `${word(kind)} ${name(row)}`.trim(), out, ['id']);
    else out.push({ path: `${path}.${id}`, label: `${word(kind)} ${name(row)}`.trim(), before: null, after: summary(row) });
  }
  const shared = (list: readonly T[]): string[] => list.map((r) => r.id).filter((id) => was.has(id) && is.has(id));
  if (shared(before).join() !== shared(after).join()) {
    const order = (list: readonly T[]): string => list.map((r, i) => name(r) || `${i + 1}`).join(', ');
    out.push({ path, label: `${word(path)}, ${word('order')}`, before: order(before), after: order(after) });
  }
}

/** A whole row in one line: its non-empty fields, the id left out. */
function summary(row: Row): string {
  return Object.entries(row)
    .filter(([key, value]) => key !== 'id' && shown(value) !== '' && shown(value) !== '[]')
    .map(([key, value]) => `${word(key)}: ${shown(value)}`)
    .join('; ');
}

/** Two contents field by field: every difference once, rows matched by id. [] exactly when the contents are equal. */
export function diffContent(before: CaseContent, after: CaseContent): FieldChange[] {
  const out: FieldChange[] = [];
  if (before.question !== after.question) out.push({ path: 'question', label: word('question'), before: before.question, after: after.question });
  fields(before.compound, after.compound, 'compound', word('compound'), out);
  fields(before.conditions, after.conditions, 'conditions', word('conditions'), out);
  rows(before.readings, after.readings, 'readings', 'reading', (r) => (r.atomA || r.atomB ? trailText.readingLabel(r.atomA, r.atomB) : ''), out);
  const readingName = (id: string): string => {
    const found = [...after.readings, ...before.readings].find((r) => r.id === id);
    return found && (found.atomA || found.atomB) ? trailText.readingLabel(found.atomA, found.atomB) : '';
  };
  rows(before.calculations, after.calculations, 'calculations', 'calculation', (c) => readingName(c.readingId), out);
  rows(before.candidates, after.candidates, 'candidates', 'candidate', (c) => c.name, out);
  rows(before.evidence, after.evidence, 'evidence', 'evidence', () => '', out);
  if (before.answer === null || after.answer === null) {
    if (before.answer !== after.answer) out.push({ path: 'answer', label: word('answer'), before: before.answer ? shownAnswer(before.answer) : null, after: after.answer ? shownAnswer(after.answer) : null });
  } else fields(before.answer, after.answer, 'answer', word('answer'), out);
  if (canonicalJson(before.tags) !== canonicalJson(after.tags)) out.push({ path: 'tags', label: word('tags'), before: shown(before.tags), after: shown(after.tags) });
  return out;
}

const shownAnswer = (answer: unknown): string => (isRecord(answer) ? summary({ id: '', ...answer }) : '');
