import { act, renderHook } from '@testing-library/react';

import { isDraft } from '@/components/cases/logic/useCaseEditor';
import { draftKeys, dropDraft, readDraft, useKeptText, wipeDrafts, writeDraft } from '@/components/data/drafts';
import { useKeptForm } from '@/components/forms/useKeptForm';

import { content } from './contents';

const isText = (value: unknown): value is string => typeof value === 'string';
beforeEach(() => window.localStorage.clear());

describe('what this device keeps', () => {
  it('belongs to one person and one case', () => {
    writeDraft('anna', 'case.1', 'hers');
    writeDraft('ben', 'case.1', 'his');
    expect(readDraft('anna', 'case.1', isText)).toBe('hers');
    expect(readDraft('ben', 'case.2', isText)).toBeNull();
    expect(draftKeys('anna')).toEqual(['case.1']);
    dropDraft('anna', 'case.1');
    expect(draftKeys('anna')).toEqual([]);
  });

  it('is wiped whole at sign-out, and nothing but drafts is', () => {
    writeDraft('anna', 'case.1', 'hers');
    writeDraft('ben', 'text.1', 'his');
    window.localStorage.setItem('throughbond.theme', 'dark');
    wipeDrafts();
    expect(Object.keys(window.localStorage)).toEqual(['throughbond.theme']);
  });

  it('counts a draft that was cut short or is of another shape as none', () => {
    window.localStorage.setItem('tb.draft.anna.case.1', '{"format":1,"content":');
    expect(readDraft('anna', 'case.1', isDraft)).toBeNull();
    writeDraft('anna', 'case.1', { format: 1, content: { format: 2 }, base: {}, at: 0 });
    expect(readDraft('anna', 'case.1', isDraft)).toBeNull();
    const base = { version: 1, revision: 1, content: content(), changedBy: 'A', changedAt: '2026-12-01T00:00:00.000Z' };
    writeDraft('anna', 'case.1', { format: 1, content: content(), base, reason: '', at: 0 });
    expect(readDraft('anna', 'case.1', isDraft)?.content.question).toBe(content().question);
  });

  it('says so when nothing can be kept', () => {
    const full = jest.spyOn(Storage.prototype, 'setItem').mockImplementation(() => { throw new DOMException('full', 'QuotaExceededError'); });
    expect(writeDraft('anna', 'case.1', 'words')).toBe(false);
    full.mockRestore();
  });

  it('keeps a half-typed comment through a reload and through the end of the session', () => {
    const first = renderHook<ReturnType<typeof useKeptText>, { user: string | null }>(({ user }) => useKeptText(user, 'text.c1'), { initialProps: { user: 'anna' } });
    act(() => first.result.current.setText('half a sen'));
    first.rerender({ user: null });
    expect(first.result.current.text).toBe('half a sen');
    first.unmount();
    const again = renderHook(() => useKeptText('anna', 'text.c1'));
    expect(again.result.current.text).toBe('half a sen');
    act(() => again.result.current.clear());
    expect(draftKeys('anna')).toEqual([]);
  });

  it('takes from a kept form only what the form still has', () => {
    writeDraft('anna', 'form', { j: '8.', gone: 'x', count: 'not a number', candidateId: 'c1' });
    const none: string | null = null;
    const { result } = renderHook(() => useKeptForm('anna', 'form', { j: '', count: 3, candidateId: none }));
    expect(result.current.form).toEqual({ j: '8.', count: 3, candidateId: 'c1' });
    expect(result.current.wasKept).toBe(true);
    act(() => result.current.drop());
    expect(draftKeys('anna')).toEqual([]);
  });
});
