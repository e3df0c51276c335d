import type { CaseListResponse, CaseResponse, CompareResponse, EventsResponse, RevisionsResponse } from '@/shared/contracts/cases';
import type { ReviewsResponse } from '@/shared/contracts/reviews';
import type { SessionResponse } from '@/shared/contracts/session';
import { answerOf, cinnamate } from '@/tests/helpers/caseContent';
import { checkAll, claim, draft, ok, sign, signedCase, submit } from '@/tests/helpers/caseWork';
import { PASSWORD, testServer, type Client, type TestPerson, type TestServer } from '@/tests/helpers/server';

let server: TestServer;
let mira: TestPerson;
let rafe: TestPerson;
let lena: TestPerson;
let author: Client;
let reviewer: Client;
let lead: Client;
let projectId: string;
beforeAll(async () => {
  server = await testServer();
  [mira, rafe, lena] = await Promise.all([server.person('Mira Adeyemi'), server.person('Rafe Okonjo'), server.person('Lena Brandt')]);
  projectId = await server.project('HAZ', [{ who: mira, role: 'chemist' }, { who: rafe, role: 'reviewer' }, { who: lena, role: 'lead' }]);
  [author, reviewer, lead] = await Promise.all([server.signedIn(mira), server.signedIn(rafe), server.signedIn(lena)]);
});
afterAll(() => server.stop());

const letters = async (): Promise<{ to: string; subject: string }[]> => {
  await server.deps.mail.settled();
  return (await server.database.asOwner('SELECT recipient AS `to`, subject FROM mailbox')) as unknown as { to: string; subject: string }[];
};

