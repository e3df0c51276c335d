import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';

import type { Attachment, CaseResponse } from '@/shared/contracts/cases';
import { LIMITS } from '@/shared/limits';
import type { ProblemBody } from '@/shared/contracts/problem';
import { cinnamate } from '@/tests/helpers/caseContent';
import { draft, ok, submit } from '@/tests/helpers/caseWork';
import { testServer, type Client, type TestServer } from '@/tests/helpers/server';

let server: TestServer;
let author: Client;
let one: CaseResponse;
beforeAll(async () => {
  server = await testServer();
  const mira = await server.person('Mira Adeyemi');
  const projectId = await server.project('HAZ', [{ who: mira, role: 'chemist' }]);
  author = await server.signedIn(mira);
  one = await draft(author, projectId);
});
afterAll(() => server.stop());

const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');
const upload = async (bytes: Buffer, name: string | null, type = 'application/octet-stream') => {
  const call = author.agent.post(`/api/cases/${one.id}/attachments`).set('Content-Type', type);
  if (name !== null) void call.set('X-File-Name', encodeURIComponent(name));
  const answer = await call.send(bytes);
  return { status: answer.status, body: answer.body as Attachment & ProblemBody };
};
/** A one-pixel PNG, made from the specification's chunks; only its signature and header matter here. */
const PNG = Buffer.from('iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAQAAAC1HAwCAAAAC0lEQVR42mNk+A8AAQUBAScY42YAAAAASUVORK5CYII=', 'base64');
const folder = () => path.join(server.deps.env.dataDir, 'attachments');

it('keeps a file by its hash and gives it back byte for byte', async () => {
  const { status, body } = await upload(PNG, 'H-2 Łódź spectrum "1".png');
  expect(status).toBe(201);
  expect(body).toMatchObject({ fileName: 'H-2 Łódź spectrum "1".png', mediaType: 'image/png', bytes: PNG.length, sha256: sha256(PNG) });
  expect(readFileSync(path.join(folder(), sha256(PNG).slice(0, 2), sha256(PNG)))).toEqual(PNG);
  const answer = await author.agent.get(`/api/attachments/${body.id}`).buffer(true).parse((res, done) => {
    const parts: Buffer[] = [];
    res.on('data', (part: Buffer) => parts.push(part));
    res.on('end', () => done(null, Buffer.concat(parts)));
  });
  expect(answer.body).toEqual(PNG);
  expect(answer.headers).toMatchObject({ 'content-type': 'image/png', 'x-content-type-options': 'nosniff', 'content-length': String(PNG.length) });
  expect(answer.headers['content-disposition']).toMatch(/^attachment; filename="H-2 __d_ spectrum _1_.png"; filename\*=UTF-8''H-2%20%C5%81%C3%B3d%C5%BA/);
  expect(answer.headers['content-security-policy']).toContain('sandbox');
});

it('keeps the same bytes once, and leaves no half file behind', async () => {
  await upload(PNG, 'again.png');
  const files = readdirSync(folder(), { recursive: true }).map(String).filter((name) => name.includes(sha256(PNG)));
  expect(files).toHaveLength(1);
});

it.each<[string, string, string]>([
  ['plain text', 'a note', 'text/plain'],
  ['a table', 'shift,J\n7.69,15.7\n6.43,15.7\n', 'text/csv'],
  ['JCAMP-DX', '##TITLE= 4\n##JCAMP-DX= 5.01\n##DATA TYPE= NMR SPECTRUM\n##END=\n', 'chemical/x-jcamp-dx'],
  ['a molfile', '\n  made by hand\n\n  1  0  0  0  0  0  0  0  0  0999 V2000\n    0.0    0.0    0.0 C   0  0\nM  END\n', 'chemical/x-mdl-molfile'],
  ['an SD file', '\n  made by hand\n\n  1  0  0  0  0  0  0  0  0  0999 V2000\n    0.0    0.0    0.0 C   0  0\nM  END\n$$$$\n', 'chemical/x-mdl-sdfile'],
  ['Latin-1 text', '', 'text/plain'],
])('knows %s by its content, whatever its name', async (_what, text, mediaType) => {
  const bytes = text === '' ? Buffer.from('25 \u00b0C, \u00b1 0.2 Hz', 'latin1') : Buffer.from(text);
  expect(await upload(bytes, 'x.png')).toMatchObject({ status: 201, body: { mediaType } });
});

