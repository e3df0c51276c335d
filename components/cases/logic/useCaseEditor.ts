import { useCallback, useEffect, useLayoutEffect, useMemo, useReducer, useRef, useState } from 'react';

import { useConnection } from '@/components/data/connection';
import { dropDraft, readDraft, writeDraft } from '@/components/data/drafts';
import { ApiProblem } from '@/components/data/problems';
import type { CaseResponse, SaveCaseRequest } from '@/shared/contracts/cases';
import type { CaseContent } from '@/shared/types/case';

import { draftOf, editorReducer, isDirty, lacksReason, maySend, openEditor, type Draft, type EditorState, type Saved } from './editorState';
import { fieldSentences } from './fieldSentences';
import { same } from './versions';

/** How long typing may rest before it is sent, and how long an unreachable server is left alone. */
const REST_MS = 1200;
const RETRY_MS = 10_000;

export const savedOf = (found: CaseResponse): Saved => ({
  version: found.version, revision: found.revision, content: found.content, changedBy: found.changedBy.name, changedAt: found.changedAt,
});
/** Once a case was sent to review, every later save says why. */
export const asksReason = (found: CaseResponse): boolean => found.review.submittedAt !== null || found.signatures.length > 0;
export const draftKey = (caseId: string): string => `case.${caseId}`;

export interface CaseEditor {
  state: EditorState;
  content: CaseContent;
  edit: (change: (content: CaseContent) => CaseContent) => void;
  /** a removal: taken back by `undo` until the next change, in place of "are you sure" */
  remove: (name: string, change: (content: CaseContent) => CaseContent) => void;
  removed: { name: string; undo: () => void } | null;
  setReason: (reason: string) => void;
  again: () => void;
  choose: (content: CaseContent) => void;
  discard: () => void;
  isDirty: boolean;
  lacksReason: boolean;
  /** false when this browser keeps nothing: the promise on screen changes */
  isKept: boolean;
}

/**
 * Edits of one case: on the device at once, on the server a moment after the last change, by themselves again when the
 * server or the session comes back. `reader` is the person who types; it stays the same while the session is out.
 */