it('goes from a quick look to a signed case with its query, and to the case that supersedes it', async () => {
  // one step from a quick look: what was typed there is in the case
  const quickLook = { bond: 'double', j: '15,9', se: '0.2', groups: { left: ['C(=C,C)', 'H'], right: ['C(=O,O)', 'H'] } };
  const opened = ok(await author.post<CaseResponse>('/api/cases', { projectId, quickLook, compoundName: 'Cinnamate 4' }), 201);
  expect(opened).toMatchObject({ code: 'HAZ-0001', state: 'draft', version: 1, revision: 1, author: { name: 'Mira Adeyemi' } });
  expect(opened.content.readings[0]).toMatchObject({ j: '15,9', se: '0.2' });
  expect(opened.content.compound.name).toBe('Cinnamate 4');
  expect(opened.content.candidates).toHaveLength(2);
  expect(opened.trail.calculations[0]?.result.state).toBe('answered');

  // not ready: each gap has its sentence
  const early = await author.post(`/api/cases/${opened.id}/submit`, { seenVersion: 1, password: PASSWORD });
  expect(early.status).toBe(422);
  expect(early.body.errors?.map(({ pointer }) => pointer)).toContain('#/content/answer');

  // digits stay as typed; a corrected name is kept
  const content = cinnamate({ compound: { ...cinnamate().compound, name: 'Cinnamate 5' } });
  const saved = ok(await author.put<CaseResponse>(`/api/cases/${opened.id}`, { seenVersion: 1, content }));
  expect(saved).toMatchObject({ version: 2, revision: 2 });
  expect(saved.content.readings[0]?.j).toBe('15.90');
  expect(saved.content.compound.formerNames).toEqual(['Cinnamate 4']);
  expect(ok(await author.put<CaseResponse>(`/api/cases/${opened.id}`, { seenVersion: 2, content: saved.content })).revision).toBe(2);

  // sent to review: the authorship of this revision is signed, and the reviewers are told
  const unsigned = await author.post(`/api/cases/${opened.id}/submit`, { seenVersion: 2 });
  expect(unsigned.body.errors?.[0]?.pointer).toBe('#/password');
  const sent = await submit(author, saved);
  expect(sent.state).toBe('in-review');
  expect(sent.signatures).toMatchObject([{ meaning: 'authorship', name: 'Mira Adeyemi', revision: 2, contentHash: saved.contentHash }]);
  expect(sent.review.dueOn).toMatch(/^\d{4}-\d\d-\d\d$/);
  expect((await letters()).map(({ to }) => to).sort()).toEqual([lena.email, rafe.email].sort());
  expect((await author.put(`/api/cases/${opened.id}`, { seenVersion: sent.version, content })).body.type).toBe('/problems/wrong-state');

  // the worklist
  expect(ok(await reviewer.get<SessionResponse>('/api/session')).reviewsWaiting).toBe(1);
  expect(ok(await reviewer.get<ReviewsResponse>('/api/reviews')).waiting).toMatchObject([{ code: 'HAZ-0001', checked: 0, checksTotal: 5, readyToSign: false }]);
  expect(ok(await author.get<ReviewsResponse>('/api/reviews'))).toMatchObject({ waiting: [], yourCases: [{ code: 'HAZ-0001' }] });
  const taken = await claim(reviewer, opened.id);
  expect(taken.review.reviewer?.name).toBe('Rafe Okonjo');
  expect(ok(await reviewer.get<ReviewsResponse>('/api/reviews')).heldByYou).toHaveLength(1);

  // a query at a step, its answer with a change, the case sent back
  const asked = ok(await reviewer.post<CaseResponse>(`/api/cases/${opened.id}/queries`, { step: 'domain', stepKey: 'relation:c1', text: 'Is the aryl counted as carbon?' }));
  expect(asked.state).toBe('queried');
  const [query] = asked.review.queries;
  expect((await author.post(`/api/cases/${opened.id}/submit`, { seenVersion: asked.version, password: PASSWORD })).body.detail).toBe('Answer query 1 first.');
  const answered = ok(await author.post<CaseResponse>(`/api/queries/${query!.id}/messages`, { text: 'Yes, by its first atom.' }));
  expect(answered.review.queries[0]).toMatchObject({ number: 1, state: 'answered', messages: [{ from: 'reviewer' }, { from: 'author' }] });
  const changed = { ...answered.content, answer: { ...answered.content.answer!, reasons: 'The coupling lies well inside the trans class of two carbon groups.' } };
  expect((await author.put(`/api/cases/${opened.id}`, { seenVersion: answered.version, content: changed })).body.errors?.[0]?.pointer).toBe('#/reason');
  const mended = ok(await author.put<CaseResponse>(`/api/cases/${opened.id}`, { seenVersion: answered.version, content: changed, reason: 'Query 1' }));
  expect(mended.changedSinceSubmission.map(({ path }) => path)).toEqual(['answer.reasons']);
  const back = await submit(author, mended);
  expect(back).toMatchObject({ state: 'in-review', revision: 3 });

  // not before the query is closed and every step is checked
  const checked = await checkAll(reviewer, back);
  expect(checked.may.sign).toBe(false);
  expect(checked.may.why.sign).toBe('Sign opens when query 1 is closed.');
  expect((await sign(reviewer, checked)).status).toBe(409);
  const closed = ok(await reviewer.post<CaseResponse>(`/api/queries/${query!.id}/close`, { text: 'Agreed.' }));
  expect(closed).toMatchObject({ state: 'in-review', may: { sign: true } });
  const signed = ok(await sign(reviewer, closed));
  expect(signed.state).toBe('signed');
  expect(signed.signatures.at(-1)).toMatchObject({ meaning: 'review', name: 'Rafe Okonjo', revision: 3, contentHash: closed.contentHash });
  expect((await letters()).filter(({ to, subject }) => to === mira.email && subject.includes('signed'))).toHaveLength(1);

  // history
  const revisions = ok(await author.get<RevisionsResponse>(`/api/cases/${opened.id}/revisions`)).revisions;
  expect(revisions.map(({ number, signed: isSigned, reason }) => [number, isSigned, reason])).toEqual([[3, true, 'Query 1'], [2, false, ''], [1, false, '']]);
  const compared = ok(await author.get<CompareResponse>(`/api/cases/${opened.id}/compare?from=1&to=2`));
  expect(compared.changes.find(({ path }) => path === 'readings.r1.j')).toMatchObject({ before: '15,9', after: '15.90' });
  expect(compared.changes.find(({ path }) => path === 'compound.name')).toMatchObject({ before: 'Cinnamate 4', after: 'Cinnamate 5' });
  expect(ok(await author.get<EventsResponse>(`/api/cases/${opened.id}/events`)).events.map(({ kind }) => kind).reverse()).toEqual([
    'created', 'saved', 'authorship-signed', 'submitted', 'claimed', 'query-opened', 'query-answered', 'saved', 'authorship-signed', 'submitted',
    'checked', 'checked', 'checked', 'checked', 'checked', 'query-closed', 'signed']);

  // an addendum leaves the revision as it is
  const added = ok(await author.post<CaseResponse>(`/api/cases/${opened.id}/addenda`, { text: 'The sample is kept in freezer 3.', password: PASSWORD }));
  expect(added).toMatchObject({ state: 'signed', contentHash: signed.contentHash, addenda: [{ text: 'The sample is kept in freezer 3.', by: 'Mira Adeyemi' }] });

  // superseded at the moment the new case is signed, and not before
  const { newCaseId } = ok(await author.post<{ newCaseId: string }>(`/api/cases/${opened.id}/supersede`, { seenVersion: added.version, reason: 'Measured again.' }), 201);
  expect((await author.post(`/api/cases/${opened.id}/supersede`, { seenVersion: added.version, reason: 'Again.' })).body.detail).toBe('HAZ-0002 is being prepared to supersede this case.');
  const next = ok(await author.get<CaseResponse>(`/api/cases/${newCaseId}`));
  expect(next).toMatchObject({ code: 'HAZ-0002', state: 'draft', supersedes: { code: 'HAZ-0001' } });
  expect(ok(await author.get<CaseResponse>(`/api/cases/${opened.id}`)).state).toBe('signed');
  const sentNext = await submit(author, next);
  await claim(reviewer, newCaseId);
  ok(await sign(reviewer, await checkAll(reviewer, sentNext), { meaning: 'approval' }));
  expect(ok(await lead.get<CaseResponse>(`/api/cases/${opened.id}`))).toMatchObject({ state: 'superseded', supersededBy: { code: 'HAZ-0002' } });
});

