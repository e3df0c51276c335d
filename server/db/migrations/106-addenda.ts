import { appendOnlyTrigger, dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/**
 * Signed text added to a signed case; each hash takes in the one before it, the first the hash of the revision.
 * Rows are only added.
 */
export const addenda106: Migration = {
  name: '106-addenda',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS addenda (
      id ${ID} NOT NULL PRIMARY KEY,
      case_id ${ID} NOT NULL,
      number INT UNSIGNED NOT NULL,
      revision INT UNSIGNED NOT NULL,
      text VARCHAR(4000) NOT NULL,
      by_id ${ID} NOT NULL,
      by_name VARCHAR(100) NOT NULL,
      at DATETIME(3) NOT NULL,
      previous_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      UNIQUE KEY addenda_number (case_id, number),
      CONSTRAINT addenda_revision FOREIGN KEY (case_id, revision) REFERENCES case_revisions (case_id, number),
      CONSTRAINT addenda_user FOREIGN KEY (by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'addenda');
    await grantApp(context, 'addenda', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'addenda'),
};
