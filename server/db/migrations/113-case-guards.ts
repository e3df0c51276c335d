import { REMOVING_DEMO, run, type Migration, type MigrationContext } from './step';

const refuse = (message: string) => `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${message}'`;

/** Name, table, moment and body of every guard of this migration. */
const TRIGGERS: readonly [name: string, moment: string, body: string][] = [
  /*
   * What never changes from the first day; what is fixed once signed; and no way into "signed" but through the signature
   * of somebody other than the author on this very revision. NULL-safe comparison (<=>) because some columns may be empty.
   */
  ['cases_guard_update', 'BEFORE UPDATE ON cases', `BEGIN
    IF NOT (NEW.id <=> OLD.id AND NEW.project_id <=> OLD.project_id AND NEW.number <=> OLD.number AND NEW.code <=> OLD.code
      AND NEW.author_id <=> OLD.author_id AND NEW.created_at <=> OLD.created_at AND NEW.supersedes_id <=> OLD.supersedes_id) THEN
      ${refuse('Number, author and origin of a case never change')};
    END IF;
    IF NEW.revision < OLD.revision OR NEW.version < OLD.version THEN
      ${refuse('A case never goes back to an earlier revision or version')};
    END IF;
    IF OLD.state IN ('signed', 'superseded', 'withdrawn') THEN
      IF NOT (NEW.content_hash <=> OLD.content_hash AND NEW.revision <=> OLD.revision AND NEW.question <=> OLD.question
        AND NEW.compound <=> OLD.compound AND NEW.batch <=> OLD.batch AND NEW.notebook <=> OLD.notebook
        AND NEW.answer_grade <=> OLD.answer_grade AND NEW.answer_text <=> OLD.answer_text AND NEW.answer_judged <=> OLD.answer_judged
        AND NEW.key_label <=> OLD.key_label AND NEW.key_j_text <=> OLD.key_j_text AND NEW.reviewer_id <=> OLD.reviewer_id
        AND NEW.submitted_revision <=> OLD.submitted_revision AND NEW.submitted_at <=> OLD.submitted_at) THEN
        ${refuse('A signed or withdrawn case keeps its content')};
      END IF;
      IF NOT (NEW.state <=> OLD.state) AND NOT (OLD.state = 'signed' AND NEW.state IN ('superseded', 'withdrawn')) THEN
        ${refuse('A signed case is superseded or withdrawn, nothing else')};
      END IF;
    END IF;
    IF NEW.state = 'signed' AND OLD.state <> 'signed' AND NOT EXISTS (
      SELECT 1 FROM signatures s WHERE s.case_id = NEW.id AND s.revision = NEW.revision AND s.content_hash = NEW.content_hash
        AND s.meaning <> 'authorship' AND s.signer_id <> NEW.author_id) THEN
      ${refuse('A case is signed only with the signature of another person on its present revision')};
    END IF;
  END`],
  ['cases_guard_insert', 'BEFORE INSERT ON cases', `BEGIN
    IF NEW.state <> 'draft' THEN ${refuse('A case begins as a draft')}; END IF;
  END`],
  ['cases_guard_delete', 'BEFORE DELETE ON cases', `IF COALESCE(${REMOVING_DEMO}, 0) <> 1 THEN ${refuse('A case is never removed')}; END IF`],
  ['cases_count_delete', 'AFTER DELETE ON cases', `
    UPDATE case_counts SET n = n - 1 WHERE project_id = OLD.project_id AND state = OLD.state AND grade = OLD.answer_grade`],
  ['case_revisions_guard_insert', 'BEFORE INSERT ON case_revisions', `BEGIN
    IF EXISTS (SELECT 1 FROM cases c WHERE c.id = NEW.case_id AND c.state IN ('signed', 'superseded', 'withdrawn')) THEN
      ${refuse('A signed or withdrawn case takes no further revision')};
    END IF;
  END`],
  ['signatures_guard_insert', 'BEFORE INSERT ON signatures', `BEGIN
    IF NEW.meaning <> 'authorship' AND (
      EXISTS (SELECT 1 FROM cases c WHERE c.id = NEW.case_id AND c.author_id = NEW.signer_id)
      OR EXISTS (SELECT 1 FROM case_revisions r WHERE r.case_id = NEW.case_id AND r.saved_by_id = NEW.signer_id)) THEN
      ${refuse('Nobody reviews what they wrote')};
    END IF;
    IF NOT EXISTS (SELECT 1 FROM case_revisions r WHERE r.case_id = NEW.case_id AND r.number = NEW.revision AND r.content_hash = NEW.content_hash) THEN
      ${refuse('A signature names the hash of the revision it signs')};
    END IF;
  END`],
  ['cases_count_insert', 'AFTER INSERT ON cases', `
    INSERT INTO case_counts (project_id, state, grade, n) VALUES (NEW.project_id, NEW.state, NEW.answer_grade, 1)
    ON DUPLICATE KEY UPDATE n = n + 1`],
  ['cases_count_update', 'AFTER UPDATE ON cases', `BEGIN
    IF NOT (NEW.state <=> OLD.state AND NEW.answer_grade <=> OLD.answer_grade) THEN
      UPDATE case_counts SET n = n - 1 WHERE project_id = OLD.project_id AND state = OLD.state AND grade = OLD.answer_grade;
      INSERT INTO case_counts (project_id, state, grade, n) VALUES (NEW.project_id, NEW.state, NEW.answer_grade, 1)
      ON DUPLICATE KEY UPDATE n = n + 1;
    END IF;
  END`],
];

async function drop(context: MigrationContext): Promise<void> {
  for (const [name] of TRIGGERS) await run(context, `DROP TRIGGER IF EXISTS ${name}`);
}

/** Guards in the database itself. They belong to the owner of the tables; the application's user cannot drop or pass them. */
export const caseGuards113: Migration = {
  name: '113-case-guards',
  up: async ({ context }) => {
    for (const [name, moment, body] of TRIGGERS) await run(context, `CREATE OR REPLACE TRIGGER ${name} ${moment} FOR EACH ROW ${body}`);
  },
  down: ({ context }) => drop(context),
};
