import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const memberships: Migration = {
  name: '007-memberships',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS memberships (
      project_id CHAR(36) ${EXACT} NOT NULL,
      user_id CHAR(36) ${EXACT} NOT NULL,
      role ENUM('reader', 'chemist', 'reviewer', 'lead') NOT NULL,
      guest_until DATE NULL,
      joined_at DATETIME(3) NOT NULL,
      PRIMARY KEY (project_id, user_id),
      INDEX memberships_user (user_id),
      CONSTRAINT memberships_project FOREIGN KEY (project_id) REFERENCES projects (id),
      CONSTRAINT memberships_user FOREIGN KEY (user_id) REFERENCES users (id)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'memberships', ['SELECT', 'INSERT', 'UPDATE', 'DELETE']);
  },
  down: ({ context }) => dropTable(context, 'memberships'),
};
