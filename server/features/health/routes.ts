import { QueryTypes } from 'sequelize';

import { version } from '@/package.json';
import { missingMigrations } from '@/server/db/migrator';
import { demoIsLoaded } from '@/server/features/account/demo';
import type { Deps } from '@/server/deps';
import { route, type Route } from '@/server/http/route';
import { ENGINE_VERSION } from '@/shared/engine/version';
import { healthResponse, type HealthResponse } from '@/shared/contracts/health';

type DatabaseHealth = Pick<HealthResponse, 'database' | 'schema' | 'demo'>;

/** A database that hangs must not hang the question after it. */
const PATIENCE_MS = 2000;

async function databaseHealth({ db }: Deps): Promise<DatabaseHealth> {
  await db.query('SELECT 1', { type: QueryTypes.SELECT });
  const missing = await missingMigrations(db);
  if (missing.length > 0) return { database: 'ok', schema: 'behind', demo: false };
  return { database: 'ok', schema: 'current', demo: await demoIsLoaded() };
}

function withinPatience(asked: Promise<DatabaseHealth>): Promise<DatabaseHealth> {
  const away: DatabaseHealth = { database: 'unreachable', schema: 'behind', demo: false };
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<DatabaseHealth>((resolve) => {
    timer = setTimeout(() => resolve(away), PATIENCE_MS);
  });
  return Promise.race([asked.catch(() => away), late]).finally(() => clearTimeout(timer));
}

export const healthRoutes = (deps: Deps): Route[] => [
  route({ method: 'get', path: '/api/health', access: 'none', summary: 'Is the server up, is the database reached, is the schema whole (503 when not)', response: healthResponse }, async ({ res }) => {
    const found = await withinPatience(databaseHealth(deps));
    const ok = found.database === 'ok' && found.schema === 'current';
    res.setHeader('Cache-Control', 'no-store');
    if (!ok) res.status(503);
    return { status: ok ? 'ok' as const : 'degraded' as const, version, engineVersion: ENGINE_VERSION, ...found, uptimeS: Math.round(process.uptime()) };
  }),
];
