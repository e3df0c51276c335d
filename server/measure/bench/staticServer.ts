import { createServer } from 'node:http';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { brotliCompressSync, constants } from 'node:zlib';

const TYPES: Record<string, string> = { '.html': 'text/html', '.js': 'text/javascript', '.css': 'text/css', '.json': 'application/json' };

/** Serves a built page with brotli 11, as the product's own static handler does. */
export async function serveFolder(folder: string): Promise<{ url: string; close: () => void }> {
  const server = createServer((request, response) => {
    void (async () => {
      const wanted = decodeURIComponent(new URL(request.url ?? '/', 'http://localhost').pathname);
      const file = path.join(folder, path.extname(wanted) === '' ? 'index.html' : wanted);
      try {
        const content = await readFile(file);
        const packed = brotliCompressSync(content, { params: { [constants.BROTLI_PARAM_QUALITY]: 11, [constants.BROTLI_PARAM_SIZE_HINT]: content.length } });
        response.writeHead(200, { 'content-type': TYPES[path.extname(file)] ?? 'application/octet-stream', 'content-encoding': 'br' });
        response.end(packed);
      } catch {
        response.writeHead(404);
        response.end();
      }
    })();
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('no port');
  return { url: `http://127.0.0.1:${address.port}`, close: () => { server.close(); server.closeAllConnections(); } };
}
