import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';

import type { CaseSheet } from '@/components/cases/caseContext';
import { FactsCard } from '@/components/cases/parts/FactsCard';
import { ReadingSheet } from '@/components/cases/sheets/ReadingSheet';
import { ReviewCard } from '@/components/reviews/ReviewCard';
import { SignSheet } from '@/components/reviews/SignSheet';
import type { CaseContent } from '@/shared/types/case';

import { caseAnswer, inCase } from './caseFixture';

jest.mock('expo-router', () => ({ router: {}, usePathname: () => '/' }));
jest.setTimeout(30_000);                       // typing key by key is slow on two busy cores
const requests: { path: string; body: unknown }[] = [];
/** Plays the server: every request is written down and answered. */
function answer(status: number, body: unknown) {
  globalThis.fetch = ((path: string, init: RequestInit) => {
    requests.push({ path, body: JSON.parse(typeof init.body === 'string' ? init.body : 'null') });
    return Promise.resolve({ ok: status < 400, status, text: () => Promise.resolve(JSON.stringify(body)) });
  }) as unknown as typeof fetch;
}
beforeEach(() => { requests.length = 0; window.localStorage.clear(); });

describe('signing', () => {
  it('is never one tap: it asks the password, and says so at its field', async () => {
    answer(200, caseAnswer());
    render(inCase(<SignSheet onClose={() => undefined} />, caseAnswer({}, { sign: true })));
    await userEvent.click(screen.getByRole('button', { name: 'Sign as Rafe Okonjo' }));
    expect(screen.getByText('Type your password.')).toBeTruthy();
    expect(requests).toEqual([]);
  });

  it('binds to the version and the hash that were on screen, with the meaning chosen', async () => {
    const found = caseAnswer({}, { sign: true });
    answer(200, { ...found, state: 'signed' });
    const closed = jest.fn();
    render(inCase(<SignSheet onClose={closed} />, found));
    expect(screen.getByText(/7c41 e09b 52d8/)).toBeTruthy();
    await userEvent.click(screen.getByRole('radio', { name: /Approval/ }));
    await userEvent.type(screen.getByLabelText('Password of rafe.okonjo@hazel.example'), 'a long sentence');
    await userEvent.click(screen.getByRole('button', { name: 'Sign as Rafe Okonjo' }));
    await waitFor(() => expect(closed).toHaveBeenCalled());
    expect(requests).toEqual([{ path: `/api/cases/${found.id}/sign`, body: { seenVersion: 4, contentHash: found.contentHash, meaning: 'approval', password: 'a long sentence' } }]);
  });

  it('shows a refused password at the field and forgets what was typed there', async () => {
    answer(422, { type: '/problems/invalid-input', title: 'x', status: 422, detail: 'Check the fields.', errors: [{ pointer: '#/password', detail: 'That is not your password. Nothing was signed.' }] });
    const closed = jest.fn();
    render(inCase(<SignSheet onClose={closed} />, caseAnswer({}, { sign: true })));
    const field = screen.getByLabelText('Password of rafe.okonjo@hazel.example');
    await userEvent.type(field, 'wrong{Enter}');
    expect(await screen.findByText('That is not your password. Nothing was signed.')).toBeTruthy();
    expect((field as HTMLInputElement).value).toBe('');
    expect(closed).not.toHaveBeenCalled();
  });
});

describe('what may be done and why not', () => {
  it('shows the sentence beside a signature that is not open yet', () => {
    render(inCase(<ReviewCard />, caseAnswer({}, { check: true, query: true, why: { sign: 'Sign opens when query 1 is closed.' } })));
    expect(screen.getByText('Sign opens when query 1 is closed.')).toBeTruthy();
    expect(screen.getByRole('button', { name: /^Sign/ }).getAttribute('aria-disabled')).toBe('true');
  });

  it('offers an author neither the claim nor the signature, and says why', () => {
    const found = caseAnswer({}, { why: { claim: 'You are the author: someone else reviews this case.', sign: 'You are the author: someone else reviews this case.' } });
    render(inCase(<ReviewCard />, found, { reader: found.author }));
    expect(screen.queryByRole('button', { name: /^Sign/ })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Take this case' })).toBeNull();
    expect(screen.getByText('You are the author: someone else reviews this case.')).toBeTruthy();
  });

  it('sends a check with the revision that was looked at', async () => {
    const found = caseAnswer({}, { check: true });
    answer(200, found);
    render(inCase(<ReviewCard />, found));
    await userEvent.click(screen.getByRole('button', { name: /^Check, Readings and pairs/ }));
    await waitFor(() => expect(requests).toEqual([{ path: `/api/cases/${found.id}/checks`, body: { step: 'reciprocity', checked: true, revision: 4 } }]));
  });

  it('puts what was not tested before a reviewer\u2019s eyes', () => {
    render(inCase(<FactsCard />, caseAnswer()));
    expect(screen.getByText('twist form')).toBeTruthy();
  });
});

describe('typing readings', () => {
  it('keeps one with Enter and goes on with the next, the atoms running on', async () => {
    const edits: CaseContent[] = [];
    const opened: CaseSheet[] = [];
    const closed = jest.fn();
    render(inCase(<ReadingSheet id={null} onClose={closed} />, caseAnswer(), { edits, opened, mayEdit: true }));
    await userEvent.type(screen.getByLabelText('First atom'), 'H4');
    await userEvent.tab();
    await userEvent.keyboard('H5');
    await userEvent.tab();
    await userEvent.keyboard('7.60{Enter}');
    expect(edits.at(-1)!.readings.at(-1)).toMatchObject({ atomA: 'H4', atomB: 'H5', j: '7.60' });       // digits as typed
    expect(closed).not.toHaveBeenCalled();
    expect(screen.getByLabelText<HTMLInputElement>('First atom').value).toBe('H5');
  });

  it('names what cannot be read at its field, offers the mend, and keeps it as typed only when told', async () => {
    const edits: CaseContent[] = [];
    render(inCase(<ReadingSheet id={null} onClose={() => undefined} />, caseAnswer(), { edits, mayEdit: true }));
    await userEvent.type(screen.getByLabelText('First atom'), 'H4');
    await userEvent.type(screen.getByLabelText('Second atom'), 'H5');
    await userEvent.type(screen.getByLabelText('J in hertz'), '0.0178{Enter}');
    expect(edits).toEqual([]);
    expect(screen.getByText(/1 field to mend/)).toBeTruthy();
    await userEvent.click(screen.getByRole('button', { name: /^Use 8\.9/ }));
    expect(screen.getByLabelText<HTMLInputElement>('J in hertz').value).toBe('8.9');
    await userEvent.click(screen.getByRole('button', { name: 'Save reading' }));
    expect(edits.at(-1)!.readings.at(-1)!.j).toBe('8.9');
  });
});
