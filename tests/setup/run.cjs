// What one jest run keeps for all its test files: a private MariaDB on throw-away data, and for end-to-end tests the
// built product on it. jest runs the set-up of each project in one process, so the parts are made once and shared.
const { mkdtempSync, rmSync, writeFileSync, chmodSync } = require('node:fs');
const { tmpdir } = require('node:os');
const path = require('node:path');
const { makeSchema, readTemplate } = require('./schemaTemplate.cjs');

const state = (globalThis.throughbondTestRun ??= { parts: {}, stop: [] });
const once = (name, make) => (state.parts[name] ??= make());
const lib = (name) => import(path.join(__dirname, '..', '..', 'scripts', 'lib', name));

/** Where the workers find the addresses: a file named by an environment variable, readable by this user only. */
function publish(name, value) {
  const folder = state.folder;
  const file = path.join(folder, `${name}.json`);
  writeFileSync(file, JSON.stringify(value), { mode: 0o600 });
  process.env[`TEST_${name.toUpperCase()}`] = file;
}

/** The database, with the schema migrated once and written down as statements that freshDatabase repeats. */
const database = () => once('database', async () => {
  const { setUp } = await lib('setup.mjs');
  const { openDatabase, TEST_SCHEMAS } = await lib('database.mjs');
  const { serverCommand, serverEnv } = await lib('server.mjs');
  await setUp({ programs: ['mariadb'] });
  state.folder = mkdtempSync(path.join(tmpdir(), 'throughbond-test-'));
  chmodSync(state.folder, 0o711); // the database's user must pass through
  state.stop.push(async () => rmSync(state.folder, { recursive: true, force: true }));
  const dataDir = path.join(state.folder, 'data');
  const db = await openDatabase(dataDir, { fast: true, schemas: TEST_SCHEMAS });
  state.stop.push(db.stop);
  await serverCommand(['migrate'], serverEnv({ dataDir, ...db }));
  const template = await readTemplate(db);
  publish('db', { appUrl: db.appUrl, ownerUrl: db.ownerUrl, template });
  return { db, template };
});

/** The built product with the demo loaded, on a port of its own. */
const product = () => once('product', async () => {
  const { setUp } = await lib('setup.mjs');
  await setUp({ programs: ['mariadb', 'chromium', 'poppler'], client: true });
  const { db, template } = await database();
  const { freePort } = await lib('port.mjs');
  const { serverCommand, serverEnv, startServer } = await lib('server.mjs');
  const port = await freePort();
  const dataDir = path.join(state.folder, 'product');
  const own = await makeSchema(db, template, 'throughbond_e2e');
  const address = `http://localhost:${port}`;
  const extra = { PUBLIC_URL: address };
  await serverCommand(['demo', 'load'], serverEnv({ dataDir, ...own, port, extra }));
  const server = await startServer({ port, quiet: true, env: serverEnv({ dataDir, appUrl: own.appUrl, port, extra }) });
  state.stop.push(server.stop);
  publish('product', { address, port, dataDir, ...own });
});

/** Stops what was started, last first. */
async function stop() {
  while (state.stop.length > 0) await state.stop.pop()();
  state.parts = {};
}

module.exports = { database, product, stop };
