import { appendOnlyTrigger, dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/**
 * Who signed which revision with which meaning, bound to the hash of its content; `record_hash` covers all of it.
 * Rows are only added.
 */
export const signatures105: Migration = {
  name: '105-signatures',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS signatures (
      id ${ID} NOT NULL PRIMARY KEY,
      case_id ${ID} NOT NULL,
      revision INT UNSIGNED NOT NULL,
      meaning ENUM('authorship','review','approval') NOT NULL,
      signer_id ${ID} NOT NULL,
      signer_name VARCHAR(100) NOT NULL,
      signed_at DATETIME(3) NOT NULL,
      content_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      record_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      KEY signatures_case (case_id, signed_at),
      CONSTRAINT signatures_revision FOREIGN KEY (case_id, revision) REFERENCES case_revisions (case_id, number),
      CONSTRAINT signatures_user FOREIGN KEY (signer_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'signatures');
    await grantApp(context, 'signatures', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'signatures'),
};
