import { EXACT, dropTable, grantApp, run, type Migration } from './step';

export const rateCounters: Migration = {
  name: '004-rate-counters',
  up: async ({ context }) => {
    await run(context, `CREATE TABLE IF NOT EXISTS rate_counters (
      bucket CHAR(64) ${EXACT} NOT NULL,
      window_start DATETIME(3) NOT NULL,
      hits INT UNSIGNED NOT NULL,
      PRIMARY KEY (bucket, window_start),
      INDEX rate_counters_window (window_start)
    ) DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await grantApp(context, 'rate_counters', ['SELECT', 'INSERT', 'UPDATE', 'DELETE']);
  },
  down: ({ context }) => dropTable(context, 'rate_counters'),
};
