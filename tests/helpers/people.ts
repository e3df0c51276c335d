import { randomBytes, randomUUID } from 'node:crypto';
import bcrypt from 'bcryptjs';
import type { APIResponse, Browser, BrowserContext } from 'playwright-core';

import { prepared } from '@/server/auth/passwords';
import { DEMO_PASSWORD, PEOPLE } from '@/server/db/demo/people';
import type { PersonKey } from '@/server/db/demo/story';
import type { SessionResponse } from '@/shared/contracts/session';
import type { ProjectRole, SiteRole } from '@/shared/types/roles';
import { withConnection } from '../setup/schemaTemplate.cjs';
import { openPage, product, visit, type OpenPage, type PageOptions } from './browser';
import { ok, type Caller } from './caseWork';
import { PASSWORD } from './password';
import type { Answer, TestPerson } from './server';

export type Person = TestPerson & { password: string };

/** Statements on the product's own database, as the application's user. */
export const sql = (statement: string, values: unknown[] = [], url = product().appUrl): Promise<Record<string, unknown>[]> =>
  withConnection(url, (connection) => connection.query<Record<string, unknown>[]>(statement, values));

let hash: Promise<string> | undefined;
/** The real algorithm at its lowest cost: sign-in itself is tested elsewhere. */
const passwordHash = () => (hash ??= bcrypt.hash(prepared(PASSWORD), 4));

/** An account of its own for one test; the name is given, the address is made unlike any other. */
export async function makePerson(name: string, more: { siteRole?: SiteRole } = {}, url?: string): Promise<Person> {
  const id = randomUUID();
  const email = `${name.toLowerCase().replace(/[^a-z0-9]+/g, '.')}.${randomBytes(3).toString('hex')}@e2e.example`;
  await sql('INSERT INTO users (id, email, name, password_hash, site_role, created_at, updated_at) VALUES (?, ?, ?, ?, ?, NOW(3), NOW(3))', [id, email, name, await passwordHash(), more.siteRole ?? 'member'], url);
  return { id, name, email, password: PASSWORD };
}

export interface Scene<Name extends string> {
  projectId: string;
  projectName: string;
  people: Record<Name, Person>;
}

const fullNames: Record<string, string> = { author: 'Nora Lindqvist', second: 'Ravi Menke', reviewer: 'Ines Kovalen', lead: 'Bram Oduya', reader: 'Lea Sorvino', stranger: 'Otto Nakagi' };

/** A project with people of its own, so that tests at the same time never meet. The keys name the people, the values their roles. */
export async function makeScene<Name extends string>(roles: Record<Name, ProjectRole>, more: { isDemo?: boolean } = {}, url?: string): Promise<Scene<Name>> {
  const names = Object.keys(roles) as Name[];
  const people = Object.fromEntries(await Promise.all(names.map(async (name) => [name, await makePerson(fullNames[name] ?? name, {}, url)]))) as Record<Name, Person>;
  const projectId = randomUUID();
  const key = `E${randomBytes(4).readUInt32BE().toString(36).toUpperCase().padStart(7, 'X').slice(-5)}`;
  const projectName = `Trial ${key}`;
  const creator = people[names[0]!];
  await sql('INSERT INTO projects (id, project_key, name, is_demo, created_by, created_at, updated_at) VALUES (?, ?, ?, ?, ?, NOW(3), NOW(3))', [projectId, key, projectName, more.isDemo ? 1 : 0, creator.id], url);
  for (const name of names) await sql('INSERT INTO memberships (project_id, user_id, role, joined_at) VALUES (?, ?, ?, NOW(3))', [projectId, people[name].id, roles[name]], url);
  return { projectId, projectName, people };
}

/** One of the demo's people. */
export const demoPerson = (key: PersonKey): Omit<Person, 'id'> => ({ name: PEOPLE[key].name, email: PEOPLE[key].email, password: DEMO_PASSWORD });

async function answerOf<T>(response: APIResponse): Promise<Answer<T>> {
  const text = await response.text();
  const isJson = /json/.test(response.headers()['content-type'] ?? '');
  return { status: response.status(), body: (isJson ? JSON.parse(text) : text) as T, headers: response.headers(), text };
}

/** The server's own paths with the cookies of this browser context, beside what its pages do. */
export function callerOf({ request }: BrowserContext): Caller {
  const send = (method: string) => async <T>(path: string, body: object = {}): Promise<Answer<T>> => answerOf<T>(await request.fetch(path, { method, data: body }));
  return { get: async (path) => answerOf(await request.get(path)), post: send('POST'), put: send('PUT'), delete: (path) => send('DELETE')(path) };
}

export interface SignedInPage extends OpenPage { caller: Caller }

/** A page whose person is signed in before its first screen loads. */
export async function openAs(browser: Browser, who: Pick<Person, 'email' | 'password'>, options: PageOptions = {}): Promise<SignedInPage> {
  const open = await openPage(browser, options);
  const caller = callerOf(open.context);
  ok(await caller.post<SessionResponse>('/api/session', { email: who.email, password: who.password }));
  return { ...open, caller };
}

/** As `visit`, with somebody signed in. */
export const visitAs = (browser: Browser, who: Pick<Person, 'email' | 'password'>, options: PageOptions, work: (open: SignedInPage) => Promise<void>): Promise<void> =>
  visit(browser, options, async (open) => {
    const caller = callerOf(open.context);
    ok(await caller.post<SessionResponse>('/api/session', { email: who.email, password: who.password }));
    await work({ ...open, caller });
  });
