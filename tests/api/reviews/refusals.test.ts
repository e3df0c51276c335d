import type { CaseResponse } from '@/shared/contracts/cases';
import type { ProblemBody } from '@/shared/contracts/problem';
import { cinnamate } from '@/tests/helpers/caseContent';
import { checkAll, claim, draft, ok, sign, signedCase, submit } from '@/tests/helpers/caseWork';
import { testServer, PASSWORD, type Client, type TestPerson, type TestServer } from '@/tests/helpers/server';

let server: TestServer;
let people: Record<'mira' | 'rafe' | 'ilse' | 'lena' | 'petra', TestPerson>;
let as: Record<keyof typeof people, Client>;
let projectId: string;
beforeAll(async () => {
  server = await testServer();
  const names = { mira: 'Mira Adeyemi', rafe: 'Rafe Okonjo', ilse: 'Ilse Maron', lena: 'Lena Brandt', petra: 'Petra Hall' };
  people = Object.fromEntries(await Promise.all(Object.entries(names).map(async ([key, name]) => [key, await server.person(name)]))) as typeof people;
  projectId = await server.project('HAZ', [
    { who: people.mira, role: 'chemist' }, { who: people.rafe, role: 'reviewer' }, { who: people.ilse, role: 'reviewer' }, { who: people.lena, role: 'lead' }, { who: people.petra, role: 'chemist' },
  ]);
  as = Object.fromEntries(await Promise.all(Object.entries(people).map(async ([key, who]) => [key, await server.signedIn(who)]))) as typeof as;
});
afterAll(() => server.stop());

const ready = async (): Promise<CaseResponse> => {
  const sent = await submit(as.mira, await draft(as.mira, projectId));
  await claim(as.rafe, sent.id);
  return checkAll(as.rafe, sent);
};
const stateOf = async (id: string): Promise<string> => ok(await as.mira.get<CaseResponse>(`/api/cases/${id}`)).state;

describe('claims', () => {
  it('give a case to one of two who take it at the same moment', async () => {
    for (let round = 0; round < 4; round += 1) {
      const sent = await submit(as.mira, await draft(as.mira, projectId));
      const answers = await Promise.all([as.rafe, as.ilse].map((client) => client.post(`/api/cases/${sent.id}/claim`)));
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      const lost = answers.find(({ status }) => status === 409);
      expect(lost?.body.type).toBe('/problems/held-by-another');
      expect(lost?.body.detail).toMatch(/^(Rafe Okonjo|Ilse Maron) holds this case until /);
    }
  });

  it('run out after the project\'s hours, and may be given back or freed by a lead', async () => {
    const sent = await submit(as.mira, await draft(as.mira, projectId));
    await claim(as.rafe, sent.id);
    server.pass(23 * 3600_000);
    const still = await server.signedIn(people.ilse);
    expect((await still.post(`/api/cases/${sent.id}/claim`)).status).toBe(409);
    server.pass(2 * 3600_000);
    const later = await server.signedIn(people.ilse);
    expect(ok(await later.post<CaseResponse>(`/api/cases/${sent.id}/claim`)).review.reviewer?.name).toBe('Ilse Maron');
    const rafe = await server.signedIn(people.rafe);
    expect((await rafe.post(`/api/cases/${sent.id}/checks`, { step: 'domain', checked: true, revision: sent.revision })).body.type).toBe('/problems/held-by-another');
    const lena = await server.signedIn(people.lena);
    expect(ok(await lena.post<CaseResponse>(`/api/cases/${sent.id}/release`)).review.reviewer).toBeNull();
    as = Object.fromEntries(await Promise.all(Object.entries(people).map(async ([key, who]) => [key, await server.signedIn(who)]))) as typeof as;
  });
});

