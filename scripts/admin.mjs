// npm run admin -- create [--email E] [--name N] [--password P] [--remove-demo]: makes the first administrator.
import { dataCommand } from './lib/dataCommand.mjs';

await dataCommand(['admin', ...process.argv.slice(2)], 'npm run admin -- create [--email E] [--name N] [--password P] [--remove-demo]   what is not given is asked for');
