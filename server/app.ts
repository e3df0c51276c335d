import express, { type Express } from 'express';

import type { Deps } from './deps';
import { allRoutes } from './features';
import { problemText } from '@/shared/text/problems';
import { Problem, problemHandler } from './http/problems';
import { requestLog } from './http/requestLog';
import { mount } from './http/route';
import { sameSite } from './http/sameSite';
import { securityHeaders } from './http/securityHeaders';
import { staticFiles } from './http/staticFiles';

/**
 * The whole server without listening.
 * @param options.distDir the built client; null serves the API alone (development, where Metro serves the client)
 */
export function createApp(deps: Deps, { distDir }: { distDir: string | null }): Express {
  const { env, log } = deps;
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false); // an answer to one question is not asked for twice; what may be kept sets its own
  app.set('trust proxy', env.trustProxy);
  app.use(requestLog(log));
  app.use(securityHeaders({ behindTls: env.publicUrl?.startsWith('https:') ?? false }));
  app.use(sameSite(env.publicUrl));
  mount(app, allRoutes(deps), { sessions: deps.sessions, checkTrusted: env.mode !== 'production' });
  app.use('/api', () => {
    throw new Problem('not-found', problemText.noSuchPath);
  });
  if (distDir !== null) app.use(staticFiles(distDir));
  app.use(() => {
    throw new Problem('not-found', problemText.noSuchPath);
  });
  app.use(problemHandler((error, requestId) => log.error('request-failed', error, { requestId })));
  return app;
}
