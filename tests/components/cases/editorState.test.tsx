import { putReading } from '@/components/cases/logic/edits';
import { draftOf, editorReducer, isDirty, lacksReason, maySend, openEditor, type EditorEvent, type EditorState, type Saved } from '@/components/cases/logic/editorState';
import type { CaseContent } from '@/shared/types/case';

import { content, reading } from './contents';

const saved = (version: number, of: CaseContent, by = 'T. Brandt'): Saved => ({ version, revision: version, content: of, changedBy: by, changedAt: '2026-12-01T14:06:00.000Z' });
const run = (state: EditorState, ...events: EditorEvent[]) => events.reduce(editorReducer, state);
const base = content();
const typed = { ...base, question: 'Enol ether 5, second batch: E or Z?' };
const theirs = { ...base, conditions: { ...base.conditions, solvent: 'C6D6' } };
const open = () => openEditor(saved(2, base), false, null);

describe('editing a case', () => {
  it('sends what was typed, and is at rest when the server has it', () => {
    const waiting = run(open(), { kind: 'edited', content: typed });
    expect(maySend(waiting)).toBe(true);
    const done = run(waiting, { kind: 'sending' }, { kind: 'saved', saved: saved(3, typed), needsReason: false });
    expect(done.status).toBe('same');
    expect(isDirty(done)).toBe(false);
  });

  it('is at rest again when a change is taken back', () => {
    expect(run(open(), { kind: 'edited', content: typed }, { kind: 'edited', content: base }).status).toBe('same');
  });

  it('keeps what is typed while a save is on its way, on top of what the server made of the rest', () => {
    const later = putReading(typed, reading('r3', { j: '2.1' }));
    const cleaned = { ...typed, question: typed.question.trim() };
    const state = run(open(), { kind: 'edited', content: typed }, { kind: 'sending' }, { kind: 'edited', content: later }, { kind: 'saved', saved: saved(3, cleaned), needsReason: false });
    expect(state.status).toBe('waiting');
    expect(state.content.readings.map((row) => row.id)).toEqual(['r1', 'r2', 'r3']);
    expect(state.base.version).toBe(3);
  });

  it('keeps the words through a lost connection and a lost session', () => {
    for (const why of ['offline', 'signed-out'] as const) {
      const state = run(open(), { kind: 'edited', content: typed }, { kind: 'sending' }, { kind: 'failed', why });
      expect(state.status).toBe(why);
      expect(state.content).toEqual(typed);
      expect(maySend(run(state, { kind: 'again' }))).toBe(true);
    }
  });

  it('shows both versions when someone else saved, and loses neither', () => {
    const state = run(open(), { kind: 'edited', content: typed }, { kind: 'refreshed', saved: saved(3, theirs), needsReason: false });
    expect(state.status).toBe('conflict');
    expect(state.content).toEqual(typed);
    expect(state.theirs?.content).toEqual(theirs);
    expect(maySend(state)).toBe(false);
    const chosen = run(state, { kind: 'chosen', content: { ...theirs, question: typed.question } });
    expect(chosen).toMatchObject({ status: 'waiting', theirs: null, base: { version: 3 } });
    expect(maySend(chosen)).toBe(true);
  });

  it('asks again when a third version arrives during the choice', () => {
    const state = run(open(), { kind: 'edited', content: typed }, { kind: 'refreshed', saved: saved(3, theirs), needsReason: false });
    const third = { ...theirs, question: 'Theirs again' };
    expect(run(state, { kind: 'refreshed', saved: saved(4, third), needsReason: false })).toMatchObject({ status: 'conflict', theirs: { version: 4 } });
  });

  it('moves on without a question when only the version counted up, or both typed the same', () => {
    const waiting = run(open(), { kind: 'edited', content: typed });
    expect(run(waiting, { kind: 'refreshed', saved: saved(3, base), needsReason: false })).toMatchObject({ status: 'waiting', base: { version: 3 }, content: typed });
    expect(run(waiting, { kind: 'refreshed', saved: saved(3, typed), needsReason: false }).status).toBe('same');
  });

  it('takes the new version at once when nothing was typed here', () => {
    expect(run(open(), { kind: 'refreshed', saved: saved(3, theirs), needsReason: false })).toMatchObject({ status: 'same', content: theirs });
  });

  it('ignores an older answer that comes late', () => {
    const state = openEditor(saved(5, theirs), false, null);
    expect(run(state, { kind: 'refreshed', saved: saved(4, base), needsReason: false }).content).toEqual(theirs);
  });

  it('holds the save back until a reason is given once the case was in review, and keeps it for the burst', () => {
    const state = run(openEditor(saved(2, base), true, null), { kind: 'edited', content: typed });
    expect(lacksReason(state)).toBe(true);
    expect(maySend(state)).toBe(false);
    const told = run(state, { kind: 'reason', reason: 'Read again.' });
    expect(maySend(told)).toBe(true);
    const next = run(told, { kind: 'sending' }, { kind: 'saved', saved: saved(3, typed), needsReason: true }, { kind: 'edited', content: base });
    expect(maySend(next)).toBe(true);
  });

  it('names what the server refused and tries again after the next change only', () => {
    const state = run(open(), { kind: 'edited', content: typed }, { kind: 'sending' }, { kind: 'failed', why: 'refused', sentence: 'At most 200 characters.', fields: { question: 'At most 200 characters.' } });
    expect(maySend(state)).toBe(false);
    expect(state.content).toEqual(typed);
    const mended = run(state, { kind: 'edited', content: { ...typed, question: 'Shorter' } });
    expect(mended.problem).toBeNull();
    expect(maySend(mended)).toBe(true);
  });

  it('opens what this device kept, and compares it when the case has moved on', () => {
    const draft = draftOf(run(open(), { kind: 'edited', content: typed }), 0);
    expect(openEditor(saved(2, base), false, draft)).toMatchObject({ status: 'waiting', content: typed });
    expect(openEditor(saved(3, theirs), false, draft)).toMatchObject({ status: 'conflict', content: typed });
    expect(openEditor(saved(3, typed), false, draft).status).toBe('same');
  });

  it('discards only what is here: the server keeps its version', () => {
    const state = run(open(), { kind: 'edited', content: typed }, { kind: 'refreshed', saved: saved(3, theirs), needsReason: false }, { kind: 'discarded' });
    expect(state).toMatchObject({ status: 'same', content: theirs, theirs: null });
  });
});
