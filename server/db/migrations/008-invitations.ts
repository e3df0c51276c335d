import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const invitations: Migration = {
  name: '008-invitations',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS invitations (
      id CHAR(36) ${EXACT} NOT NULL PRIMARY KEY,
      project_id CHAR(36) ${EXACT} NOT NULL,
      email VARCHAR(254) ${EXACT} NOT NULL,
      role ENUM('reader', 'chemist', 'reviewer', 'lead') NOT NULL,
      guest_until DATE NULL,
      token_hash CHAR(64) ${EXACT} NOT NULL UNIQUE,
      invited_by CHAR(36) ${EXACT} NOT NULL,
      sent_at DATETIME(3) NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      accepted_at DATETIME(3) NULL,
      withdrawn_at DATETIME(3) NULL,
      INDEX invitations_project (project_id, email),
      CONSTRAINT invitations_project FOREIGN KEY (project_id) REFERENCES projects (id),
      CONSTRAINT invitations_sender FOREIGN KEY (invited_by) REFERENCES users (id)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'invitations', ['SELECT', 'INSERT', 'UPDATE']);
  },
  down: ({ context }) => dropTable(context, 'invitations'),
};
