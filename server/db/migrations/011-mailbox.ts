import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const mailbox: Migration = {
  name: '011-mailbox',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS mailbox (
      id INT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      message_id CHAR(36) ${EXACT} NOT NULL UNIQUE,
      recipient VARCHAR(254) NOT NULL,
      subject VARCHAR(300) NOT NULL,
      text TEXT NOT NULL,
      link VARCHAR(600) ${EXACT} NULL,
      at DATETIME(3) NOT NULL
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'mailbox', ['SELECT', 'INSERT', 'DELETE']);
  },
  down: ({ context }) => dropTable(context, 'mailbox'),
};
