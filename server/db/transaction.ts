import { Transaction, type Sequelize } from 'sequelize';

const TRIES = 4;

/** Two transactions waited for each other (1213), or one waited too long for a row (1205): nothing was written, so it may be tried again. */
function lostARace(error: unknown): boolean {
  const errno = (error as { parent?: { errno?: number } }).parent?.errno;
  return errno === 1213 || errno === 1205;
}

/**
 * One write, whole or not at all, at READ COMMITTED: every use case locks the row that it decides on, and reads it behind the
 * lock. A deadlock is tried again; the work must therefore leave no trace outside the transaction (mail goes after it).
 */
export async function inTransaction<T>(db: Sequelize, work: (tx: Transaction) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await db.transaction({ isolationLevel: Transaction.ISOLATION_LEVELS.READ_COMMITTED }, work);
    } catch (error) {
      if (attempt === TRIES || !lostARace(error)) throw error;
    }
  }
}