export function useCaseEditor({ found, reader, isSignedIn, mayEdit, save, refetch }: {
  found: CaseResponse; reader: string; isSignedIn: boolean; mayEdit: boolean; save: (request: SaveCaseRequest) => Promise<CaseResponse>; refetch: () => void;
}): CaseEditor {
  const [state, dispatch] = useReducer(editorReducer, null, () => openEditor(savedOf(found), asksReason(found), readDraft(reader, draftKey(found.id), isDraft)));
  const [isKept, setKept] = useState(true);
  const connectionWas = useRef(true);
  const latest = useRef(state);
  const outside = useRef({ save, refetch, mayEdit });
  useLayoutEffect(() => { latest.current = state; }, [state]);
  useLayoutEffect(() => { outside.current = { save, refetch, mayEdit }; });

  // what other acts on the case (a claim, a comment, a colleague's save) brought in
  useEffect(() => { dispatch({ kind: 'refreshed', saved: savedOf(found), needsReason: asksReason(found) }); }, [found]);

  useEffect(() => {
    if (!isDirty(state)) dropDraft(reader, draftKey(found.id));
    else setKept(writeDraft(reader, draftKey(found.id), draftOf(state, Date.now())));
  }, [state, reader, found.id]);

  const send = useCallback(() => {
    const { base, content, reason, needsReason } = latest.current;
    dispatch({ kind: 'sending' });
    outside.current.save({ seenVersion: base.version, content, ...(needsReason ? { reason: reason.trim() } : {}) }).then(
      (saved) => {
        // also when the screen has been left meanwhile: nothing newer is on the device, so nothing is to be offered again
        if (same(latest.current.content, content)) dropDraft(reader, draftKey(saved.id));
        dispatch({ kind: 'saved', saved: savedOf(saved), needsReason: asksReason(saved) });
      },
      (problem: unknown) => {
        const told = problem instanceof ApiProblem ? problem : null;
        if (told?.is('changed-meanwhile')) { dispatch({ kind: 'failed', why: 'offline' }); outside.current.refetch(); return; }
        if (told?.is('not-signed-in')) { dispatch({ kind: 'failed', why: 'signed-out' }); return; }
        // a server that is away, overloaded or restarting has refused nothing: the change waits and is tried again
        if (told === null || told.is('offline') || told.is('unavailable') || told.is('unreadable-answer') || told.is('internal') || told.is('too-many-tries')) { dispatch({ kind: 'failed', why: 'offline' }); return; }
        dispatch({ kind: 'failed', why: 'refused', sentence: told.body.detail, fields: fieldSentences(told.body.errors ?? []) });
      },
    );
  }, [reader]);

  // a draft found on the device after the case went to review waits for the person; it is not sent into a refusal
  const ready = maySend(state) && mayEdit;
  useEffect(() => {
    if (!ready) return;
    const timer = setTimeout(send, REST_MS);
    return () => clearTimeout(timer);
  }, [ready, state.content, state.reason, send]);

  const isAway = state.status === 'offline';
  const isReached = useConnection().state !== 'offline';
  useEffect(() => {
    if (!isAway) return;
    const again = () => dispatch({ kind: 'again' });
    // the shell asks for the server's health every few seconds; its answer is the sign, the timer is for a server that answers but fails
    if (isReached && connectionWas.current === false) again();
    const timer = setInterval(again, RETRY_MS);
    return () => clearInterval(timer);
  }, [isAway, isReached]);
  useEffect(() => { connectionWas.current = isReached; }, [isReached]);

  const waitsForSession = state.status === 'signed-out' && isSignedIn;
  useEffect(() => { if (waitsForSession) dispatch({ kind: 'again' }); }, [waitsForSession]);

  // leaving the screen does not wait for the rest: the request goes out, and the draft stays until it is answered
  useEffect(() => () => { if (outside.current.mayEdit && maySend(latest.current)) send(); }, [send]);

  const edit = useCallback((change: (content: CaseContent) => CaseContent) => {
    const next = change(latest.current.content);
    latest.current = { ...latest.current, content: next };          // two edits in one turn build on each other
    dispatch({ kind: 'edited', content: next });
  }, []);

  const [removed, setRemoved] = useState<{ name: string; before: CaseContent; after: CaseContent } | null>(null);
  const remove = useCallback((name: string, change: (content: CaseContent) => CaseContent) => {
    const before = latest.current.content;
    edit(change);
    setRemoved({ name, before, after: latest.current.content });
  }, [edit]);
  // a removal can be taken back only while nothing else has changed since
  const undoable = removed !== null && same(removed.after, state.content) ? removed : null;

  return useMemo(() => ({
    state, content: state.content, edit, remove, isKept,
    removed: undoable === null ? null : { name: undoable.name, undo: () => { edit(() => undoable.before); setRemoved(null); } },
    setReason: (reason: string) => dispatch({ kind: 'reason', reason }),
    again: () => dispatch({ kind: 'again' }),
    choose: (content: CaseContent) => dispatch({ kind: 'chosen', content }),
    discard: () => dispatch({ kind: 'discarded' }),
    isDirty: isDirty(state), lacksReason: lacksReason(state),
  }), [state, edit, remove, undoable, isKept]);
}

/** Enough of a shape to be shown: the server checks the rest, and what it refuses is named in place. */
export function isDraft(value: unknown): value is Draft {
  if (typeof value !== 'object' || value === null) return false;
  const draft = value as Partial<Draft>;
  const isContent = (content: unknown): boolean => typeof content === 'object' && content !== null && (content as CaseContent).format === 1
    && Array.isArray((content as CaseContent).readings) && Array.isArray((content as CaseContent).candidates);
  return draft.format === 1 && typeof draft.at === 'number' && isContent(draft.content) && isContent(draft.base?.content);
}
