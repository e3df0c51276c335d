import type { FieldError } from '@/shared/contracts/problem';

/** The server's field errors by pointer without its `#/`: `content/readings/0/j` and the sentence to show there. */
export const fieldSentences = (errors: readonly FieldError[]): Record<string, string> =>
  Object.fromEntries(errors.map((error) => [error.pointer.replace(/^#\//, ''), error.detail]));

/** Which part of the case a pointer means, so that a gap leads to the place where it is mended. */
export type Place = 'question' | 'compound' | 'conditions' | 'readings' | 'calculations' | 'candidates' | 'evidence' | 'answer' | 'tags' | null;
const PLACES: readonly Exclude<Place, null>[] = ['question', 'compound', 'conditions', 'readings', 'calculations', 'candidates', 'evidence', 'answer', 'tags'];
export function placeOf(pointer: string): Place {
  const parts = pointer.replace(/^#\//, '').split('/');
  return PLACES.find((place) => parts.includes(place)) ?? null;
}
