import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';

import { REMOVING_DEMO } from '../migrations/step';

/** Tables whose rows belong to a case, in the order in which they can go; query messages hang on their query. */
const OF_A_CASE = ['case_tags', 'comments', 'review_checks', 'addenda', 'signatures', 'attachments', 'case_events', 'case_revisions'] as const;
const OF_A_PROJECT = ['case_counts', 'project_events', 'invitations', 'memberships'] as const;

export interface Removed {
  projects: number;
  cases: number;
  accounts: number;
  /** demo accounts that real projects name: they stay as names, disabled */
  kept: number;
  /** hashes of files that no attachment names any more */
  files: string[];
}

/** Cases in demo projects that somebody else than a demo account wrote or saved: real work that must not go unseen. */
export async function realWorkIn(db: Sequelize): Promise<{ code: string; by: string }[]> {
  return db.query<{ code: string; by: string }>(
    `SELECT DISTINCT c.code, u.name AS \`by\` FROM cases c JOIN projects p ON p.id = c.project_id AND p.is_demo = 1
       JOIN case_revisions r ON r.case_id = c.id JOIN users u ON u.id = r.saved_by_id AND u.is_demo = 0 ORDER BY c.code`,
    { type: QueryTypes.SELECT });
}

/**
 * Takes every demo row out, in one transaction on the owner's connection. The guards against removal look at a variable
 * of this one connection, set here and put back here, whatever happens.
 */
export async function removeDemo(owner: Sequelize): Promise<Removed> {
  return owner.transaction(async (transaction) => {
    const run = (sql: string): Promise<unknown> => owner.query(sql, { transaction });
    await run(`SET ${REMOVING_DEMO} = 1`);
    // two cases may name each other (supersedes, superseded by); every row that names a removed one goes in this same transaction
    await run('SET FOREIGN_KEY_CHECKS = 0');
    try {
      return await takeOut(owner, transaction);
    } finally {
      await run('SET FOREIGN_KEY_CHECKS = 1');
      await run(`SET ${REMOVING_DEMO} = NULL`);
    }
  });
}

async function takeOut(owner: Sequelize, transaction: Transaction): Promise<Removed> {
  const run = (sql: string): Promise<unknown> => owner.query(sql, { transaction });
  const select = <T extends object>(sql: string): Promise<T[]> => owner.query<T>(sql, { transaction, type: QueryTypes.SELECT });
  const count = async (sql: string): Promise<number> => Number((await select<{ n: number | string }>(sql))[0]?.n ?? 0);

  const projects = 'SELECT id FROM projects WHERE is_demo = 1';
  const cases = `SELECT id FROM cases WHERE project_id IN (${projects})`;
  const removed = {
    projects: await count('SELECT COUNT(*) AS n FROM projects WHERE is_demo = 1'),
    cases: await count(`SELECT COUNT(*) AS n FROM cases WHERE project_id IN (${projects})`),
  };
  const files = await select<{ sha256: string }>(`SELECT DISTINCT sha256 FROM attachments WHERE case_id IN (${cases})`);
  await run(`DELETE FROM query_messages WHERE query_id IN (SELECT id FROM review_queries WHERE case_id IN (${cases}))`);
  await run(`DELETE FROM review_queries WHERE case_id IN (${cases})`);
  for (const table of OF_A_CASE) await run(`DELETE FROM ${table} WHERE case_id IN (${cases})`);
  await run(`DELETE FROM cases WHERE project_id IN (${projects})`);
  for (const table of OF_A_PROJECT) await run(`DELETE FROM ${table} WHERE project_id IN (${projects})`);
  await run('DELETE FROM projects WHERE is_demo = 1');
  const stillNamed = files.length === 0 ? [] : await select<{ sha256: string }>(`SELECT DISTINCT sha256 FROM attachments WHERE sha256 IN (${files.map(({ sha256 }) => `'${sha256}'`).join(', ')})`);
  const named = new Set(stillNamed.map(({ sha256 }) => sha256));

  const accounts = await removeAccounts(owner, transaction);
  return { ...removed, ...accounts, files: files.map(({ sha256 }) => sha256).filter((sha256) => !named.has(sha256)) };
}

/** A demo account that a real project's record names (it was invited there) stays as a name, disabled; all others go. */
async function removeAccounts(owner: Sequelize, transaction: Transaction): Promise<{ accounts: number; kept: number }> {
  const run = (sql: string): Promise<unknown> => owner.query(sql, { transaction });
  const demoUsers = 'SELECT id FROM users WHERE is_demo = 1';
  await run(`DELETE FROM account_events WHERE user_id IN (${demoUsers}) OR by_id IN (${demoUsers})`);
  await run(`DELETE FROM password_resets WHERE user_id IN (${demoUsers})`);
  await run(`DELETE FROM memberships WHERE user_id IN (${demoUsers})`);
  await run(`DELETE FROM mailbox WHERE recipient IN (SELECT email FROM users WHERE is_demo = 1)`);
  const columns = await owner.query<{ tableName: string; columnName: string }>(
    `SELECT TABLE_NAME AS tableName, COLUMN_NAME AS columnName FROM information_schema.KEY_COLUMN_USAGE
      WHERE TABLE_SCHEMA = DATABASE() AND REFERENCED_TABLE_SCHEMA = DATABASE() AND REFERENCED_TABLE_NAME = 'users'`,
    { transaction, type: QueryTypes.SELECT });
  const named = columns.map(({ tableName, columnName }) => `SELECT \`${columnName}\` FROM \`${tableName}\` WHERE \`${columnName}\` IS NOT NULL`).join(' UNION ');
  const [rows] = await owner.query<{ stay: number | string; gone: number | string }>(
    `SELECT COALESCE(SUM(id IN (${named})), 0) AS stay, COALESCE(SUM(id NOT IN (${named})), 0) AS gone FROM users WHERE is_demo = 1`, { transaction, type: QueryTypes.SELECT });
  // what stays is a name and nothing else: its address is free again for the next demo
  await run(`UPDATE users SET status = 'disabled', session_epoch = session_epoch + 1, password_hash = '', is_demo = 0,
    email = CONCAT(LEFT(id, 8), '@removed.example') WHERE is_demo = 1 AND id IN (${named})`);
  await run('DELETE FROM users WHERE is_demo = 1');
  return { accounts: Number(rows?.gone ?? 0), kept: Number(rows?.stay ?? 0) };
}
