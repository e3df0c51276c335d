import { EXACT, run, type Migration } from './step';

/** Which rights each table's migration gave to the application's user, so that `migrate` can give them again. */
export const grants: Migration = {
  name: '001-grants',
  up: ({ context }) => run(context, `CREATE TABLE IF NOT EXISTS schema_grants (
      table_name VARCHAR(64) ${EXACT} NOT NULL PRIMARY KEY,
      privileges VARCHAR(200) NOT NULL
    )`),
  down: ({ context }) => run(context, 'DROP TABLE IF EXISTS schema_grants'),
};
