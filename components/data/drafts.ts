import { useCallback, useEffect, useRef, useState } from 'react';

/**
 * What is kept on this device until the server has it. Keyed by person and case, so that two people on one bench
 * computer never see each other's half-typed words; wiped at sign-out. Storage may be full or switched off: then
 * `kept` is false and the screen says so, because a promise to keep must not be made silently.
 */
const PREFIX = 'tb.draft.';

const storage = (): Storage | null => {
  try { return globalThis.localStorage ?? null; } catch { return null; }     // a browser may throw on the mere access
};

export function writeDraft(userId: string, key: string, value: unknown): boolean {
  try {
    storage()?.setItem(`${PREFIX}${userId}.${key}`, JSON.stringify(value));
    return storage() !== null;
  } catch { return false; }
}

/** The stored value when `isValid` accepts it; anything else (older format, cut short) counts as nothing kept. */
export function readDraft<T>(userId: string, key: string, isValid: (value: unknown) => value is T): T | null {
  try {
    const text = storage()?.getItem(`${PREFIX}${userId}.${key}`) ?? null;
    const value: unknown = text === null ? null : JSON.parse(text);
    return isValid(value) ? value : null;
  } catch { return null; }
}

export function dropDraft(userId: string, key: string): void {
  try { storage()?.removeItem(`${PREFIX}${userId}.${key}`); } catch { /* nothing was kept, so nothing is left */ }
}

/** Keys (without prefix and person) of all that this device keeps for a person. */
export function draftKeys(userId: string): string[] {
  const own = `${PREFIX}${userId}.`;
  try {
    const held = storage();
    if (held === null) return [];
    return Array.from({ length: held.length }, (_, i) => held.key(i) ?? '').filter((key) => key.startsWith(own)).map((key) => key.slice(own.length));
  } catch { return []; }
}

/** At sign-out: nothing of anybody's work stays on the device. */
export function wipeDrafts(): void {
  try {
    const held = storage();
    if (held === null) return;
    const keys = Array.from({ length: held.length }, (_, i) => held.key(i) ?? '').filter((key) => key.startsWith(PREFIX));
    for (const key of keys) held.removeItem(key);
  } catch { /* storage that cannot be read holds nothing of ours */ }
}

const isText = (value: unknown): value is string => typeof value === 'string';

/** A text field that survives a reload, a lost session and a closed sheet; cleared once its text has been sent. */
export function useKeptText(userId: string | null, key: string): { text: string; setText: (text: string) => void; clear: () => void } {
  const place = useRef({ userId, key });
  const [text, setTyped] = useState(() => (userId === null ? '' : readDraft(userId, key, isText) ?? ''));
  useEffect(() => {
    const was = place.current;
    // nobody signed in may mean that the session ran out in mid-sentence: what stands in the field stays there
    if (userId === null || (was.userId === userId && was.key === key)) return;
    place.current = { userId, key };
    const kept = readDraft(userId, key, isText);
    setTyped((typed) => kept ?? (was.userId === null && was.key === key ? typed : ''));
  }, [userId, key]);
  const setText = useCallback((typed: string) => {
    setTyped(typed);
    if (userId === null) return;
    if (typed === '') dropDraft(userId, key); else writeDraft(userId, key, typed);
  }, [userId, key]);
  const clear = useCallback(() => setText(''), [setText]);
  return { text, setText, clear };
}
