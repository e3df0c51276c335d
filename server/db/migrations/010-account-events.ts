import { EXACT, appendOnlyTrigger, dropTable, grantApp, run, type Migration } from './step';

export const accountEvents: Migration = {
  name: '010-account-events',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS account_events (
      id INT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      user_id CHAR(36) ${EXACT} NOT NULL,
      by_id CHAR(36) ${EXACT} NOT NULL,
      at DATETIME(3) NOT NULL,
      kind VARCHAR(40) ${EXACT} NOT NULL,
      detail JSON NOT NULL,
      INDEX account_events_user (user_id, id),
      CONSTRAINT account_events_user FOREIGN KEY (user_id) REFERENCES users (id),
      CONSTRAINT account_events_by FOREIGN KEY (by_id) REFERENCES users (id)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'account_events');
    await grantApp(context, 'account_events', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'account_events'),
};