it('shows both versions when somebody saved meanwhile, and loses neither', async () => {
  const one = await draft(author, projectId);
  const mine = { ...one.content, question: 'Mine: E or Z?' };
  ok(await lead.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version, content: { ...one.content, question: 'Theirs: E or Z?' } }));
  const refused = await author.put(`/api/cases/${one.id}`, { seenVersion: one.version, content: mine });
  expect(refused.status).toBe(409);
  expect(refused.body.type).toBe('/problems/changed-meanwhile');
  expect(refused.body.current).toMatchObject({ version: one.version + 1, revision: one.revision + 1, savedBy: 'Lena Brandt', content: { question: 'Theirs: E or Z?' } });
  const merged = ok(await author.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version + 1, content: mine }));
  expect(merged.content.question).toBe('Mine: E or Z?');
});

it('keeps a reading that cannot be read, and refuses to send it with its field', async () => {
  const content = cinnamate({ readings: [{ ...cinnamate().readings[0]!, j: 'large' }] });
  const one = await draft(author, projectId, content);
  expect(one.content.readings[0]?.j).toBe('large');
  const refused = await author.post(`/api/cases/${one.id}/submit`, { seenVersion: one.version, password: PASSWORD });
  expect(refused.status).toBe(422);
  expect(refused.body.errors?.map(({ pointer }) => pointer)).toContain('#/content/readings/0/j');
});

it('asks why when the answer differs from the calculated one, and keeps both', async () => {
  const content = cinnamate({ answer: answerOf({ grade: 'tentative', candidateId: 'e' }) });
  const one = await draft(author, projectId, content);
  const refused = await author.post(`/api/cases/${one.id}/submit`, { seenVersion: one.version, password: PASSWORD });
  expect(refused.body.errors?.map(({ pointer }) => pointer)).toEqual(['#/content/answer/overrideReason']);
  const said = ok(await author.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version, content: { ...content, answer: { ...content.answer!, overrideReason: 'One spectrum alone.' } } }));
  const sent = await submit(author, said);
  expect(sent.content.answer?.grade).toBe('tentative');
  expect(sent.trail.answer.grade).toBe('assigned');
});