describe('a signature is refused', () => {
  it('to the author, whatever their role', async () => {
    const own = await submit(as.lena, await draft(as.lena, projectId));
    expect((await as.lena.post(`/api/cases/${own.id}/claim`)).body).toMatchObject({ status: 403, detail: 'You are the author: someone else reviews this case.' });
    expect((await sign(as.lena, own)).status).toBe(403);
    expect(await stateOf(own.id)).toBe('in-review');
  });

  it('to whoever saved a revision of the case', async () => {
    const one = await draft(as.mira, projectId);
    const edited = ok(await as.rafe.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version, content: { ...one.content, question: 'Edited: E or Z?' } }));
    const sent = await submit(as.mira, edited);
    expect((await as.rafe.post(`/api/cases/${sent.id}/claim`)).body.detail).toBe(`You saved revision ${edited.revision} of this case: someone else reviews it.`);
  });

  it('to a role that does not review, and to somebody who does not hold the case', async () => {
    const one = await ready();
    expect((await sign<ProblemBody>(as.petra, one)).body.detail).toBe('Reviewers and leads of the project review cases.');
    expect((await sign<ProblemBody>(as.ilse, one)).body.type).toBe('/problems/held-by-another');
    expect(await stateOf(one.id)).toBe('in-review');
  });

  it('for another hash or an older version than the one on screen', async () => {
    const one = await ready();
    const otherHash = await sign(as.rafe, one, { contentHash: 'a'.repeat(64) });
    expect(otherHash.status).toBe(409);
    expect((await sign(as.rafe, one, { seenVersion: one.version - 1 })).status).toBe(409);
    expect(await stateOf(one.id)).toBe('in-review');
  });

  it('with a wrong password, which is counted', async () => {
    const one = await ready();
    const wrong = await as.rafe.post(`/api/cases/${one.id}/sign`, { seenVersion: one.version, contentHash: one.contentHash, meaning: 'review', password: 'not this one' });
    expect(wrong.status).toBe(403);
    expect(wrong.body.errors?.[0]?.pointer).toBe('#/password');
    for (let tries = 0; tries < 12; tries += 1) {
      const next = await as.rafe.post(`/api/cases/${one.id}/sign`, { seenVersion: one.version, contentHash: one.contentHash, meaning: 'review', password: 'not this one' });
      if (next.status === 429) break;
      expect(next.status).toBe(403);
    }
    expect((await sign(as.rafe, one)).status).toBe(429);
    expect(await stateOf(one.id)).toBe('in-review');
    await server.database.asOwner('DELETE FROM rate_counters');
    expect((await sign(as.rafe, one)).status).toBe(200);
  });

  it('while a step is not checked, a check was made on another revision, or a query is open', async () => {
    const sent = await submit(as.mira, await draft(as.mira, projectId));
    await claim(as.rafe, sent.id);
    expect((await sign(as.rafe, sent)).body).toMatchObject({ detail: expect.stringMatching(/^Sign opens when readings and pairs, .* are checked\.$/) as string });
    expect((await as.rafe.post(`/api/cases/${sent.id}/checks`, { step: 'domain', checked: true, revision: sent.revision - 1 })).status).toBe(409);
    const checked = await checkAll(as.rafe, sent);
    const asked = ok(await as.rafe.post<CaseResponse>(`/api/cases/${sent.id}/queries`, { step: 'domain', text: 'Which class?' }));
    expect((await sign(as.rafe, asked)).body).toMatchObject({ detail: 'Sign opens when query 1 is closed.' });
    expect(checked.review.checks.every(({ state }) => state === 'checked')).toBe(true);
    // the author changes the content: the checks of the old revision no longer count, and closing the query is not enough
    const changed = ok(await as.mira.put<CaseResponse>(`/api/cases/${sent.id}`, { seenVersion: asked.version, reason: 'Query 1', content: cinnamate({ question: 'Cinnamate 5: E or Z?' }) }));
    const closed = ok(await as.rafe.post<CaseResponse>(`/api/queries/${asked.review.queries[0]!.id}/close`));
    expect(closed.state).toBe('queried');
    expect(closed.review.checks.map(({ state }) => state)).toEqual(['open', 'open', 'open', 'open', 'open']);
    expect((await sign(as.rafe, await checkAll(as.rafe, closed))).body).toMatchObject({ detail: 'Sign opens when the author has sent the present revision to review.' });
    expect(changed.revision).toBe(sent.revision + 1);
  });
});

