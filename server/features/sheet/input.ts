import type { CaseRecord } from '@/server/features/cases/read';
import type { CaseRevisionModel } from '@/server/db/models/CaseRevisionModel';
import type { SignatureModel } from '@/server/db/models/SignatureModel';
import { dateTimeIn } from '@/shared/format/date';
import type { Registry } from '@/shared/engine';
import type { CaseContent } from '@/shared/types/case';
import type { CaseTrail } from '@/shared/types/trail';

/** Everything that a sheet is made of, read once. */
export interface SheetInput {
  record: CaseRecord;
  revision: CaseRevisionModel;
  content: CaseContent;
  trail: CaseTrail;
  projectName: string;
  authorName: string;
  names: Map<string, string>;
  registry: Registry;
  /** IANA name of the zone that times are printed in */
  zone: string;
  successor: string | null;
  withdrawnBecause: string;
  hashHolds: boolean;
}

export const reviewSignatures = (input: SheetInput): SignatureModel[] =>
  input.record.signatures.filter((one) => one.revision === input.revision.number && one.meaning !== 'authorship' && one.contentHash === input.revision.contentHash);

/** A revision counts as signed with a review signature on its own hash, while its case has not gone back. */
export const isSigned = (input: SheetInput): boolean =>
  ['signed', 'superseded', 'withdrawn'].includes(input.record.found.state) && input.revision.number === input.record.found.revision && reviewSignatures(input).length > 0;

export const time = (input: SheetInput, at: Date): string => dateTimeIn(at, input.zone);

/** 64 characters in fours are read and compared more easily. */
export const groupedHash = (hash: string, characters = hash.length): string => (hash.slice(0, characters).match(/.{1,4}/g) ?? []).join('\u00a0');

/** Parts as sentences: each ends with a stop before the next begins. */
export const sentences = (...parts: string[]): string => {
  const told = parts.map((part) => part.trim()).filter((part) => part !== '');
  return told.map((part, i) => (i < told.length - 1 && !/[.!?:]$/.test(part) ? `${part}.` : part)).join(' ');
};
