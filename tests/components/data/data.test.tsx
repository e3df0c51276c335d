import { problemFrom, offlineProblem, ApiProblem } from '@/components/data/problems';
import { shouldRetry } from '@/components/data/queryClient';
import { isSession } from '@/components/data/session';
import { findRelation } from '@/components/data/relations';
import { sessionResponse } from '@/shared/contracts/session';
import type { RelationSummary } from '@/shared/contracts/relations';

const user = {
  id: '0190a3f2-3b7c-7c51-9d0a-5d1f3a9c2b10', name: 'Mira Adeyemi', email: 'mira@demo.example', siteRole: 'member', isDemo: true,
  projects: [{ id: '0190a3f2-3b7c-7c51-9d0a-5d1f3a9c2b11', key: 'HAZ', name: 'Hazel route B', role: 'chemist', guestUntil: null }],
};
const signedIn = { user, reviewsWaiting: 2, demo: { accounts: [{ email: 'mira@demo.example', name: 'Mira Adeyemi', role: 'chemist' }], password: 'demo-password', mailbox: true } };
const signedOut = { user: null, reviewsWaiting: 0, demo: null };

describe('the hand-held guard of the session', () => {
  it.each([['signed in', signedIn], ['signed out', signedOut]])('takes what the contract takes: %s', (_name, session) => {
    expect(sessionResponse.safeParse(session).success).toBe(true);
    expect(isSession(session)).toBe(true);
  });

  it.each([
    ['nothing', null], ['a text', 'signed in'], ['no count', { user: null, demo: null }], ['a person without a name', { ...signedIn, user: { ...user, name: undefined } }],
    ['a project without a role', { ...signedIn, user: { ...user, projects: [{ ...user.projects[0], role: 7 }] } }], ['a demo without accounts', { ...signedOut, demo: { password: 'x', mailbox: true } }],
  ])('refuses what the contract refuses: %s', (_name, session) => {
    expect(sessionResponse.safeParse(session).success).toBe(false);
    expect(isSession(session)).toBe(false);
  });
});

describe('a problem', () => {
  const body = {
    type: '/problems/invalid-input', title: 'Some fields need attention', status: 422, detail: 'Check the marked fields.', requestId: 'r-1',
    errors: [{ pointer: '#/j', detail: '0 Hz is no measured splitting.', code: 'zero', mends: [{ label: 'Use < 1 Hz', field: 'j', value: '< 1' }] }],
  };
  it('is read with its fields and mends', () => {
    const problem = problemFrom(422, body);
    expect(problem.is('invalid-input')).toBe(true);
    expect(problem.field('j')?.mends).toEqual([{ label: 'Use < 1 Hz', field: 'j', value: '< 1' }]);
    expect(problem.field('se')).toBeUndefined();
  });

  it.each([['a page of a proxy', '<html>'], ['nothing', null], ['another shape', { error: 'x' }], ['a list', []]])('stands for an answer that is not one of ours: %s', (_name, other) => {
    const problem = problemFrom(502, other);
    expect(problem.is('unreadable-answer')).toBe(true);
    expect(problem.detail).not.toBe('');
  });

  it('drops what is not readable in a list of errors and keeps the rest', () => {
    expect(problemFrom(422, { ...body, errors: ['x', null, { pointer: '#/se', detail: 'Too small.' }] }).errors).toEqual([{ pointer: '#/se', detail: 'Too small.', code: undefined, mends: undefined }]);
  });

  it('is asked again only when asking again may help', () => {
    expect(shouldRetry(0, offlineProblem())).toBe(true);
    expect(shouldRetry(2, offlineProblem())).toBe(false);
    expect(shouldRetry(0, problemFrom(422, body))).toBe(false);
    expect(shouldRetry(0, new ApiProblem({ ...body, status: 503 }))).toBe(true);
  });
});

describe('finding a relation', () => {
  const make = (version: number, status: RelationSummary['status']) => ({ id: 'vicinal-hh/x', version, status }) as RelationSummary;
  const held = [make(1, 'superseded'), make(2, 'superseded'), make(3, 'current'), make(4, 'doubtful')];
  it('takes the current version unless one is named', () => {
    expect(findRelation(held, 'vicinal-hh/x')?.version).toBe(3);
    expect(findRelation(held, 'vicinal-hh/x@1')?.version).toBe(1);
    expect(findRelation(held, 'vicinal-hh/x@9')).toBeUndefined();
    expect(findRelation(held, 'vicinal-hh/y')).toBeUndefined();
  });
});
