// npm run admin -- create [--email E] [--name N] [--password P] [--remove-demo]: makes the first administrator.
import { parseArgs } from 'node:util';
import { ask, askPassword, canAsk } from './lib/ask.mjs';
import { withData } from './lib/dataCommand.mjs';
import { SetupError, say } from './lib/log.mjs';

const USAGE = `npm run admin -- create [--email E] [--name N] [--password P] [--remove-demo]
What is not given is asked for. ADMIN_PASSWORD may hold the password in place of --password, which others can see in the list of processes.`;

function read() {
  try {
    return parseArgs({
      allowPositionals: true,
      options: { email: { type: 'string' }, name: { type: 'string' }, password: { type: 'string' }, 'remove-demo': { type: 'boolean' }, help: { type: 'boolean' } },
    });
  } catch (error) {
    say(`${error.message}\n${USAGE}`);
    return process.exit(2);
  }
}

const { values, positionals } = read();
if (values.help || positionals.join(' ') !== 'create') {
  say(USAGE);
  process.exit(values.help ? 0 : 2);
}

/** What was given, or an answer to a question; without a terminal, one sentence about what is missing. */
async function given(option, value, question, asking = ask) {
  if (value) return value;
  if (!canAsk()) throw new SetupError(`--${option} is missing, and there is no terminal to ask on; give it and run the command again.`);
  return asking(question);
}

await withData(async (command) => {
  const email = await given('email', values.email, 'E-mail of the administrator: ');
  const name = await given('name', values.name, 'Name: ');
  const password = await given('password', values.password ?? process.env.ADMIN_PASSWORD, 'Password: ', askPassword);
  await command(['admin', 'create', '--email', email, '--name', name], { ADMIN_PASSWORD: password });
  if (values['remove-demo'] || (canAsk() && /^y(es)?$/i.test(await ask('Remove the demo accounts and their cases? [y/N] ')))) await command(['demo', 'remove']);
  else say('Demo accounts, if there are any, stay; "npm run demo -- remove" takes them away.');
});
