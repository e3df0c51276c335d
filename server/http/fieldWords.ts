import type { z } from 'zod';

import type { FieldError } from '@/shared/contracts/problem';
import { fieldText } from '@/shared/text/problems';

type RawIssue = Parameters<z.core.$ZodErrorMap>[0];

const KINDS: Readonly<Record<string, string>> = {
  string: fieldText.text, number: fieldText.number, int: fieldText.whole, boolean: fieldText.yesNo, array: fieldText.list, tuple: fieldText.list, object: fieldText.object, record: fieldText.object,
};
const FORMATS: Readonly<Record<string, string>> = { uuid: fieldText.id, date: fieldText.day, datetime: fieldText.instant, email: fieldText.email };

function tooBig(issue: Extract<RawIssue, { code: 'too_big' }>): string {
  if (issue.origin === 'string') return fieldText.atMostCharacters(Number(issue.maximum));
  if (issue.origin === 'array') return fieldText.atMostEntries(Number(issue.maximum));
  return issue.inclusive === false ? fieldText.lessThan(String(issue.maximum)) : fieldText.atMost(String(issue.maximum));
}
function tooSmall(issue: Extract<RawIssue, { code: 'too_small' }>): string {
  if (issue.origin === 'string') return Number(issue.minimum) <= 1 ? fieldText.missing : fieldText.atLeastCharacters(Number(issue.minimum));
  if (issue.origin === 'array') return fieldText.atLeastEntries(Number(issue.minimum));
  return issue.inclusive === false ? fieldText.moreThan(String(issue.minimum)) : fieldText.atLeast(String(issue.minimum));
}

/** One sentence for what a schema refused; words written in the schema itself go before these. */
export const fieldWords: z.core.$ZodErrorMap = (issue) => {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined ? fieldText.missing : KINDS[issue.expected] ?? fieldText.form;
    case 'too_big':
      return tooBig(issue);
    case 'too_small':
      return tooSmall(issue);
    case 'invalid_value':
      return fieldText.oneOf(issue.values.map(String).join(', '));
    case 'invalid_format':
      return FORMATS[issue.format] ?? fieldText.form;
    case 'invalid_union':
      return issue.input === undefined ? fieldText.missing : fieldText.kind;
    default:
      return fieldText.form;
  }
};

/** RFC 6901: `~` and `/` inside a name are written ~0 and ~1. */
const pointer = (path: readonly PropertyKey[]): string => `#${path.map((part) => `/${String(part).replace(/~/g, '~0').replace(/\//g, '~1')}`).join('')}`;

/** Never more entries than a screen can show; a body of wrong rows could raise thousands. */
const MOST_ERRORS = 50;

/** Every issue as a field error, each with its pointer into what was sent. */
export function fieldErrors(issues: readonly z.core.$ZodIssue[]): FieldError[] {
  return issues.flatMap((issue): FieldError[] => {
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({ pointer: pointer([...issue.path, key]), detail: fieldText.unknown(key.slice(0, 40)), code: 'unknown-field' }));
    }
    return [{ pointer: pointer(issue.path), detail: issue.message, code: issue.code.replace(/_/g, '-') }];
  }).slice(0, MOST_ERRORS);
}
