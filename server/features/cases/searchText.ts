import { compoundWords } from './words';

const PREFIX = 'q';

/**
 * What the full-text index holds for a case: every word and every ending of it, each behind a letter of our own.
 * A search for the beginning of an ending finds any part of a word ("pyranol" in "tetrahydropyranol"), and the letter keeps
 * parts of one or two characters above the index's shortest word. So one index answers, at any size of the log.
 */
export function searchText(parts: readonly string[]): string {
  const found = new Set<string>();
  for (const word of compoundWords(parts.join(' '))) {
    const characters = [...word].slice(0, 60);
    for (let start = 0; start < characters.length; start += 1) found.add(PREFIX + characters.slice(start).join(''));
  }
  return ` ${[...found].join(' ')}`;
}

/** The same for what somebody looks for: every word must occur, in any place. Null when nothing to look for is left. */
export function searchQuery(typed: string): string | null {
  const words = compoundWords(typed).slice(0, 12);
  return words.length === 0 ? null : words.map((word) => `+${PREFIX}${[...word].slice(0, 60).join('')}*`).join(' ');
}

/** The same question for a plain look into the stored text, word by word: patterns for LIKE. [] when nothing to look for is left. */
export const searchPatterns = (typed: string): string[] =>
  compoundWords(typed).slice(0, 12).map((word) => `% ${PREFIX}${[...word].slice(0, 60).join('')}%`);
