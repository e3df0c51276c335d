import { dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** Remarks at a value of a case, tied to the revision they were written on. */
export const comments110: Migration = {
  name: '110-comments',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS comments (
      id ${ID} NOT NULL PRIMARY KEY,
      case_id ${ID} NOT NULL,
      target VARCHAR(120) ${EXACT} NOT NULL,
      target_label VARCHAR(200) NOT NULL,
      revision INT UNSIGNED NOT NULL,
      text VARCHAR(4000) NOT NULL,
      by_id ${ID} NOT NULL,
      by_name VARCHAR(100) NOT NULL,
      at DATETIME(3) NOT NULL,
      resolved_by_id ${ID} NULL,
      resolved_by_name VARCHAR(100) NULL,
      resolved_at DATETIME(3) NULL,
      KEY comments_case (case_id, at),
      CONSTRAINT comments_case_row FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT comments_user FOREIGN KEY (by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await grantApp(context, 'comments', ['SELECT', 'INSERT', 'UPDATE']);
  },
  down: ({ context }) => dropTable(context, 'comments'),
};
