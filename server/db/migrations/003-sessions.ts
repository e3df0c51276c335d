import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const sessions: Migration = {
  name: '003-sessions',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS sessions (
      sid VARCHAR(64) ${EXACT} NOT NULL PRIMARY KEY,
      expires DATETIME(3) NULL,
      data TEXT NULL,
      created_at DATETIME(3) NOT NULL,
      updated_at DATETIME(3) NOT NULL,
      INDEX sessions_expires (expires)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'sessions', ['SELECT', 'INSERT', 'UPDATE', 'DELETE']);
  },
  down: ({ context }) => dropTable(context, 'sessions'),
};
