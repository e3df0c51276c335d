import { dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** Which step of the check-list stands checked, and on which revision: a check of an older revision no longer counts. */
export const reviewChecks107: Migration = {
  name: '107-review-checks',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS review_checks (
      case_id ${ID} NOT NULL,
      step ENUM('reciprocity','domain','second-root','other-evidence','alternatives') NOT NULL,
      revision INT UNSIGNED NOT NULL,
      by_id ${ID} NOT NULL,
      at DATETIME(3) NOT NULL,
      PRIMARY KEY (case_id, step),
      CONSTRAINT review_checks_case FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT review_checks_user FOREIGN KEY (by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await grantApp(context, 'review_checks', ['SELECT', 'INSERT', 'UPDATE', 'DELETE']);
  },
  down: ({ context }) => dropTable(context, 'review_checks'),
};
