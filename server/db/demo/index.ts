import { rm } from 'node:fs/promises';
import path from 'node:path';

import { UserModel } from '@/server/db/models/UserModel';
import { openDatabase } from '@/server/db/sequelize';
import type { Deps } from '@/server/deps';
import { attachmentService } from '@/server/features/attachments/service';
import type { CaseDeps } from '@/server/features/cases/deps';
import { SettingError } from '@/server/env';
import { keepLetter } from '@/server/mail/mailbox';
import type { Letter } from '@/server/mail/mailer';
import { relationRegistry } from '@/server/relations/registry';
import { fileBlobs } from '@/server/storage/blobs';
import { caseTrail, quickLook } from '@/shared/engine';
import { demoText } from '@/shared/text/demo';

import { DEMO_CASES } from './content';
import { storyClock } from './moments';
import { DEMO_PASSWORD, PEOPLE } from './people';
import { realWorkIn, type Removed, removeDemo } from './remove';
import { setScene } from './setScene';
import { at } from './story';
import { tellStory } from './tell';

/** When the invented accounts and projects came to be, a little before the first case. */
const BEGIN = at(60, '08:00');

export interface DemoOptions {
  /** also take cases out that other accounts than the demo's wrote in demo projects */
  withTheirWork?: boolean;
}

/** While an account of the demo is there, loading again would tell the story twice. */
const isLoaded = async (_deps: Deps): Promise<boolean> => (await UserModel.count({ where: { isDemo: true } })) > 0;

/** The administrator of the demo gets a password only when the whole story is told, so a load that was broken off shows. */
const wasBrokenOff = async (): Promise<boolean> => (await UserModel.count({ where: { isDemo: true, passwordHash: '' } })) > 0;

/** Loads the demo when it is absent, and anew when an earlier load was broken off. @returns one sentence on what was done */
async function load(deps: Deps): Promise<string> {
  if (await wasBrokenOff()) await remove(deps);
  if (await isLoaded(deps)) return demoText.alreadyThere;
  const emails = Object.values(PEOPLE).map(({ email }) => email);
  const taken = await UserModel.findOne({ where: { email: emails }, attributes: ['email'] });
  if (taken) throw new SettingError(demoText.emailTaken(taken.email));
  const { instant, day } = storyClock(deps.now());
  const passwordHash = await deps.passwords.hash(DEMO_PASSWORD);
  const scene = await deps.db.transaction((transaction) => setScene({ newId: deps.newId, passwordHash, begin: instant(BEGIN), day, transaction }));
  const stage = storyDeps(deps, instant(BEGIN));
  const origin = deps.env.publicUrl ?? `http://localhost:${deps.env.port}`;
  await tellStory({ ...stage, ...scene, instant, day, origin, attachments: attachmentService(stage.deps, fileBlobs(deps.env.dataDir)) }, DEMO_CASES);
  await UserModel.update({ passwordHash }, { where: { id: scene.personIds.petra }, silent: true });
  return demoText.loaded(DEMO_CASES.length);
}

/**
 * What the services work with while the story is told: its own clock, mail that only ever reaches the local mailbox, and no
 * password asked for (it was set a moment ago, and forty slow comparisons would prove nothing).
 */
function storyDeps(deps: Deps, begin: Date): { deps: CaseDeps; setClock: (at: Date) => void; settleMail: () => Promise<void> } {
  let clock = begin;
  const now = (): Date => clock;
  const keep = keepLetter({ db: deps.db, now, newId: deps.newId });
  let waiting: (Letter | (() => Promise<Letter | null>))[] = [];
  const registry = relationRegistry();
  return {
    deps: {
      db: deps.db, now, newId: deps.newId,
      mail: { post: (letter) => void waiting.push(letter) },
      confirm: () => Promise.resolve(),
      trailOf: (content) => caseTrail(content, registry),
      quickLook: (input) => quickLook(input, registry),
    },
    setClock: (next) => { clock = next; },
    settleMail: async () => {
      const letters = waiting;
      waiting = [];
      if (deps.env.smtpUrl !== undefined) return; // a real mail server is never troubled with invented people
      for (const letter of letters) {
        const ready = typeof letter === 'function' ? await letter() : letter;
        if (ready) await keep(ready);
      }
    },
  };
}

/** Takes the demo out and nothing else. Needs the user who owns the tables. @returns one sentence on what was done */
async function remove(deps: Deps, { withTheirWork = false }: DemoOptions = {}): Promise<string> {
  const { databaseOwnerUrl, databaseUrl, dataDir } = deps.env;
  const url = databaseOwnerUrl ?? databaseUrl;
  if (url === undefined) throw new SettingError(demoText.needsOwner);
  const theirs = await realWorkIn(deps.db);
  if (theirs.length > 0 && !withTheirWork) throw new SettingError(demoText.theirWork(theirs));
  const owner = openDatabase(url, 1);
  try {
    const removed: Removed = await removeDemo(owner);
    await Promise.all(removed.files.map((sha256) => rm(path.join(dataDir, 'attachments', sha256.slice(0, 2), sha256), { force: true })));
    return removed.projects + removed.accounts + removed.kept === 0 ? demoText.notThere : demoText.removed(removed);
  } finally {
    await owner.close();
  }
}

/** The demo as on its first day, with today's dates. */
async function reset(deps: Deps, options: DemoOptions = {}): Promise<string> {
  await remove(deps, options);
  return load(deps);
}

export const demo = { load, reset, remove, isLoaded };