it('comments at a value, resolves, and tells the author', async () => {
  const one = await draft(author, projectId);
  const commented = ok(await reviewer.post<CaseResponse>(`/api/cases/${one.id}/comments`, { target: 'readings/r1/j', text: 'From which spectrum?' }));
  expect(commented.comments).toMatchObject([{ targetLabel: 'H2–H3, j', revision: one.revision, by: { name: 'Rafe Okonjo' }, resolvedBy: null }]);
  expect((await letters()).some(({ to, subject }) => to === mira.email && subject.includes('comment'))).toBe(true);
  const resolved = ok(await author.post<CaseResponse>(`/api/comments/${commented.comments[0]!.id}/resolve`, { resolved: true }));
  expect(resolved.comments[0]?.resolvedBy?.name).toBe('Mira Adeyemi');
  expect((await reviewer.post(`/api/cases/${one.id}/comments`, { target: 'readings/gone/j', text: 'Where?' })).body.errors?.[0]?.pointer).toBe('#/target');
});

it('reopens, withdraws with a reason, and never goes further', async () => {
  const sent = await submit(author, await draft(author, projectId));
  const reopened = ok(await author.post<CaseResponse>(`/api/cases/${sent.id}/reopen`, { seenVersion: sent.version }));
  expect(reopened).toMatchObject({ state: 'draft', review: { reviewer: null } });
  const gone = ok(await author.post<CaseResponse>(`/api/cases/${sent.id}/withdraw`, { seenVersion: reopened.version, reason: 'Wrong batch.' }));
  expect(gone.state).toBe('withdrawn');
  for (const act of ['submit', 'reopen', 'withdraw', 'claim'] as const) {
    const answer = await author.post(`/api/cases/${sent.id}/${act}`, act === 'claim' ? {} : { seenVersion: gone.version, ...(act === 'withdraw' ? { reason: 'Again.' } : {}) });
    expect([act, answer.status]).toEqual([act, act === 'claim' ? 403 : 409]);
  }
});

it('lists what it was asked for, page after page, and only once', async () => {
  await signedCase(author, reviewer, projectId, cinnamate({ question: 'Stilbene 9: E or Z?', tags: ['stilbenes'] }));
  const seen: string[] = [];
  let cursor: string | null = null;
  do {
    const page: CaseListResponse = ok(await author.get<CaseListResponse>(`/api/cases?limit=2&sort=code${cursor ? `&cursor=${cursor}` : ''}`));
    seen.push(...page.cases.map(({ code }) => code));
    cursor = page.nextCursor;
    expect(page.total).toBeGreaterThanOrEqual(page.cases.length);
  } while (cursor);
  expect(seen).toEqual([...new Set(seen)].sort().reverse());
  const found = ok(await author.get<CaseListResponse>('/api/cases?q=tilbene'));
  expect(found.cases.map(({ question }) => question)).toEqual(['Stilbene 9: E or Z?']);
  expect(ok(await author.get<CaseListResponse>('/api/cases?tag=stilbenes')).cases).toHaveLength(1);
  expect(ok(await author.get<CaseListResponse>('/api/cases?state=signed&q=stilbene')).cases).toHaveLength(1);
  expect(ok(await author.get<CaseListResponse>('/api/cases?state=draft&q=stilbene'))).toMatchObject({ cases: [], total: 0, elsewhere: 1 });
  const all = ok(await author.get<CaseListResponse>('/api/cases'));
  expect(all.total).toBe(seen.length);
  const states = all.cases.map(({ state }) => state);
  expect(all.open).toBe(states.filter((state) => ['draft', 'in-review', 'queried'].includes(state)).length);
  expect(all.notDecided).toBe(all.cases.filter(({ answer }) => answer.grade === 'not-decided').length);
  expect(all.filters).toMatchObject({ projects: [{ key: 'HAZ', role: 'chemist' }], people: [{ name: 'Mira Adeyemi' }], tags: ['cinnamates', 'stilbenes'] });
  expect((await author.get('/api/cases?cursor=nonsense')).status).toBe(422);
});

