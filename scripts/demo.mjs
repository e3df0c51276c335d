// npm run demo -- load|reset|remove: the invented demo projects, cases and accounts.
import { withData } from './lib/dataCommand.mjs';
import { say } from './lib/log.mjs';

const [act] = process.argv.slice(2);
if (!['load', 'reset', 'remove'].includes(act)) {
  say('npm run demo -- load | reset | remove\nload: when it is not there; reset: as on the first day; remove: its accounts and cases');
  process.exit(act === '--help' ? 0 : 2);
}
await withData((command) => command(['demo', act]));
