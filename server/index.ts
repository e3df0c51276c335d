import { passwordPool } from './auth/passwords';
import { runCommand } from './commands';
import { readEnv, SettingError } from './env';
import { createLog } from './http/log';
import { startThread } from './threads';

/** Built, the worker lies beside this file as JavaScript; in development both are sources. */
const workerFile = new URL(import.meta.url.endsWith('.ts') ? './workers/passwords.ts' : './workers/passwords.mjs', import.meta.url);

async function main(): Promise<void> {
  const log = createLog((text) => process.stdout.write(text), () => new Date());
  const passwords = passwordPool({ start: () => startThread(workerFile) });
  await runCommand(process.argv.slice(2), { env: readEnv(process.env), log, passwords });
}

main().catch((error: unknown) => {
  // A setting is told in its one sentence; anything else is ours, and its stack is what helps.
  console.error(error instanceof SettingError ? error.message : error);
  process.exitCode = 1;
});
