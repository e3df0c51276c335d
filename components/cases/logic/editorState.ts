import type { CaseContent } from '@/shared/types/case';

import { merge, same } from './versions';

/**
 * How a case is edited while the server may be slow, away, or changed by someone else. Pure: the hook around it
 * (`useCaseEditor`) does the timers, the requests and the storage. Nothing that was typed ever leaves `content`
 * but by the person's own choice in a conflict, and even then the version not chosen is in the history.
 */
export interface Saved {
  version: number;
  revision: number;
  content: CaseContent;
  changedBy: string;
  changedAt: string;
}

/** What is kept on the device, written at each change. */
export interface Draft {
  format: 1;
  /** the version the person began with; three versions make an honest comparison */
  base: Saved;
  content: CaseContent;
  reason: string;
  /** device time in ms since 1970: for display only */
  at: number;
}

export type EditorStatus =
  /** what is on screen is on the server */
  | 'same'
  /** typed, not sent yet */
  | 'waiting'
  | 'saving'
  /** no answer from the server; tried again by itself */
  | 'offline'
  /** the session ended; sent after signing in again */
  | 'signed-out'
  /** someone else saved in between */
  | 'conflict'
  /** the server named a field that it cannot take, or the case may not be edited now */
  | 'refused';

export interface EditorState {
  base: Saved;
  content: CaseContent;
  reason: string;
  /** the case was in review once: a save says why */
  needsReason: boolean;
  status: EditorStatus;
  /** what the request on its way carries */
  sending: CaseContent | null;
  theirs: Saved | null;
  problem: { sentence: string; fields: Record<string, string> } | null;
}

export type EditorEvent =
  | { kind: 'edited'; content: CaseContent }
  | { kind: 'reason'; reason: string }
  | { kind: 'sending' }
  | { kind: 'saved'; saved: Saved; needsReason: boolean }
  | { kind: 'failed'; why: 'offline' | 'signed-out' }
  | { kind: 'failed'; why: 'refused'; sentence: string; fields: Record<string, string> }
  /** the server's present version came in: after a conflict, a refetch, or another act on the case */
  | { kind: 'refreshed'; saved: Saved; needsReason: boolean }
  | { kind: 'again' }
  | { kind: 'chosen'; content: CaseContent }
  | { kind: 'discarded' };

/** Opening a case, with what this device may still hold of it. */
export function openEditor(saved: Saved, needsReason: boolean, draft: Draft | null): EditorState {
  const fresh: EditorState = { base: saved, content: saved.content, reason: '', needsReason, status: 'same', sending: null, theirs: null, problem: null };
  if (draft === null || same(draft.content, draft.base.content) || same(draft.content, saved.content)) return fresh;
  const open = { ...fresh, base: draft.base, content: draft.content, reason: draft.reason, status: 'waiting' as const };
  return meet(open, saved);
}

export const isDirty = (state: EditorState): boolean => !same(state.content, state.base.content);

/** May the loop send now? A missing reason holds the save back, never the typing. */
export const maySend = (state: EditorState): boolean =>
  state.status === 'waiting' && isDirty(state) && !lacksReason(state);
export const lacksReason = (state: EditorState): boolean => state.needsReason && state.reason.trim() === '' && isDirty(state);

export function editorReducer(state: EditorState, event: EditorEvent): EditorState {
  switch (event.kind) {
    case 'edited': return settle({ ...state, content: event.content, problem: null }, state.status === 'refused' ? 'waiting' : state.status);
    case 'reason': return { ...state, reason: event.reason };
    case 'sending': return { ...state, status: 'saving', sending: state.content };
    case 'saved': {
      const sent = state.sending ?? state.content;
      // typed while the request was on its way: kept on top of what the server made of the rest
      const content = same(state.content, sent) ? event.saved.content : merge(sent, state.content, event.saved.content);
      return settle({ ...state, base: event.saved, content, needsReason: event.needsReason, sending: null, theirs: null, problem: null }, 'waiting');
    }
    case 'failed': {
      if (event.why !== 'refused') return { ...state, status: event.why, sending: null };
      return { ...state, status: 'refused', sending: null, problem: { sentence: event.sentence, fields: event.fields } };
    }
    case 'refreshed': return state.status === 'saving' ? state : meet({ ...state, needsReason: event.needsReason }, event.saved);
    case 'again': return settle({ ...state, problem: null }, 'waiting');
    case 'chosen': {
      if (state.theirs === null) return state;
      return settle({ ...state, base: state.theirs, content: event.content, theirs: null, problem: null }, 'waiting');
    }
    case 'discarded': {
      const base = state.theirs ?? state.base;
      return { ...state, base, content: base.content, reason: '', status: 'same', sending: null, theirs: null, problem: null };
    }
  }
}

/** My edit meets the version that is on the server now. */
function meet(state: EditorState, saved: Saved): EditorState {
  if (saved.version < state.base.version) return state;                       // an older answer that came late
  if (!isDirty(state)) return settle({ ...state, base: saved, content: saved.content, theirs: null }, 'waiting');
  // only the count moved on (a claim, a comment); the server has answered, so there is nothing left to wait for
  if (same(saved.content, state.base.content)) return settle({ ...state, base: saved, theirs: null }, state.status === 'refused' ? 'refused' : 'waiting');
  if (same(saved.content, state.content)) return settle({ ...state, base: saved, content: saved.content, theirs: null }, 'waiting');
  return { ...state, status: 'conflict', sending: null, theirs: saved };
}

/** 'same' when nothing differs from the server; else the status given. A conflict stays one until it is chosen. */
function settle(state: EditorState, otherwise: EditorStatus): EditorState {
  if (state.theirs !== null) return { ...state, status: 'conflict' };
  if (state.sending !== null) return { ...state, status: 'saving' };
  if (!isDirty(state)) return { ...state, status: 'same' };
  return { ...state, status: otherwise === 'same' || otherwise === 'conflict' ? 'waiting' : otherwise };
}

export const draftOf = (state: EditorState, at: number): Draft => ({ format: 1, base: state.base, content: state.content, reason: state.reason, at });