it.each<[string, Buffer]>([
  ['a web page named as a picture', Buffer.from('<!DOCTYPE html><html><script>1</script></html>')],
  ['a web page behind blanks and a mark', Buffer.from('\ufeff \n\n<HTML><body onload=x>')],
  ['a script element behind text', Buffer.from(`${'a,b\n'.repeat(3000)}<script>alert(1)</script>`)],
  ['an SVG drawing', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" onload="x"/>')],
  ['an SVG drawing behind an XML head', Buffer.from('<?xml version="1.0"?><!-- c --><svg xmlns="http://www.w3.org/2000/svg"/>')],
  ['a shell script', Buffer.from('#!/bin/sh\nrm -rf /\n')],
  ['a Linux program', Buffer.from('7f454c4602010100000000000000000002003e0001000000', 'hex')],
  ['a Windows program', Buffer.concat([Buffer.from('MZ'), Buffer.alloc(64)])],
  ['bytes that are nothing', Buffer.from([0, 1, 2, 3, 0xfe, 0xff, 0, 9])],
])('refuses %s in a sentence', async (_what, bytes) => {
  const { status, body } = await upload(bytes, 'spectrum.png');
  expect(status).toBe(415);
  expect(body.detail).toMatch(/^(This file is|What kind of file).*\.$/);
});

it('refuses what is empty, too large, nameless or sent as something else', async () => {
  expect((await upload(Buffer.alloc(0), 'a.txt')).status).toBeGreaterThanOrEqual(400);
  const large = await upload(Buffer.alloc(LIMITS.attachmentBytes + 1, 97), 'a.txt');
  expect(large.status).toBe(413);
  expect(large.body.detail).toMatch(/10.MB/);
  expect((await upload(Buffer.alloc(LIMITS.attachmentBytes, 97), 'full.txt')).status).toBe(201);
  for (const name of [null, '', '..', 'a/..', 'x'.repeat(201)]) expect([name, (await upload(Buffer.from('t'), name)).status]).toEqual([name, 422]);
  expect((await upload(Buffer.from('t'), '../../etc/passwd')).body.fileName).toBe('passwd');
  expect((await upload(Buffer.from('{}'), 'a.json', 'application/json')).status).toBe(415);
  const undecodable = await author.agent.post(`/api/cases/${one.id}/attachments`).set('Content-Type', 'application/octet-stream').set('X-File-Name', '%E0%A4%A').send(Buffer.from('t'));
  expect(undecodable.status).toBe(422);
});

it('is cited by evidence, and its bytes are in the hash that is signed', async () => {
  const { body } = await upload(Buffer.from('peak list'), 'peaks.txt');
  const evidence = { id: 'n1', kind: 'noe' as const, text: 'Peak list', bearing: 'for' as const, candidateId: 'e', attachmentIds: [body.id] };
  const before = ok(await author.get<CaseResponse>(`/api/cases/${one.id}`));
  const saved = ok(await author.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: before.version, content: cinnamate({ evidence: [evidence] }) }));
  expect(saved.contentHash).not.toBe(before.contentHash);
  await submit(author, saved);
  const late = await upload(Buffer.from('late'), 'late.txt');
  expect(late.status).toBe(409);
  expect(late.body.detail).toMatch(/^In review the content stays as it was sent/);
});

it('says so when the bytes are gone from the disk', async () => {
  const { attachments } = ok(await author.get<CaseResponse>(`/api/cases/${one.id}`));
  const gone = attachments.find(({ fileName }) => fileName === 'peaks.txt');
  rmSync(path.join(folder(), gone!.sha256.slice(0, 2), gone!.sha256));
  expect((await author.get(`/api/attachments/${gone!.id}`)).status).toBe(410);
});
