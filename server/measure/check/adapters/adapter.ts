import type { Api } from '../../lib/api';
import type { Came } from '../types';

/** Puts `given`, and nothing else, to the product's own API. It is handed nothing else of the check, so it can know no expected answer. */
export type Adapter = (given: Record<string, unknown>, api: Api) => Promise<Came>;

export const notCovered = (reason: string): Came => ({ kind: 'not-covered', reason });

/** A key that the adapter doesn't know may change the question; it is then not answered rather than answered wrongly. */
export function unknownKey(given: Record<string, unknown>, known: readonly string[]): string | undefined {
  return Object.keys(given).find((key) => !known.includes(key));
}
