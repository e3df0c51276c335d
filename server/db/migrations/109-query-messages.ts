import { appendOnlyTrigger, dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** The thread under a query. Rows are only added. */
export const queryMessages109: Migration = {
  name: '109-query-messages',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS query_messages (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      query_id ${ID} NOT NULL,
      sender ENUM('reviewer','author') NOT NULL,
      text VARCHAR(4000) NOT NULL,
      by_id ${ID} NOT NULL,
      by_name VARCHAR(100) NOT NULL,
      at DATETIME(3) NOT NULL,
      KEY query_messages_query (query_id, id),
      CONSTRAINT query_messages_query_row FOREIGN KEY (query_id) REFERENCES review_queries (id),
      CONSTRAINT query_messages_user FOREIGN KEY (by_id) REFERENCES users (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'query_messages');
    await grantApp(context, 'query_messages', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'query_messages'),
};
