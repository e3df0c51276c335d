import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const passwordResets: Migration = {
  name: '005-password-resets',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS password_resets (
      id CHAR(36) ${EXACT} NOT NULL PRIMARY KEY,
      user_id CHAR(36) ${EXACT} NOT NULL,
      token_hash CHAR(64) ${EXACT} NOT NULL UNIQUE,
      created_at DATETIME(3) NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      used_at DATETIME(3) NULL,
      INDEX password_resets_user (user_id),
      CONSTRAINT password_resets_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'password_resets', ['SELECT', 'INSERT', 'UPDATE']);
  },
  down: ({ context }) => dropTable(context, 'password_resets'),
};
