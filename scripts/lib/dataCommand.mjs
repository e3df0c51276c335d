import { endWith } from './log.mjs';
import { isExternal, onStopSignal, openData } from './product.mjs';
import { migrate, serverCommand, serverEnv } from './server.mjs';
import { setUp } from './setup.mjs';

/**
 * Runs commands of the server on the product's data: in the database of a running `npm start` if there is one,
 * otherwise in one started for the time of the work.
 * @param {(command: (args: string[], extra?: NodeJS.ProcessEnv) => Promise<string>) => Promise<unknown>} work
 */
export async function withData(work) {
  let stop = async () => undefined;
  onStopSignal(() => stop());
  try {
    await setUp({ programs: isExternal() ? [] : ['mariadb'] });
    const { dataDir, db, external } = await openData({ mayJoin: true });
    stop = db.stop;
    if (db.ownerUrl && !db.joined) await migrate({ dataDir, db, external });
    await work((args, extra) => serverCommand(args, serverEnv({ dataDir, ...db, extra }), { show: true }));
    await stop();
    process.exit(0);
  } catch (error) {
    await stop();
    endWith(error);
  }
}
