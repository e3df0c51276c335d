import { dropTable, EXACT, grantApp, run, type Migration } from './step';

/**
 * A number a project that grows with every change that a list of its cases could show. Counts of a search are kept in memory
 * beside it and hold until it moves, so that paging through a large log counts once.
 */
const raise = (row: 'NEW' | 'OLD') => `INSERT INTO case_stamps (project_id, stamp) VALUES (${row}.project_id, 1) ON DUPLICATE KEY UPDATE stamp = stamp + 1`;
const TRIGGERS = [
  ['cases_stamp_insert', 'AFTER INSERT ON cases', raise('NEW')],
  ['cases_stamp_update', 'AFTER UPDATE ON cases', `BEGIN
    IF NOT (NEW.version <=> OLD.version AND NEW.state <=> OLD.state AND NEW.reviewer_id <=> OLD.reviewer_id AND NEW.search_text <=> OLD.search_text) THEN
      ${raise('NEW')};
    END IF;
  END`],
  ['cases_stamp_delete', 'AFTER DELETE ON cases', raise('OLD')],
] as const;

export const caseStamps115: Migration = {
  name: '115-case-stamps',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS case_stamps (
      project_id CHAR(36) ${EXACT} NOT NULL PRIMARY KEY,
      stamp BIGINT UNSIGNED NOT NULL
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    for (const [name, moment, body] of TRIGGERS) await run(context, `CREATE OR REPLACE TRIGGER ${name} ${moment} FOR EACH ROW ${body}`);
    await grantApp(context, 'case_stamps', ['SELECT']);
  },
  down: async ({ context }) => {
    for (const [name] of TRIGGERS) await run(context, `DROP TRIGGER IF EXISTS ${name}`);
    await dropTable(context, 'case_stamps');
  },
};
