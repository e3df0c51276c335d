import { Problem } from '@/server/http/problems';
import type { FieldError } from '@/shared/contracts/problem';
import { casesText } from '@/shared/text/cases';
import type { CaseContent } from '@/shared/types/case';

/** Names are kept newest first; a name that comes back leaves the list of former ones. */
export function formerNames(before: { name: string; formerNames: string[] }, nameNow: string): string[] {
  const old = before.name.trim();
  const now = nameNow.trim();
  const kept = before.formerNames.filter((name) => name !== now);
  return old === '' || old === now || kept.includes(old) ? kept : [old, ...kept].slice(0, 50);
}

function uniqueTags(tags: readonly string[]): string[] {
  const seen = new Set<string>();
  return tags.map((tag) => tag.trim()).filter((tag) => {
    const key = tag.normalize('NFKC').toLowerCase();
    if (tag === '' || seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}

/**
 * A content as it is kept: what was typed stays as typed; tags appear once; former names are the server's, since a correction
 * never erases one, whatever a client sends.
 */
export function normalised(content: CaseContent, before: CaseContent | null): CaseContent {
  return {
    ...content,
    compound: { ...content.compound, formerNames: before ? formerNames(before.compound, content.compound.name) : [] },
    tags: uniqueTags(content.tags),
  };
}

/** Rows must be told apart, and what they name must be there. @throws Problem invalid-input with one entry a row */
export function checkReferences(content: CaseContent, attachmentIds: ReadonlySet<string>): void {
  const errors: FieldError[] = [];
  for (const list of ['readings', 'calculations', 'candidates', 'evidence'] as const) {
    const seen = new Set<string>();
    content[list].forEach(({ id }, index) => {
      if (seen.has(id)) errors.push({ pointer: `#/content/${list}/${index}/id`, detail: casesText.doubleId });
      seen.add(id);
    });
  }
  const readings = new Set(content.readings.map(({ id }) => id));
  content.calculations.forEach((calculation, index) => {
    if (!readings.has(calculation.readingId)) errors.push({ pointer: `#/content/calculations/${index}/readingId`, detail: casesText.unknownReading });
  });
  content.evidence.forEach((evidence, index) => evidence.attachmentIds.forEach((id, at) => {
    if (!attachmentIds.has(id)) errors.push({ pointer: `#/content/evidence/${index}/attachmentIds/${at}`, detail: casesText.unknownAttachment });
  }));
  const [first] = errors;
  if (first) throw new Problem('invalid-input', first.detail, { errors: errors.slice(0, 50) });
}
