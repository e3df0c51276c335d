import { dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** How many cases a project has by state and grade, kept by triggers: the head of the log costs the same at any size. */
export const caseCounts112: Migration = {
  name: '112-case-counts',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS case_counts (
      project_id ${ID} NOT NULL,
      state ENUM('draft','in-review','queried','signed','superseded','withdrawn') NOT NULL,
      grade ENUM('assigned','tentative','not-decided') NOT NULL,
      n INT NOT NULL DEFAULT 0,
      PRIMARY KEY (project_id, state, grade)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await grantApp(context, 'case_counts', ['SELECT']);
  },
  down: ({ context }) => dropTable(context, 'case_counts'),
};
