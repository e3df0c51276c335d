import { EXACT, appendOnlyTrigger, dropTable, grantApp, run, type Migration } from './step';

export const projectEvents: Migration = {
  name: '009-project-events',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS project_events (
      id INT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      project_id CHAR(36) ${EXACT} NOT NULL,
      by_id CHAR(36) ${EXACT} NOT NULL,
      at DATETIME(3) NOT NULL,
      kind VARCHAR(40) ${EXACT} NOT NULL,
      detail JSON NOT NULL,
      INDEX project_events_project (project_id, id),
      CONSTRAINT project_events_project FOREIGN KEY (project_id) REFERENCES projects (id),
      CONSTRAINT project_events_by FOREIGN KEY (by_id) REFERENCES users (id)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await appendOnlyTrigger(context, 'project_events');
    await grantApp(context, 'project_events', ['SELECT', 'INSERT']);
  },
  down: ({ context }) => dropTable(context, 'project_events'),
};
