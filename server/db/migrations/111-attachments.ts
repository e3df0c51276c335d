import { appendOnlyTrigger, dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** Files of a case by their hash; the bytes lie on the disk under it. Rows are only added. */
export const attachments111: Migration = {
  name: '111-attachments',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS attachments (
      id ${ID} NOT NULL PRIMARY KEY,
      case_id ${ID} NOT NULL,
      file_name VARCHAR(200) NOT NULL,
      media_type VARCHAR(100) ${EXACT} NOT NULL,
      bytes INT UNSIGNED NOT NULL,
      sha256 CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      by_id ${ID} NOT NULL,
      by_name VARCHAR(100) NOT NULL,
      at DATETIME(3) NOT NULL,
      KEY attachments_case (case_id, at),
      CONSTRAINT attachments_case_row FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT attachments_user FOREIGN KEY (by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'attachments');
    await grantApp(context, 'attachments', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'attachments'),
};
