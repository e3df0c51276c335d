import initStore from 'connect-session-sequelize';
import type { Request, RequestHandler } from 'express';
import session, { Store } from 'express-session';
import type { Sequelize } from 'sequelize';

import { SESSION_MODEL } from '@/server/db/models/SessionModel';
import { readActor, type Actor } from './actor';

declare module 'express-session' {
  interface SessionData {
    userId: string;
    /** the person's epoch at sign-in; "sign out everywhere" raises theirs, and this session ends */
    epoch: number;
    signedInAt: number;
  }
}

/** A working day; nothing prolongs it, so a forgotten sign-in ends by itself. */
export const SESSION_MS = 12 * 3600 * 1000;
const SWEEP_MS = 15 * 60 * 1000;

export interface Sessions {
  middleware: RequestHandler;
  /** who this request's session belongs to, read afresh */
  actorOf: (request: Request) => Promise<Actor | null>;
  /** a new session id for a person who has just shown who they are */
  begin: (request: Request, person: { id: string; sessionEpoch: number }) => Promise<void>;
  end: (request: Request) => Promise<void>;
  stop: () => void;
}

const called = (act: (done: (error?: unknown) => void) => void): Promise<void> =>
  new Promise((resolve, reject) => act((error) => (error ? reject(error instanceof Error ? error : new Error('The session could not be kept.')) : resolve())));

export function createSessions({ db, secret, now }: { db: Sequelize; secret: string; now: () => Date }): Sessions {
  // disableTouch is read by the store and missing in its types: without it every request would write the row
  const options = { db, table: SESSION_MODEL, checkExpirationInterval: SWEEP_MS, expiration: SESSION_MS, disableTouch: true };
  const store = new (initStore(Store))(options);
  return {
    middleware: session({
      // not `unset: 'destroy'`: where the session could not be read it is unset as well, and a moment without the database would sign people out
      name: 'tb.sid', secret, store, resave: false, saveUninitialized: false,
      // 'auto': Secure whenever the request came by TLS, which behind a proxy is told by X-Forwarded-Proto (TRUST_PROXY)
      cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', path: '/', maxAge: SESSION_MS },
    }),
    actorOf: async (request) => {
      const { userId, epoch, signedInAt } = request.session;
      if (userId === undefined || epoch === undefined || signedInAt === undefined) return null;
      if (now().getTime() - signedInAt >= SESSION_MS) return null;
      return readActor(db, userId, epoch, now());
    },
    begin: async (request, person) => {
      await called((done) => request.session.regenerate(done));
      Object.assign(request.session, { userId: person.id, epoch: person.sessionEpoch, signedInAt: now().getTime() });
      await called((done) => request.session.save(done));
    },
    end: (request) => called((done) => request.session.destroy(done)),
    stop: () => store.stopExpiringSessions(),
  };
}
