import { createHash } from 'node:crypto';
import { createReadStream, existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { pipeline } from 'node:stream';
import type { RequestHandler, Response } from 'express';
import type { ProblemBody } from '@/shared/contracts/problem';

const TYPES: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.webmanifest': 'application/manifest+json; charset=utf-8',
  '.svg': 'image/svg+xml; charset=utf-8',
  '.png': 'image/png',
  '.ico': 'image/x-icon',
  '.woff2': 'font/woff2',
  '.ttf': 'font/ttf',
  '.txt': 'text/plain; charset=utf-8',
};

const ENCODINGS = [['br', '.br'], ['gzip', '.gz']] as const;
type Encoding = (typeof ENCODINGS)[number][0] | 'identity';

interface StaticFile {
  type: string;
  /** a content hash in the name: the browser may keep it for ever */
  hashed: boolean;
  hash: string;
  forms: ReadonlyMap<Encoding, { file: string; bytes: number }>;
}

function* filesBelow(folder: string): Generator<string> {
  for (const entry of readdirSync(folder, { withFileTypes: true })) {
    if (entry.name.startsWith('.')) continue;
    const full = path.join(folder, entry.name);
    if (entry.isDirectory()) yield* filesBelow(full);
    else yield full;
  }
}

/** Every file of the built client by its address. A request can reach nothing that is not in this map. */
export function mapFiles(distDir: string): ReadonlyMap<string, StaticFile> {
  const files = new Map<string, StaticFile>();
  for (const file of filesBelow(distDir)) {
    if (/\.(br|gz)$/.test(file)) continue;
    const forms = new Map<Encoding, { file: string; bytes: number }>([['identity', { file, bytes: statSync(file).size }]]);
    for (const [encoding, ending] of ENCODINGS) {
      if (existsSync(file + ending)) forms.set(encoding, { file: file + ending, bytes: statSync(file + ending).size });
    }
    files.set(`/${path.relative(distDir, file).split(path.sep).join('/')}`, {
      type: TYPES[path.extname(file)] ?? 'application/octet-stream',
      hashed: /[-.][0-9a-f]{32}\./.test(path.basename(file)),
      hash: createHash('sha256').update(readFileSync(file)).digest('hex').slice(0, 20),
      forms,
    });
  }
  return files;
}

/** The codings a browser takes, by its Accept-Encoding header; `q=0` refuses one. */
export function acceptedEncodings(header: string | undefined): ReadonlySet<string> {
  const accepted = new Set<string>();
  for (const part of (header ?? '').split(',')) {
    const [name = '', ...parameters] = part.trim().toLowerCase().split(';');
    if (name !== '' && !parameters.some((parameter) => /^\s*q=0(\.0*)?\s*$/.test(parameter))) accepted.add(name.trim());
  }
  return accepted;
}

function sendFile(found: StaticFile, accepts: string | undefined, ifNoneMatch: string | undefined, headOnly: boolean, response: Response): void {
  const accepted = acceptedEncodings(accepts);
  const encoding = ENCODINGS.map(([name]) => name).find((name) => accepted.has(name) && found.forms.has(name)) ?? 'identity';
  const form = found.forms.get(encoding);
  if (!form) return;
  const etag = `"${found.hash}-${encoding}"`;
  response.setHeader('Vary', 'Accept-Encoding');
  response.setHeader('Cache-Control', found.hashed ? 'public, max-age=31536000, immutable' : 'no-cache');
  response.setHeader('ETag', etag);
  if (ifNoneMatch?.split(',').some((tag) => tag.trim().replace(/^W\//, '') === etag)) {
    response.status(304).end();
    return;
  }
  response.setHeader('Content-Type', found.type);
  response.setHeader('Content-Length', form.bytes);
  if (encoding !== 'identity') response.setHeader('Content-Encoding', encoding);
  if (headOnly) {
    response.end();
    return;
  }
  // a reader that went away, or a file replaced by a newer build, ends this answer only
  pipeline(createReadStream(form.file), response, (error) => {
    if (error) response.destroy();
  });
}

function notFound(response: Response): void {
  const body: ProblemBody = { type: '/problems/not-found', title: 'Not found', status: 404, detail: 'There is nothing at this address.' };
  response.status(404).setHeader('Cache-Control', 'no-store').type('application/problem+json').send(JSON.stringify(body));
}

/**
 * Serves the built client, last in the chain. A path without an extension is a screen and gets index.html; an unknown
 * /api path or file gets a problem+json 404.
 * @param distDir folder of the export, with .br and .gz made at build
 */
export function staticFiles(distDir: string): RequestHandler {
  const files = mapFiles(distDir);
  const index = files.get('/index.html');
  if (!index) throw new Error(`The web client is not built: ${path.join(distDir, 'index.html')} is missing.`);
  return (request, response) => {
    const isRead = request.method === 'GET' || request.method === 'HEAD';
    const isScreen = !/^\/(api|_expo)(\/|$)/.test(request.path) && path.extname(request.path) === '';
    const found = files.get(request.path) ?? (isScreen ? index : undefined);
    if (!isRead || !found) {
      notFound(response);
      return;
    }
    sendFile(found, request.headers['accept-encoding'], request.headers['if-none-match'], request.method === 'HEAD', response);
  };
}
