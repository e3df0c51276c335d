// npm run demo -- load|reset|remove: the invented demo projects, cases and accounts.
import { dataCommand } from './lib/dataCommand.mjs';

await dataCommand(['demo', ...process.argv.slice(2)], 'npm run demo -- load | reset | remove   load: when absent; reset: as on the first day; remove: accounts and cases');
