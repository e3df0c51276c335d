import { QueryTypes, type QueryInterface } from 'sequelize';

/** What each migration is given. `appUser` = 'name'@'host' as SQL, null when one user owns and uses the tables. */
export interface MigrationContext {
  db: QueryInterface;
  appUser: string | null;
}
export interface Migration {
  name: string;
  up: (step: { context: MigrationContext }) => Promise<unknown>;
  down: (step: { context: MigrationContext }) => Promise<unknown>;
}

export type Privilege = 'SELECT' | 'INSERT' | 'UPDATE' | 'DELETE';

export const UTF8 = { charset: 'utf8mb4', collate: 'utf8mb4_unicode_520_ci' } as const;
/** For codes, hashes and ids: 'A' and 'a' differ, and nothing is folded together. */
export const EXACT = 'CHARACTER SET utf8mb4 COLLATE utf8mb4_bin';

/** Runs one statement of DDL. */
export const run = (context: MigrationContext, sql: string): Promise<unknown> => context.db.sequelize.query(sql);

/**
 * Gives the application's user these rights on a table, and notes them, so that every later `migrate` gives them again
 * (a database restored under another user keeps working). Append-only tables get SELECT and INSERT alone.
 */
export async function grantApp(context: MigrationContext, table: string, privileges: readonly Privilege[]): Promise<void> {
  await context.db.sequelize.query(
    'INSERT INTO schema_grants (table_name, privileges) VALUES (:table, :privileges) ON DUPLICATE KEY UPDATE privileges = :privileges',
    { replacements: { table, privileges: privileges.join(', ') } });
  if (context.appUser) await run(context, `GRANT ${privileges.join(', ')} ON \`${table}\` TO ${context.appUser}`);
}

/** Takes the rights away again, for a `down`. */
export async function revokeApp(context: MigrationContext, table: string): Promise<void> {
  const noted = await context.db.sequelize.query('SELECT privileges FROM schema_grants WHERE table_name = :table', { replacements: { table }, type: QueryTypes.SELECT });
  if (noted.length === 0) return;
  await context.db.sequelize.query('DELETE FROM schema_grants WHERE table_name = :table', { replacements: { table } });
  if (context.appUser) await run(context, `REVOKE ALL PRIVILEGES ON \`${table}\` FROM ${context.appUser}`);
}

/** Drops a table and takes back the rights on it. */
export async function dropTable(context: MigrationContext, table: string): Promise<void> {
  await revokeApp(context, table);
  await run(context, `DROP TABLE IF EXISTS \`${table}\``);
}

/**
 * Set to 1 on one connection of the owner, this lets the removal of the demo pass the triggers below. The application's
 * user gains nothing by it: it has no right to DELETE from these tables at all.
 */
export const REMOVING_DEMO = '@throughbond_removing_demo';

/** Refuses any change or removal of a row, whoever asks: only the owner of the table could drop the triggers. */
export async function appendOnlyTrigger(context: MigrationContext, table: string): Promise<void> {
  const refuse = `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${table} only grows: a row is never changed or removed'`;
  await run(context, `CREATE OR REPLACE TRIGGER \`${table}_no_update\` BEFORE UPDATE ON \`${table}\` FOR EACH ROW ${refuse}`);
  await run(context, `CREATE OR REPLACE TRIGGER \`${table}_no_delete\` BEFORE DELETE ON \`${table}\` FOR EACH ROW
    IF COALESCE(${REMOVING_DEMO}, 0) <> 1 THEN ${refuse}; END IF`);
}
