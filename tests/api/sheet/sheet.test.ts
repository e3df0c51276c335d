import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import type { CaseResponse } from '@/shared/contracts/cases';
import type { CaseContent } from '@/shared/types/case';
import { answerOf, cinnamate, dihedral } from '@/tests/helpers/caseContent';
import { checkAll, claim, draft, ok, sign, signedCase, submit } from '@/tests/helpers/caseWork';
import { PASSWORD, testServer, type Client, type TestServer } from '@/tests/helpers/server';

let server: TestServer;
let author: Client;
let reviewer: Client;
let projectId: string;
let folder: string;
beforeAll(async () => {
  server = await testServer();
  folder = mkdtempSync(path.join(tmpdir(), 'throughbond-sheet-'));
  const [mira, rafe] = await Promise.all([server.person('Mira Adeyemi'), server.person('Rafe Okonjo')]);
  projectId = await server.project('HAZ', [{ who: mira, role: 'chemist' }, { who: rafe, role: 'reviewer' }]);
  [author, reviewer] = await Promise.all([server.signedIn(mira), server.signedIn(rafe)]);
});
afterAll(async () => {
  rmSync(folder, { recursive: true, force: true });
  await server.stop();
});

async function sheet(caseId: string, query = ''): Promise<Buffer> {
  const answer = await author.agent.get(`/api/cases/${caseId}/sheet.pdf${query}`).buffer(true).parse((res, done) => {
    const parts: Buffer[] = [];
    res.on('data', (part: Buffer) => parts.push(part));
    res.on('end', () => done(null, Buffer.concat(parts)));
  });
  expect(answer.status).toBe(200);
  expect(answer.headers['content-type']).toBe('application/pdf');
  return answer.body as Buffer;
}
/** What poppler makes of it, page by page: a program that is not ours reads the file. */
function pages(bytes: Buffer): string[] {
  const file = path.join(folder, 'one.pdf');
  writeFileSync(file, bytes);
  return execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' }).split('\f').slice(0, -1);
}
const tool = (name: string, bytes: Buffer): string => {
  const file = path.join(folder, 'two.pdf');
  writeFileSync(file, bytes);
  return execFileSync(name, [file], { encoding: 'utf8' });
};
const flat = (text: string) => text.replace(/\s+/g, ' ');

