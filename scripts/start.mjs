// npm start: everything from a fresh clone to a running product, one command.
import { endWith, say } from './lib/log.mjs';
import { claimPort, isExternal, onStopSignal, openData, wantedPort } from './lib/product.mjs';
import { loadDemo, migrate, serverEnv, startServer } from './lib/server.mjs';
import { setUp } from './lib/setup.mjs';

const toStop = [];
const stopAll = async () => {
  while (toStop.length > 0) await toStop.pop()();
};
const isStopping = onStopSignal(async () => {
  say('Stopping …');
  await stopAll();
});

try {
  const port = wantedPort();
  await setUp({ programs: isExternal() ? [] : ['mariadb'], client: true });
  const { dataDir, db, external } = await openData();
  toStop.push(db.stop);
  await claimPort(port);
  if (db.ownerUrl) await migrate({ dataDir, db, external });
  await loadDemo({ dataDir, db, external });
  const server = await startServer({ port, env: serverEnv({ dataDir, appUrl: db.appUrl, port }), onSpawn: (stop) => toStop.push(stop) });
  const address = process.env.PUBLIC_URL || `http://localhost:${port}`;
  db.note?.({ address });
  process.stdout.write(`Throughbond is ready at ${address} (Ctrl-C stops it)\n`);
  const code = await server.ended;
  if (!isStopping()) {
    say(`The server ended unexpectedly (exit code ${code}).`);
    await stopAll();
    process.exit(code || 1);
  }
} catch (error) {
  if (!isStopping()) {
    await stopAll();
    endWith(error);
  }
}
