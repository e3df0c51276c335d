import { endWith } from './log.mjs';
import { isExternal, onStopSignal, openData } from './product.mjs';
import { migrate, serverCommand, serverEnv } from './server.mjs';
import { setUp } from './setup.mjs';

/**
 * Runs a command of the server on the product's data: in the database of a running `npm start` if there is one,
 * otherwise in one started for the command's time.
 * @param {string[]} args the server's command, for instance ['admin', 'create']
 */
export async function dataCommand(args, usage) {
  if (args.length < 2 || args.includes('--help')) {
    process.stderr.write(`${usage}\n`);
    process.exit(args.includes('--help') ? 0 : 2);
  }
  let stop = async () => undefined;
  onStopSignal(() => stop());
  try {
    await setUp({ programs: isExternal() ? [] : ['mariadb'] });
    const { dataDir, db, external } = await openData({ mayJoin: true });
    stop = db.stop;
    if (db.ownerUrl && !db.joined) await migrate({ dataDir, db, external });
    await serverCommand(args, serverEnv({ dataDir, ...db }), { show: true });
    await stop();
  } catch (error) {
    await stop();
    endWith(error);
  }
}
