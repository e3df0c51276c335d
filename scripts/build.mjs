// npm run build: node modules, server and web client, without starting anything.
import { endWith, say } from './lib/log.mjs';
import { setUp } from './lib/setup.mjs';

try {
  await setUp({ programs: [], client: true });
  say('The server is in build/, the web client in dist/.');
} catch (error) {
  endWith(error);
}