describe('the sheet of a signed case', () => {
  let one: CaseResponse;
  let bytes: Buffer;
  let text: string;
  beforeAll(async () => {
    const sent = await submit(author, await draft(author, projectId, dihedral()));
    await claim(reviewer, sent.id);
    const asked = ok(await reviewer.post<CaseResponse>(`/api/cases/${sent.id}/queries`, { step: 'domain', text: 'C2 carries an aryl, sp². Which spread?' }));
    ok(await author.post(`/api/queries/${asked.review.queries[0]!.id}/messages`, { text: 'The raised one, 1.0 Hz.' }));
    const closed = ok(await reviewer.post<CaseResponse>(`/api/queries/${asked.review.queries[0]!.id}/close`));
    one = ok(await sign(reviewer, await checkAll(reviewer, closed)));
    ok(await author.post(`/api/cases/${one.id}/addenda`, { text: 'The sample is kept.', password: PASSWORD }));
    bytes = await sheet(one.id, '?zone=Europe/Berlin');
    text = flat(pages(bytes).join('\n'));
  });

  it('holds question, readings, calculation, answer, review and signatures as text', () => {
    for (const part of [
      'Pyranol 7: 2,3-cis or trans?', '500 MHz, CDCl₃, 298 K', 'author Mira Adeyemi', 'H2–H3', '8.9', '9.0', '3.66 ppm, ddd', 'tentative', '2,3-trans',
      'Formula', 'Spread', 'φ', 'Reasons', 'The cis form gives no such coupling.', 'Query 1, relation in its domain: closed', 'Which spread?', 'The raised one, 1.0 Hz.',
      'Authorship', 'Review', 'Rafe Okonjo', 'Addendum 1', 'What stays open', 'Cautions', 'printed in Europe/Berlin', one.trail.engineVersion, one.trail.relations[0]!.id, 'page 1 of',
    ]) expect(text).toContain(part);
    expect(text.replace(/ /g, '')).toContain(one.contentHash);
  });

  it('carries no draft mark, and signs of the trade that extract rightly', () => {
    expect(text).not.toContain('DRAFT');
    expect(text).toMatch(/³J/);
    for (const sign of ['φ', '±', '−', '°', '²']) expect(text).toContain(sign);
    expect(text).not.toMatch(/\[U\+/);
    expect(text).not.toContain('_');
  });

  it('is tagged, titled, of two pages at most, and embeds every font', () => {
    const info = tool('pdfinfo', bytes);
    expect(info).toMatch(/Tagged:\s+yes/);
    expect(info).toMatch(/Title:\s+HAZ-\d{4}, revision \d+: Pyranol 7: 2,3-cis or trans\?/);
    expect(Number(/Pages:\s+(\d+)/.exec(info)?.[1])).toBeLessThanOrEqual(2);
    expect(info).toMatch(/Page size:\s+595\.28 x 841\.89/);
    const fonts = tool('pdffonts', bytes).split('\n').slice(2).filter((line) => line !== '');
    expect(fonts.length).toBeGreaterThan(3);
    for (const line of fonts) expect(line).toMatch(/yes yes yes\s+\d+\s+0$/);
  });

  it('gives the same bytes again, and on Letter paper the same text', async () => {
    expect((await sheet(one.id, '?zone=Europe/Berlin')).equals(bytes)).toBe(true);
    const letter = await sheet(one.id, '?paper=Letter&zone=Europe/Berlin');
    expect(tool('pdfinfo', letter)).toMatch(/Page size:\s+612 x 792/);
    expect(flat(pages(letter).join('\n'))).toContain(`${one.code}, revision ${one.revision}`);
  });

  it('marks an earlier revision of it as never signed, on each page', async () => {
    const old = pages(await sheet(one.id, '?revision=1'));
    for (const page of old) expect(page).toMatch(/DRAFT\s+This revision was never signed/);
  });
});

it('marks every page of a draft in a word, and says so in its foot', async () => {
  const long: CaseContent = cinnamate({ evidence: Array.from({ length: 40 }, (_, i) => ({ id: `e${i}`, kind: 'other' as const, text: `Fact ${i}. ${'A sentence of some length. '.repeat(4)}`, bearing: 'neutral' as const, candidateId: null, attachmentIds: [] })) });
  const one = await draft(author, projectId, long);
  const found = pages(await sheet(one.id));
  expect(found.length).toBeGreaterThan(2);
  found.forEach((page, index) => {
    expect(page).toMatch(/DRAFT\s+Not signed \(draft\)/);
    expect(page).toContain(`page ${index + 1} of ${found.length}`);
    expect(page).toContain('draft revision');
  });
  const all = flat(found.join('\n'));
  for (let i = 0; i < 40; i += 1) expect(all).toContain(`Fact ${i}.`);
});

it('prints "not decided" as a result, with what to measure next, and both answers where they differ', async () => {
  const one = await draft(author, projectId, cinnamate({ answer: answerOf({ statement: 'Not decided from one value', overrideReason: 'The sample held both isomers.' }) }));
  const text = flat(pages(await sheet(one.id)).join('\n'));
  for (const part of ['not decided', 'Not decided from one value', 'calculated answer', 'E is the only candidate left', 'The sample held both isomers.', 'The question is not decided.', 'Measure next']) expect(text).toContain(part);
});

it('prints what was typed as it was typed, markup and foreign letters included', async () => {
  const reading = cinnamate().readings[0]!;
  const one = await draft(author, projectId, cinnamate({
    question: 'Is _this_ underlined?', compound: { ...cinnamate().compound, name: 'Łódź 中 \u{1F600}' },
    readings: [{ ...reading, j: '7.60' }, { ...reading, id: 'r2', atomA: 'H5', atomB: 'F6', j: '< 1.5', se: '' }], tags: ['a_b_c'],
  }));
  const text = flat(pages(await sheet(one.id)).join('\n'));
  for (const part of ['Is _this_ underlined?', 'Łódź [U+4E2D] [U+1F600]', '7.60', '< 1.5', 'a_b_c']) expect(text).toContain(part);
});

it('marks a withdrawn case with its reason', async () => {
  const one = await signedCase(author, reviewer, projectId);
  ok(await author.post(`/api/cases/${one.id}/withdraw`, { seenVersion: one.version, reason: 'Wrong batch.' }));
  for (const page of pages(await sheet(one.id))) expect(page).toMatch(/WITHDRAWN\s+This case was withdrawn: Wrong batch\./);
});

it('gives the readings as a line for the supporting information', async () => {
  const one = await draft(author, projectId);
  expect(ok(await author.get<{ text: string }>(`/api/cases/${one.id}/si-text`)).text).toMatch(/15\.90.Hz/);
});
