import { readdir, readFile } from 'node:fs/promises';
import { createServer } from 'node:http';
import path from 'node:path';
import { brotliCompressSync, constants } from 'node:zlib';

const TYPES: Record<string, string> = { '.html': 'text/html', '.js': 'text/javascript', '.css': 'text/css', '.json': 'application/json' };

/** Serves a built page with brotli 11, packed before it listens, as the product's own static handler does. */
export async function serveFolder(folder: string): Promise<{ url: string; close: () => void }> {
  const files = new Map<string, Buffer>();
  for (const entry of await readdir(folder, { recursive: true, withFileTypes: true })) {
    if (!entry.isFile()) continue;
    const file = path.join(entry.parentPath, entry.name);
    const content = await readFile(file);
    files.set(`/${path.relative(folder, file)}`, brotliCompressSync(content, { params: { [constants.BROTLI_PARAM_QUALITY]: 11, [constants.BROTLI_PARAM_SIZE_HINT]: content.length } }));
  }
  const server = createServer((request, response) => {
    const wanted = decodeURIComponent(new URL(request.url ?? '/', 'http://localhost').pathname);
    const name = path.extname(wanted) === '' ? '/index.html' : wanted;
    const packed = files.get(name);
    if (packed === undefined) {
      response.writeHead(404).end();
      return;
    }
    response.writeHead(200, { 'content-type': TYPES[path.extname(name)] ?? 'application/octet-stream', 'content-encoding': 'br' }).end(packed);
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('no port');
  return {
    url: `http://127.0.0.1:${address.port}`,
    close: () => {
      server.close();
      server.closeAllConnections();
    },
  };
}
