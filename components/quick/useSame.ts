import { useMemo } from 'react';

import type { FieldError } from '@/shared/contracts/problem';
import type { InputNote } from '@/shared/types/reading';

import { sayings, type SayOf } from './ReadingCard';

/** The same object as long as its content is the same: a new answer that says the same of a card draws the card no second time. */
export function useSame<Value>(value: Value): Value {
  const key = JSON.stringify(value);
  return useMemo(() => JSON.parse(key) as Value, [key]);
}

/** What stands under each field, the same function while the sentences are the same. */
export function useSayings(errors: readonly FieldError[], notes: readonly InputNote[], setField: (field: string, value: string) => void): SayOf {
  const said = useSame({ errors, notes });
  return useMemo(() => sayings(said.errors, said.notes, setField), [said, setField]);
}
