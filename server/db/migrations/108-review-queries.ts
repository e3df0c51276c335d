import { dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** Questions of a reviewer, pinned to a step of the trail. */
export const reviewQueries108: Migration = {
  name: '108-review-queries',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS review_queries (
      id ${ID} NOT NULL PRIMARY KEY,
      case_id ${ID} NOT NULL,
      number INT UNSIGNED NOT NULL,
      step ENUM('reciprocity','domain','second-root','other-evidence','alternatives') NOT NULL,
      step_key VARCHAR(120) ${EXACT} NULL,
      state ENUM('open','answered','closed') NOT NULL DEFAULT 'open',
      revision INT UNSIGNED NOT NULL,
      opened_by_id ${ID} NOT NULL,
      opened_at DATETIME(3) NOT NULL,
      closed_by_id ${ID} NULL,
      closed_at DATETIME(3) NULL,
      UNIQUE KEY review_queries_number (case_id, number),
      KEY review_queries_state (case_id, state),
      CONSTRAINT review_queries_case FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT review_queries_user FOREIGN KEY (opened_by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await grantApp(context, 'review_queries', ['SELECT', 'INSERT', 'UPDATE']);
  },
  down: ({ context }) => dropTable(context, 'review_queries'),
};
