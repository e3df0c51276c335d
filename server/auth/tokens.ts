import { createHash, randomBytes } from 'node:crypto';

/** A secret for one link: 256 random bits for the mail, its hash for the table. */
export function newToken(): { token: string; hash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, hash: tokenHash(token) };
}

/** No salt needed: the token itself is random, so nobody can guess it from a table of hashes. */
export const tokenHash = (token: string): string => createHash('sha256').update(token).digest('hex');
