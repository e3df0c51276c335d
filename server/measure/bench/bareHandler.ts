import express from 'express';

/** What the quick look is held against: Express parsing the same body and answering a few bytes of JSON, nothing more. */
export async function bareHandler([port]: string[]): Promise<number> {
  const app = express();
  app.get('/ready', (_request, response) => void response.json({ ready: true }));
  app.post('/api/quick-look', express.json(), (request, response) => {
    const body = request.body as { j?: unknown };
    response.json({ j: body.j });
  });
  await new Promise<void>((resolve) => {
    const server = app.listen(Number(port), '127.0.0.1');
    process.once('SIGTERM', () => server.close(() => resolve()) && server.closeAllConnections());
  });
  return 0;
}
