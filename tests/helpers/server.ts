import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import bcrypt from 'bcryptjs';
import type { Express } from 'express';
import request from 'supertest';

import { createApp } from '@/server/app';
import { prepared, type Passwords } from '@/server/auth/passwords';
import { MembershipModel } from '@/server/db/models/MembershipModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { UserModel } from '@/server/db/models/UserModel';
import type { Deps } from '@/server/deps';
import { readEnv, type Env } from '@/server/env';
import { createLog } from '@/server/http/log';
import { makeDeps } from '@/server/start';
import type { ProblemBody } from '@/shared/contracts/problem';
import type { ProjectRole, SiteRole } from '@/shared/types/roles';
import { freshDatabase, type FreshDatabase } from './database';
import { PASSWORD } from './password';

export { PASSWORD };

/** The real algorithm at its lowest cost, in this process: the pool of threads has a test of its own. */
const cheapPasswords: Passwords = {
  hash: (password) => bcrypt.hash(prepared(password), 4),
  matches: async (password, stored) => stored !== null && bcrypt.compare(prepared(password), stored),
  close: () => Promise.resolve(),
};


export interface TestPerson {
  id: string;
  name: string;
  email: string;
}

export interface TestServer {
  app: Express;
  deps: Deps;
  database: FreshDatabase;
  /** moves the server's clock; it starts at the real time */
  pass: (ms: number) => void;
  /** lines of the log so far */
  logged: () => string;
  person: (name: string, more?: { siteRole?: SiteRole; isDemo?: boolean; status?: 'active' | 'disabled' }) => Promise<TestPerson>;
  project: (key: string, people: { who: TestPerson; role: ProjectRole; guestUntil?: string | null }[], more?: { isDemo?: boolean; peerReview?: boolean }) => Promise<string>;
  /** somebody signed in, as their browser would be */
  signedIn: (who: TestPerson) => Promise<Client>;
  visitor: () => Client;
  stop: () => Promise<void>;
}

/** Answers whose bodies have a type of their own. */
export interface Answer<T> {
  status: number;
  body: T;
  headers: Record<string, string | undefined>;
  text: string;
}

export interface Client {
  agent: ReturnType<typeof request.agent>;
  get: <T = ProblemBody>(path: string) => Promise<Answer<T>>;
  post: <T = ProblemBody>(path: string, body?: object) => Promise<Answer<T>>;
  put: <T = ProblemBody>(path: string, body?: object) => Promise<Answer<T>>;
  delete: <T = ProblemBody>(path: string) => Promise<Answer<T>>;
}

function clientOf(agent: ReturnType<typeof request.agent>): Client {
  return {
    agent,
    get: (path) => agent.get(path).then(),
    post: (path, body = {}) => agent.post(path).send(body).then(),
    put: (path, body = {}) => agent.put(path).send(body).then(),
    delete: (path) => agent.delete(path).then(),
  };
}

/** A whole server on a schema of its own; nothing listens but what supertest opens. Call `stop` in afterAll. */
export async function testServer(environment: Partial<Record<string, string>> = {}): Promise<TestServer> {
  const database = await freshDatabase();
  const dataDir = mkdtempSync(path.join(tmpdir(), 'throughbond-api-'));
  const env: Env = readEnv({ NODE_ENV: 'test', DATA_DIR: dataDir, DATABASE_URL: database.appUrl, ...environment });
  let offset = 0;
  const now = () => new Date(Date.now() + offset);
  let lines = '';
  const log = createLog((text) => { lines += text; }, now);
  const made = makeDeps(env, log, cheapPasswords, now);
  const app = createApp(made, { distDir: null });
  const client = () => clientOf(request.agent(app));
  return {
    app, deps: made, database,
    pass: (ms) => { offset += ms; },
    logged: () => {
      log.flush();
      return lines;
    },
    person: async (name, more = {}) => {
      const id = randomUUID();
      const email = `${name.toLowerCase().replace(/[^a-z]+/g, '.')}@team.example`;
      await UserModel.create({ id, name, email, passwordHash: await cheapPasswords.hash(PASSWORD), ...more });
      return { id, name, email };
    },
    project: async (key, people, more = {}) => {
      const id = randomUUID();
      const creator = people[0]?.who.id;
      if (creator === undefined) throw new Error('A project needs somebody.');
      await ProjectModel.create({ id, projectKey: key, name: `Project ${key}`, createdBy: creator, ...more });
      for (const { who, role, guestUntil = null } of people) await MembershipModel.create({ projectId: id, userId: who.id, role, guestUntil, joinedAt: now() });
      return id;
    },
    visitor: client,
    signedIn: async ({ email }) => {
      const one = client();
      const { status, text } = await one.post('/api/session', { email, password: PASSWORD });
      if (status !== 200) throw new Error(`Sign-in failed with ${status}: ${text}`);
      return one;
    },
    stop: async () => {
      await made.mail.settled();
      made.sessions.stop();
      await made.db.close();
      await database.drop();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
