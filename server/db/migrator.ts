import { QueryTypes, type Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';

import { migrations } from './migrations';
import type { MigrationContext } from './migrations/step';
import { databaseParts, openDatabase } from './sequelize';

const TABLE = 'schema_migrations';

/** Who the application is to the database, as 'name'@'host' in SQL; asked from the server, which alone knows the host part. */
async function appUserAs(appUrl: string): Promise<string> {
  const { user, password, host, port } = databaseParts(appUrl);
  const credentials = `${encodeURIComponent(user)}:${encodeURIComponent(password)}`;
  // information_schema, because a user without any right yet may not open the schema itself
  const app = openDatabase(`mariadb://${credentials}@${host.includes(':') ? `[${host}]` : host}:${port}/information_schema`, 1);
  try {
    const [row] = await app.query<{ account: string }>('SELECT CURRENT_USER() AS account', { type: QueryTypes.SELECT });
    const account = row?.account ?? '';
    const at = account.lastIndexOf('@');
    const quote = (part: string) => `'${part.replace(/['\\]/g, '\\$&')}'`;
    return `${quote(account.slice(0, at))}@${quote(account.slice(at + 1))}`;
  } finally {
    await app.close();
  }
}

export const migrator = (owner: Sequelize, appUser: string | null) => {
  const context: MigrationContext = { db: owner.getQueryInterface(), appUser };
  return new Umzug<MigrationContext>({
    context, storage: new SequelizeStorage({ sequelize: owner, tableName: TABLE }), logger: undefined,
    migrations: migrations.map(({ name, up, down }) => ({ name, up, down })),
  });
};

/**
 * Brings the schema up to this version and gives the application's user its rights, table by table.
 * @param urls.owner who owns the tables; urls.app who uses them (the same for a database with one user: no grants then)
 * @returns names of the migrations that ran now, and whether rights were given to a user of its own
 */
export async function migrate(urls: { owner: string; app?: string | undefined }): Promise<{ ran: string[]; separateUser: boolean }> {
  const owner = openDatabase(urls.owner, 2);
  try {
    const separateUser = urls.app !== undefined && databaseParts(urls.app).user !== databaseParts(urls.owner).user;
    const appUser = separateUser && urls.app ? await appUserAs(urls.app) : null;
    const ran = await migrator(owner, appUser).up();
    if (appUser) await giveRights(owner, appUser);
    return { ran: ran.map(({ name }) => name), separateUser };
  } finally {
    await owner.close();
  }
}

async function giveRights(owner: Sequelize, appUser: string): Promise<void> {
  const noted = await owner.query<{ table_name: string; privileges: string }>('SELECT table_name, privileges FROM schema_grants', { type: QueryTypes.SELECT });
  for (const { table_name: table, privileges } of noted) await owner.query(`GRANT ${privileges} ON \`${table}\` TO ${appUser}`);
  await owner.query(`GRANT SELECT ON \`${TABLE}\` TO ${appUser}`);
}

/** Names of the migrations that the database lacks; all of them when it holds no schema yet. Reads only. */
export async function missingMigrations(db: Sequelize): Promise<string[]> {
  const done = new Set<string>();
  try {
    const rows = await db.query<{ name: string }>(`SELECT name FROM ${TABLE}`, { type: QueryTypes.SELECT });
    for (const { name } of rows) done.add(name);
  } catch (error) {
    if (!isMissingTable(error)) throw error;
  }
  return migrations.map(({ name }) => name).filter((name) => !done.has(name));
}

/** No such table (1146), or no right to read it (1142, 1044): for the application's user the same thing. */
function isMissingTable(error: unknown): boolean {
  const errno = (error as { parent?: { errno?: number } }).parent?.errno;
  return errno === 1146 || errno === 1142 || errno === 1044;
}
