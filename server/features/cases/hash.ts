import { createHash } from 'node:crypto';

import { canonicalJson } from '@/shared/engine';

export const sha256 = (text: string | Buffer): string => createHash('sha256').update(text).digest('hex');

/** What a content hash is taken over, besides content and trail: the files that the evidence names, by their own hashes. */
export interface HashedFile {
  id: string;
  sha256: string;
}

/**
 * The hash that a signature binds to. It covers the content, the whole trail (with engine version, relation ids and versions,
 * and every sentence the reviewer read) and the bytes of the files that the evidence cites: one changed byte anywhere gives
 * another hash. `content` and `trail` are the stored canonical JSON texts.
 */
export function contentHash(content: string, trail: string, files: readonly HashedFile[]): string {
  const cited = [...files].sort((a, b) => (a.id < b.id ? -1 : 1)).map((file) => `${file.id} ${file.sha256}`).join('\n');
  return sha256(`throughbond-case-1\n${sha256(content)}\n${sha256(trail)}\n${sha256(cited)}`);
}

/** The hash of a signature's own record: name, time and meaning cannot be changed or moved without it showing. */
export function signatureHash(record: { caseId: string; revision: number; meaning: string; signerId: string; signerName: string; signedAt: Date; contentHash: string }): string {
  return sha256(canonicalJson({ ...record, signedAt: record.signedAt.toISOString(), form: 'throughbond-signature-1' }));
}

/** Addenda are a chain that begins at the signed content: none can be changed, dropped or put between two others. */
export function addendumHash(record: { caseId: string; number: number; text: string; byId: string; byName: string; at: Date; previousHash: string }): string {
  return sha256(canonicalJson({ ...record, at: record.at.toISOString(), form: 'throughbond-addendum-1' }));
}
