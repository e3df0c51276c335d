import { appendOnlyTrigger, dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/**
 * Every save, whole: the content as canonical JSON text, the trail that the engine made of it, and the hash over both.
 * Rows are only added.
 */
export const caseRevisions103: Migration = {
  name: '103-case-revisions',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS case_revisions (
      case_id ${ID} NOT NULL,
      number INT UNSIGNED NOT NULL,
      content LONGTEXT ${EXACT} NOT NULL,
      trail LONGTEXT ${EXACT} NOT NULL,
      content_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      engine_version VARCHAR(40) ${EXACT} NOT NULL,
      saved_by_id ${ID} NOT NULL,
      saved_by_name VARCHAR(100) NOT NULL,
      saved_at DATETIME(3) NOT NULL,
      reason VARCHAR(2000) NOT NULL DEFAULT '',
      changes INT UNSIGNED NOT NULL DEFAULT 0,
      PRIMARY KEY (case_id, number),
      KEY case_revisions_saver (case_id, saved_by_id, number),
      CONSTRAINT case_revisions_case FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT case_revisions_saver_user FOREIGN KEY (saved_by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'case_revisions');
    await grantApp(context, 'case_revisions', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'case_revisions'),
};
