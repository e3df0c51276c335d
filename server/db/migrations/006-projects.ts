import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const projects: Migration = {
  name: '006-projects',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS projects (
      id CHAR(36) ${EXACT} NOT NULL PRIMARY KEY,
      project_key VARCHAR(6) ${EXACT} NOT NULL UNIQUE,
      name VARCHAR(100) NOT NULL,
      notebook_pattern VARCHAR(80) NOT NULL DEFAULT '',
      claim_hours SMALLINT UNSIGNED NOT NULL DEFAULT 24,
      review_days SMALLINT UNSIGNED NOT NULL DEFAULT 7,
      peer_review TINYINT(1) NOT NULL DEFAULT 0,
      next_case_number INT UNSIGNED NOT NULL DEFAULT 1,
      is_demo TINYINT(1) NOT NULL DEFAULT 0,
      created_by CHAR(36) ${EXACT} NOT NULL,
      created_at DATETIME(3) NOT NULL,
      updated_at DATETIME(3) NOT NULL,
      CONSTRAINT projects_creator FOREIGN KEY (created_by) REFERENCES users (id)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'projects', ['SELECT', 'INSERT', 'UPDATE']);
  },
  down: ({ context }) => dropTable(context, 'projects'),
};
