import { appendOnlyTrigger, dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** What happened to a case, in words, with who and when. Rows are only added. `format` numbers the shape of `data`. */
export const caseEvents104: Migration = {
  name: '104-case-events',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS case_events (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      case_id ${ID} NOT NULL,
      at DATETIME(3) NOT NULL,
      by_id ${ID} NOT NULL,
      by_name VARCHAR(100) NOT NULL,
      kind VARCHAR(40) ${EXACT} NOT NULL,
      text VARCHAR(2400) NOT NULL,
      format TINYINT UNSIGNED NOT NULL DEFAULT 1,
      KEY case_events_case (case_id, id),
      CONSTRAINT case_events_case_row FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT case_events_user FOREIGN KEY (by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'case_events');
    await grantApp(context, 'case_events', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'case_events'),
};