describe('a signed case, by SQL as the application\'s user', () => {
  let one: CaseResponse;
  const refused = async (sql: string, values: unknown[] = []): Promise<string> => {
    try {
      await server.database.asApp(sql, values);
    } catch (error) {
      return (error as { sqlMessage?: string }).sqlMessage ?? String(error);
    }
    return 'it was done';
  };
  const denied = /denied|only grows|keeps its content|never|superseded or withdrawn/;
  beforeAll(async () => {
    one = await signedCase(as.mira, as.rafe, projectId);
  });

  it.each([
    ['UPDATE case_revisions SET content = ? WHERE case_id = ?', 'denied'],
    ['UPDATE case_revisions SET trail = ? WHERE case_id = ?', 'denied'],
    ['UPDATE signatures SET signer_name = ? WHERE case_id = ?', 'denied'],
    ['UPDATE case_events SET text = ? WHERE case_id = ?', 'denied'],
    ['UPDATE cases SET content_hash = REPEAT(LEFT(?, 1), 64) WHERE id = ?', 'keeps its content'],
    ['UPDATE cases SET question = ? WHERE id = ?', 'keeps its content'],
    ['UPDATE cases SET code = ? WHERE id = ?', 'never change'],
    ['UPDATE cases SET answer_text = ? WHERE id = ?', 'keeps its content'],
  ])('%s', async (sql, why) => {
    const message = await refused(sql, ['a', one.id]);
    expect(message).toMatch(denied);
    expect(message).toContain(why);
  });

  it.each(['cases', 'case_revisions', 'signatures', 'case_events', 'addenda', 'attachments', 'comments', 'review_queries', 'query_messages'])('DELETE FROM %s', async (table) => {
    expect(await refused(`DELETE FROM ${table}`)).toMatch(/denied/);
  });

  it.each(['draft', 'in-review', 'queried'])('goes back to %s for nobody', async (state) => {
    expect(await refused('UPDATE cases SET state = ? WHERE id = ?', [state, one.id])).toMatch(/superseded or withdrawn, nothing else/);
  });

  it('takes no further revision, and no signature of its author', async () => {
    expect(await refused(
      `INSERT INTO case_revisions (case_id, number, content, trail, content_hash, engine_version, saved_by_id, saved_by_name, saved_at)
       SELECT case_id, number + 1, content, trail, content_hash, engine_version, saved_by_id, saved_by_name, saved_at FROM case_revisions WHERE case_id = ? AND number = ?`, [one.id, one.revision])).toMatch(/no further revision/);
    expect(await refused(
      `INSERT INTO signatures (id, case_id, revision, meaning, signer_id, signer_name, signed_at, content_hash, record_hash) VALUES (UUID(), ?, ?, 'review', ?, 'Mira', NOW(3), ?, ?)`,
      [one.id, one.revision, people.mira.id, one.contentHash, 'a'.repeat(64)])).toMatch(/Nobody reviews what they wrote/);
  });

  it('lets nobody drop or replace a trigger', async () => {
    for (const trigger of ['cases_guard_update', 'case_revisions_no_update', 'signatures_guard_insert', 'cases_guard_delete']) {
      expect(await refused(`DROP TRIGGER ${trigger}`)).toMatch(/denied/);
      expect(await refused(`CREATE OR REPLACE TRIGGER ${trigger} BEFORE UPDATE ON cases FOR EACH ROW SET @x = 1`)).toMatch(/denied/);
    }
  });

  it('keeps its content even from the owner of the tables', async () => {
    await expect(server.database.asOwner('UPDATE case_revisions SET content = ? WHERE case_id = ?', ['{}', one.id])).rejects.toThrow(/only grows/);
    await expect(server.database.asOwner('DELETE FROM cases WHERE id = ?', [one.id])).rejects.toThrow(/never removed/);
  });

  it('is not signed without somebody else\'s signature on its revision', async () => {
    const sent = await submit(as.mira, await draft(as.mira, projectId));
    expect(await refused("UPDATE cases SET state = 'signed' WHERE id = ?", [sent.id])).toMatch(/signature of another person/);
  });

  it('still reads as it was, with a hash that holds', async () => {
    const now = ok(await as.mira.get<CaseResponse>(`/api/cases/${one.id}`));
    expect(now.contentHash).toBe(one.contentHash);
    expect(now.content).toEqual(one.content);
    expect((await as.mira.put(`/api/cases/${one.id}`, { seenVersion: one.version, reason: 'No.', content: cinnamate() })).status).toBe(409);
  });
});

it('an addendum needs the password and a signed case', async () => {
  const one = await draft(as.mira, projectId);
  expect((await as.mira.post(`/api/cases/${one.id}/addenda`, { text: 'Late.', password: PASSWORD })).body.detail).toBe('This is for signed cases.');
  expect((await as.mira.post(`/api/cases/${one.id}/addenda`, { text: 'Late.', password: 'not mine at all' })).status).toBe(403);
});
