import { useCallback, useState } from 'react';

import { dropDraft, readDraft, writeDraft } from '../data/drafts';

/**
 * A form whose half-typed values survive a closed sheet, a reload and two hours of interruption: kept on the device at each
 * key, dropped when the form is saved or discarded. Keys that the form does not know are ignored, so that an older page's
 * draft cannot break a newer form.
 */
export function useKeptForm<Form extends object>(userId: string, key: string, initial: Form): {
  form: Form; set: (change: Partial<Form>) => void; drop: () => void; wasKept: boolean;
} {
  const [start] = useState(() => ({ form: initial, kept: readDraft(userId, key, isRecord) }));
  const [form, setForm] = useState<Form>(() => (start.kept === null ? initial : { ...initial, ...known(start.kept, initial) }));
  const set = useCallback((change: Partial<Form>) => setForm((before) => {
    const next = { ...before, ...change };
    writeDraft(userId, key, next);
    return next;
  }), [userId, key]);
  const drop = useCallback(() => dropDraft(userId, key), [userId, key]);
  return { form, set, drop, wasKept: start.kept !== null };
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
/** A value of the field's own type; a link to another row (`…Id`) may also be empty. */
const fits = (name: string, value: unknown, initial: unknown): boolean =>
  typeof value === typeof initial && (value !== null || initial === null) || (name.endsWith('Id') && (value === null || typeof value === 'string'));
const known = <Form extends object>(kept: Record<string, unknown>, initial: Form): Partial<Form> =>
  Object.fromEntries(Object.entries(kept).filter(([name, value]) => name in initial && fits(name, value, initial[name as keyof Form]))) as Partial<Form>;
