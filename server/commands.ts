import { parseArgs } from 'node:util';

import { createAdministrator } from './auth/firstAdministrator';
import type { Passwords } from './auth/passwords';
import { migrate } from './db/migrator';
import { reaching } from './db/sequelize';
import { neededDatabaseUrl, SettingError, type Env } from './env';
import type { Log } from './http/log';
import { checkSchema, makeDeps, serve, stopDeps } from './start';

interface Setting {
  env: Env;
  log: Log;
  passwords: Passwords;
}

const USAGE = 'Commands: serve (default) | migrate | demo load|reset|remove [--with-their-work] | admin create --email A --name N --password P (or ADMIN_PASSWORD)';
const say = (sentence: string) => process.stderr.write(`${sentence}\n`);

/** @throws SettingError for an option that is not known */
function options<const T extends NonNullable<Parameters<typeof parseArgs>[0]>['options']>(args: string[], known: T) {
  try {
    return parseArgs({ args, options: known });
  } catch (error) {
    throw new SettingError(`${error instanceof Error ? error.message : 'An option is not known'}. ${USAGE}`);
  }
}

/** Waits for the end: Ctrl-C, a service manager's SIGTERM. A second signal ends at once. */
async function serveUntilStopped({ env, log, passwords }: Setting): Promise<void> {
  const running = await serve(env, log, passwords);
  await new Promise<void>((resolve) => {
    for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => resolve());
  });
  await running.stop();
}

async function runMigrate({ env, passwords }: Setting): Promise<void> {
  const owner = env.databaseOwnerUrl ?? neededDatabaseUrl(env);
  const { ran, separateUser } = await reaching(owner, () => migrate({ owner, app: env.databaseUrl }));
  say(ran.length === 0 ? 'The database schema is current.' : `The database schema is current; ${ran.length} migrations ran.`);
  if (!separateUser) say('One database user owns and uses the tables, so a signed case is guarded by triggers alone; set DATABASE_OWNER_URL to a user of its own for the full guard.');
  await passwords.close();
}

async function runAdmin({ env, passwords }: Setting, args: string[]): Promise<void> {
  const { values } = options(args, { email: { type: 'string' }, name: { type: 'string' }, password: { type: 'string' } });
  // in the environment by preference: the arguments of a process can be read by others on the machine
  const password = values.password ?? env.adminPassword ?? '';
  say(await createAdministrator(neededDatabaseUrl(env), passwords, { email: values.email ?? '', name: values.name ?? '', password }));
  await passwords.close();
}

async function runDemo(setting: Setting, act: string | undefined, args: string[]): Promise<void> {
  const { demo } = await import('./db/demo'); // the whole invented story: no server needs it to serve
  const { values } = options(args, { 'with-their-work': { type: 'boolean' } });
  const deps = makeDeps(setting.env, setting.log, setting.passwords);
  try {
    await checkSchema(deps);
    const withTheirWork = values['with-their-work'] ?? false;
    if (act === 'load') say(await demo.load(deps));
    else if (act === 'remove') say(await demo.remove(deps, { withTheirWork }));
    else if (act === 'reset') say(await demo.reset(deps, { withTheirWork }));
    else throw new SettingError(USAGE);
  } finally {
    await stopDeps(deps);
  }
}

/** Runs one command of the server to its end. @throws SettingError for a command or setting that cannot be used */
export async function runCommand(args: readonly string[], setting: Setting): Promise<void> {
  const [command = 'serve', act, ...rest] = args;
  if (command === 'serve') return serveUntilStopped(setting);
  if (command === 'migrate') return runMigrate(setting);
  if (command === 'admin' && act === 'create') return runAdmin(setting, rest);
  if (command === 'demo') return runDemo(setting, act, rest);
  throw new SettingError(`There is no command "${[command, act].filter(Boolean).join(' ')}". ${USAGE}`);
}
