import { dropTable, EXACT, grantApp, run, type Migration } from './step';

const ID = `CHAR(36) ${EXACT}`;

/**
 * One row a case: what the log lists and searches, and where its review stands. The content lives in case_revisions.
 * `due_order` puts cases without a date last; `search_text` holds what features/cases/searchText.ts makes.
 */
export const cases101: Migration = {
  name: '101-cases',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS cases (
      id ${ID} NOT NULL PRIMARY KEY,
      project_id ${ID} NOT NULL,
      number INT UNSIGNED NOT NULL,
      code VARCHAR(24) ${EXACT} NOT NULL,
      code_order VARCHAR(24) ${EXACT} NOT NULL,
      author_id ${ID} NOT NULL,
      question VARCHAR(200) NOT NULL,
      state ENUM('draft','in-review','queried','signed','superseded','withdrawn') NOT NULL DEFAULT 'draft',
      version INT UNSIGNED NOT NULL DEFAULT 1,
      revision INT UNSIGNED NOT NULL DEFAULT 1,
      content_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      first_submitted_revision INT UNSIGNED NULL,
      submitted_revision INT UNSIGNED NULL,
      submitted_at DATETIME(3) NULL,
      compound VARCHAR(200) NOT NULL DEFAULT '',
      batch VARCHAR(80) NOT NULL DEFAULT '',
      notebook VARCHAR(80) NOT NULL DEFAULT '',
      key_label VARCHAR(80) NULL,
      key_j_text VARCHAR(80) NULL,
      answer_grade ENUM('assigned','tentative','not-decided') NOT NULL,
      answer_text VARCHAR(600) NOT NULL,
      answer_judged TINYINT(1) NOT NULL DEFAULT 0,
      untested INT UNSIGNED NOT NULL DEFAULT 0,
      reviewer_id ${ID} NULL,
      claimed_at DATETIME(3) NULL,
      held_until DATETIME(3) NULL,
      due_on DATE NULL,
      due_order DATE AS (COALESCE(due_on, DATE '9999-12-31')) PERSISTENT,
      supersedes_id ${ID} NULL,
      superseded_by_id ${ID} NULL,
      created_at DATETIME(3) NOT NULL,
      changed_at DATETIME(3) NOT NULL,
      changed_by_id ${ID} NOT NULL,
      search_text MEDIUMTEXT NOT NULL,
      UNIQUE KEY cases_number (project_id, number),
      KEY cases_changed (project_id, changed_at, id),
      KEY cases_state_changed (project_id, state, changed_at, id),
      KEY cases_created (project_id, created_at, id),
      KEY cases_code (project_id, code_order, id),
      KEY cases_due (project_id, due_order, id),
      KEY cases_author (project_id, author_id),
      KEY cases_reviewer (reviewer_id, state),
      CONSTRAINT cases_project FOREIGN KEY (project_id) REFERENCES projects (id),
      CONSTRAINT cases_author_user FOREIGN KEY (author_id) REFERENCES users (id),
      CONSTRAINT cases_reviewer_user FOREIGN KEY (reviewer_id) REFERENCES users (id),
      CONSTRAINT cases_changer FOREIGN KEY (changed_by_id) REFERENCES users (id),
      CONSTRAINT cases_supersedes_case FOREIGN KEY (supersedes_id) REFERENCES cases (id),
      CONSTRAINT cases_superseded_by_case FOREIGN KEY (superseded_by_id) REFERENCES cases (id)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
    await grantApp(context, 'cases', ['SELECT', 'INSERT', 'UPDATE']);
  },
  down: ({ context }) => dropTable(context, 'cases'),
};
