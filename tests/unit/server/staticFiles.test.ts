import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import express from 'express';
import request from 'supertest';
import { securityHeaders } from '@/server/http/securityHeaders';
import { acceptedEncodings, staticFiles } from '@/server/http/staticFiles';
import { problemBody } from '@/shared/contracts/problem';

const CHUNK = `/_expo/static/js/web/entry-${'0a'.repeat(16)}.js`;
const SCRIPT = 'export const sign = 1;\n'.repeat(100);
/** Reads an answer as it came over the wire, so that its coding can be looked at. */
const asText = (response: request.Response, done: (error: Error | null, body: unknown) => void): void => {
  let text = '';
  // supertest hands the stream of the answer under the type of the finished answer
  const stream = response as unknown as NodeJS.ReadableStream;
  stream.on('data', (part: Buffer) => { text += part.toString(); });
  stream.on('end', () => { done(null, text); });
};
let folder: string;
let app: express.Express;

beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'throughbond-static-'));
  const dist = path.join(folder, 'dist');
  const write = (name: string, content: string | Buffer) => {
    mkdirSync(path.dirname(path.join(dist, name)), { recursive: true });
    writeFileSync(path.join(dist, name), content);
  };
  write('index.html', '<!doctype html><title>Throughbond</title>');
  write('.stamp', 'inner');
  write(CHUNK, SCRIPT);
  write(`${CHUNK}.br`, brotliCompressSync(SCRIPT));
  write(`${CHUNK}.gz`, gzipSync(SCRIPT));
  write('app.css', 'body{}');
  writeFileSync(path.join(folder, 'secret.txt'), 'secret');
  app = express().use(securityHeaders({ behindTls: false })).use(staticFiles(dist));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('files of the client', () => {
  it.each([['br', 'gzip, deflate, br'], ['gzip', 'gzip'], [undefined, 'identity'], ['gzip', 'br;q=0, gzip;q=0.5']])('come as %s for "%s"', async (coding, accept) => {
    const answer = await request(app).get(CHUNK).set('Accept-Encoding', accept).buffer(true)
      .parse(asText);
    expect(answer.status).toBe(200);
    expect(answer.headers['content-encoding']).toBe(coding);
    expect(answer.headers.vary).toBe('Accept-Encoding');
    expect(answer.headers['content-type']).toBe('text/javascript; charset=utf-8');
  });

  it('unpack to what was built', async () => {
    expect((await request(app).get(CHUNK).set('Accept-Encoding', 'gzip').buffer(true).parse(asText)).body).toBe(SCRIPT);
  });

  it('are kept for a year when their name holds a hash, and asked for again otherwise', async () => {
    expect((await request(app).get(CHUNK)).headers['cache-control']).toBe('public, max-age=31536000, immutable');
    const style = await request(app).get('/app.css');
    expect(style.headers['cache-control']).toBe('no-cache');
    expect((await request(app).get('/app.css').set('If-None-Match', String(style.headers.etag))).status).toBe(304);
  });

  it('answer HEAD without a body', async () => {
    const answer = await request(app).head('/app.css');
    expect(answer.status).toBe(200);
    expect(answer.headers['content-length']).toBe('6');
    expect(answer.text ?? '').toBe('');
  });

  it.each(['/', '/cases/12', '/invite/abc-_9'])('give the page for the screen %s', async (screen) => {
    const answer = await request(app).get(screen);
    expect(answer.status).toBe(200);
    expect(answer.text).toContain('<title>Throughbond</title>');
    expect(answer.headers['cache-control']).toBe('no-cache');
  });

  it.each(['/api', '/api/nothing', '/_expo/static/js/web/gone.js', '/nothing.png', '/.stamp', '/../secret.txt', '/%2e%2e/secret.txt', '/..%2fsecret.txt'])('give nothing for %s', async (address) => {
    const answer = await request(app).get(address);
    if (answer.status === 200) expect(answer.text).toContain('<title>Throughbond</title>'); // read as a screen, never as a file
    else {
      expect(answer.status).toBe(404);
      expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
      expect(problemBody.parse(JSON.parse(answer.text)).status).toBe(404);
    }
    expect(answer.text).not.toContain('secret');
    expect(answer.text).not.toContain('inner');
  });

  it('refuse to be written to', async () => expect((await request(app).post('/cases')).status).toBe(404));

  it('refuse to start without a build', () => {
    mkdirSync(path.join(folder, 'empty'));
    expect(() => staticFiles(path.join(folder, 'empty'))).toThrow('The web client is not built');
  });
});

describe('headers', () => {
  it('let nothing from elsewhere and nothing inline in', async () => {
    const { headers } = await request(app).get('/');
    const policy = String(headers['content-security-policy']);
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain("script-src 'self';");
    expect(policy).not.toMatch(/unsafe|\*|https?:/);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
  });

  it('insist on https only behind it', async () => {
    expect((await request(app).get('/')).headers['strict-transport-security']).toBeUndefined();
    const secure = express().use(securityHeaders({ behindTls: true })).get('/', (_request, response) => { response.end(); });
    expect((await request(secure).get('/')).headers['strict-transport-security']).toBe('max-age=31536000');
  });
});

describe('the Accept-Encoding header', () => {
  it('is read with its refusals', () => {
    expect([...acceptedEncodings('gzip;q=1.0, br ; q=0, deflate;q=0.000')]).toEqual(['gzip']);
    expect([...acceptedEncodings(undefined)]).toEqual([]);
  });
});
