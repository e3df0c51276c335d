import { randomBytes } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { makeSchema, withConnection } from '../setup/schemaTemplate.cjs';

export type Row = Record<string, unknown>;

export interface FreshDatabase {
  /** the schema's name */
  schema: string;
  /** address for the application's user, who owns nothing: what the server gets as DATABASE_URL */
  appUrl: string;
  /** address for the user who owns tables and triggers: what migrations get as DATABASE_OWNER_URL */
  ownerUrl: string;
  /** runs one statement as the application's user and returns its rows */
  asApp: (sql: string, values?: unknown[]) => Promise<Row[]>;
  /** runs one statement as the owner and returns its rows */
  asOwner: (sql: string, values?: unknown[]) => Promise<Row[]>;
  /** drops the schema; call it in afterAll */
  drop: () => Promise<void>;
}

interface TestDatabase {
  appUrl: string;
  ownerUrl: string;
  template: string[];
}

function testDatabase(): TestDatabase {
  const file = process.env.TEST_DB as string | undefined; // Metro types every variable as any
  if (!file) throw new Error('No test database: run this file in the project "api" or "e2e" of jest.');
  return JSON.parse(readFileSync(file, 'utf8')) as TestDatabase;
}

const query = (url: string, sql: string, values: unknown[] = []): Promise<Row[]> =>
  withConnection(url, (connection) => connection.query<Row[]>({ sql, bigIntAsNumber: true, insertIdAsNumber: true }, values));

/**
 * A schema of its own for one test file, with every migration applied and the same rights as in the product. The set-up
 * of the run migrated once and wrote the result down; here its statements are repeated.
 */
export async function freshDatabase(): Promise<FreshDatabase> {
  const run = testDatabase();
  const schema = `throughbond_${randomBytes(6).toString('hex')}`;
  const { appUrl, ownerUrl } = await makeSchema(run, run.template, schema);
  return {
    schema,
    appUrl,
    ownerUrl,
    asApp: (sql, values) => query(appUrl, sql, values),
    asOwner: (sql, values) => query(ownerUrl, sql, values),
    drop: async () => {
      await query(run.ownerUrl, `DROP DATABASE IF EXISTS ${schema}`);
    },
  };
}
