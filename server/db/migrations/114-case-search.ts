import { run, type Migration } from './step';

/**
 * Full-text index over what searchText.ts writes. The server's own list of stop words is left out of it: "in" or "for" may be
 * what somebody looks for, and an index keeps the setting it was made with.
 */
export const caseSearch114: Migration = {
  name: '114-case-search',
  up: ({ context }) => run(context, "SET STATEMENT innodb_ft_enable_stopword = OFF FOR CREATE FULLTEXT INDEX IF NOT EXISTS cases_search ON cases (search_text)"),
  down: ({ context }) => run(context, 'DROP INDEX IF EXISTS cases_search ON cases'),
};
