import { randomUUID } from 'node:crypto';
import { existsSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import path from 'node:path';

import { createApp } from './app';
import type { Passwords } from './auth/passwords';
import { createSessions } from './auth/sessions';
import { sessionSecret } from './auth/sessionSecret';
import { createThrottle } from './auth/throttle';
import { defineModels } from './db/models';
import { missingMigrations } from './db/migrator';
import { openDatabase, reaching } from './db/sequelize';
import type { Deps } from './deps';
import { neededDatabaseUrl, SettingError, type Env } from './env';
import type { Log } from './http/log';
import { countWaiting } from './features/reviews/read';
import { keepLetter } from './mail/mailbox';
import { relationRegistry, verifyRelations } from './relations/registry';
import { createMailer, localSender, smtpSender } from './mail/mailer';

/** Everything the server works with, from its settings; nothing listens yet. A test hands in a clock that it can move. */
export function makeDeps(env: Env, log: Log, passwords: Passwords, now: () => Date = () => new Date()): Deps {
  const db = openDatabase(neededDatabaseUrl(env));
  defineModels(db);
  const newId = randomUUID;
  const keep = keepLetter({ db, now, newId });
  const send = env.smtpUrl ? smtpSender(env.smtpUrl, env.mailFrom) : localSender(env.mailFrom, keep);
  return {
    env, db, log, now, newId, passwords,
    throttle: createThrottle({ db, now }),
    sessions: createSessions({ db, secret: sessionSecret(env.dataDir), now }),
    mail: createMailer(send, log),
    relations: relationRegistry(),
    reviewsWaiting: (pool, who) => countWaiting(pool, who, now()),
  };
}

/** Lets go of everything `makeDeps` opened; mail under way gets a moment. */
export async function stopDeps({ sessions, mail, passwords, db, log }: Deps): Promise<void> {
  sessions.stop();
  await Promise.race([mail.settled(), new Promise((resolve) => setTimeout(resolve, 300).unref())]);
  await passwords.close();
  await db.close();
  log.flush();
}

/** @throws SettingError in one sentence when the schema is older than this server */
export async function checkSchema(deps: Deps): Promise<void> {
  const missing = await reaching(neededDatabaseUrl(deps.env), () => missingMigrations(deps.db));
  const [first, ...more] = missing;
  if (first === undefined) return;
  const others = more.length === 0 ? '' : ` and ${more.length} more`;
  throw new SettingError(`The database lacks the migration ${first}${others}; run the server's "migrate" with DATABASE_OWNER_URL set to the user who owns the tables.`);
}

/** Listens, and resolves once it does. @throws SettingError when the port is taken */
async function listen(server: Server, port: number): Promise<number> {
  await new Promise<void>((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      reject(error.code === 'EADDRINUSE' ? new SettingError(`Port ${port} is in use; set PORT to a free one.`) : error);
    });
    server.listen(port, resolve);
  });
  return (server.address() as AddressInfo).port;
}

export interface Running {
  port: number;
  stop: () => Promise<void>;
}

/** Starts the whole product; `stop` lets answers under way finish for half a second, then ends. */
export async function serve(env: Env, log: Log, passwords: Passwords): Promise<Running> {
  const deps = makeDeps(env, log, passwords);
  try {
    await checkSchema(deps);
    const built = existsSync(path.join(env.distDir, 'index.html'));
    if (!built) log.info('client-not-built');
    const server = createServer(createApp(deps, { distDir: built ? env.distDir : null }));
    const port = await listen(server, env.port);
    log.info('listening', { port });
    // The rows cannot change while it runs, so their formulas may be verified after the port is open; a slip ends the server.
    verifyRelations(deps.relations).catch((error: unknown) => {
      log.error('relations-differ', { error });
      process.kill(process.pid, 'SIGTERM');
      process.exitCode = 1;
    });
    return { port, stop: () => stopServing(server, deps) };
  } catch (error) {
    await stopDeps(deps); // an open pool would keep a failed start alive
    throw error;
  }
}

async function stopServing(server: Server, deps: Deps): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeIdleConnections();
  const cut = setTimeout(() => server.closeAllConnections(), 500);
  await closed;
  clearTimeout(cut);
  await stopDeps(deps);
}
