import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const users: Migration = {
  name: '002-users',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS users (
      id CHAR(36) ${EXACT} NOT NULL PRIMARY KEY,
      email VARCHAR(254) ${EXACT} NOT NULL UNIQUE,
      name VARCHAR(100) NOT NULL,
      password_hash VARCHAR(100) ${EXACT} NOT NULL,
      site_role ENUM('administrator', 'member') NOT NULL DEFAULT 'member',
      status ENUM('active', 'disabled') NOT NULL DEFAULT 'active',
      is_demo TINYINT(1) NOT NULL DEFAULT 0,
      session_epoch INT UNSIGNED NOT NULL DEFAULT 0,
      last_sign_in_at DATETIME(3) NULL,
      created_at DATETIME(3) NOT NULL,
      updated_at DATETIME(3) NOT NULL,
      INDEX users_demo (is_demo, status)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'users', ['SELECT', 'INSERT', 'UPDATE']);
  },
  down: ({ context }) => dropTable(context, 'users'),
};
