import { createContext, use } from 'react';

import type { CaseResponse } from '@/shared/contracts/cases';
import type { CaseContent } from '@/shared/types/case';

import type { CaseEditor } from './logic/useCaseEditor';

export interface Reader { id: string; name: string; email: string }

/** What each part of the case screen works on, so that no part hands props through another. */
export interface CaseView {
  /** as the server has it, trail and rights included */
  found: CaseResponse;
  /** as it is on screen: the server's, or with what was typed since */
  content: CaseContent;
  editor: CaseEditor;
  /** may the content be changed by this person, in this state? */
  mayEdit: boolean;
  reader: Reader;
  now: Date;
  /** opens a sheet over the case */
  open: (sheet: CaseSheet) => void;
}

/** Every sheet of the case screen; one is open at a time. `key` of a step is the trail's. */
export type CaseSheet =
  | { kind: 'compound' | 'conditions' | 'answer' | 'submit' | 'withdraw' | 'supersede' | 'addend' | 'sign' | 'more' | 'discard' | 'reopen' | 'trail' }
  | { kind: 'reading' | 'candidate' | 'evidence'; id: string | null }
  | { kind: 'calculation'; readingId: string; id: string | null }
  | { kind: 'step'; key: string }
  | { kind: 'query'; stepKey: string | null };

export const CaseContext = createContext<CaseView | null>(null);

export function useCaseView(): CaseView {
  const view = use(CaseContext);
  if (view === null) throw new Error('a part of the case stands outside the case screen');
  return view;
}
