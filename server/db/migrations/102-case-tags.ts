import { dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/** Tags as rows, so that the log filters by them and lists them without reading a content. */
export const caseTags102: Migration = {
  name: '102-case-tags',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS case_tags (
      case_id ${ID} NOT NULL,
      project_id ${ID} NOT NULL,
      tag VARCHAR(40) NOT NULL,
      PRIMARY KEY (case_id, tag),
      KEY case_tags_tag (project_id, tag, case_id),
      CONSTRAINT case_tags_case FOREIGN KEY (case_id) REFERENCES cases (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await grantApp(context, 'case_tags', ['SELECT', 'INSERT', 'DELETE']);
  },
  down: ({ context }) => dropTable(context, 'case_tags'),
};
