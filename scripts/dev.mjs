// npm run dev: hot reload of both halves. The page comes from Metro, which forwards /api to the server.
import { spawn } from 'node:child_process';
import { endWith, say } from './lib/log.mjs';
import { inRoot, root } from './lib/paths.mjs';
import { claimPort, isExternal, onStopSignal, openData, wantedPort } from './lib/product.mjs';
import { loadDemo, migrate, serverEnv, startServer } from './lib/server.mjs';
import { setUp } from './lib/setup.mjs';

const toStop = [];
const stopAll = async () => {
  while (toStop.length > 0) await toStop.pop()();
};
onStopSignal(async () => {
  say('Stopping …');
  await stopAll();
});

try {
  const port = wantedPort();
  const webPort = Number(process.env.WEB_PORT || 8081);
  await setUp({ programs: isExternal() ? [] : ['mariadb'] });
  const { dataDir, db, external } = await openData();
  toStop.push(db.stop);
  await claimPort(port);
  await claimPort(webPort);
  if (db.ownerUrl) await migrate({ dataDir, db, external });
  await loadDemo({ dataDir, db, external });
  const env = serverEnv({ dataDir, appUrl: db.appUrl, port, extra: { NODE_ENV: 'development', PUBLIC_URL: `http://localhost:${webPort}` } });
  await startServer({ port, env, args: ['--watch', '--watch-preserve-output', '--import', 'tsx', 'server/index.ts'], onSpawn: (stop) => toStop.push(stop) });
  const metro = spawn(process.execPath, [inRoot('node_modules', 'expo', 'bin', 'cli'), 'start', '--web', '--port', String(webPort)], {
    cwd: root, stdio: 'inherit', env: { ...process.env, API_PORT: String(port), BROWSER: 'none', EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1' },
  });
  toStop.push(async () => { metro.kill('SIGTERM'); });
  say(`The page is at http://localhost:${webPort}, the server at http://localhost:${port}.`);
} catch (error) {
  await stopAll();
  endWith(error);
}
