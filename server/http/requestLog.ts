import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';

import type { Log } from './log';

declare module 'express-serve-static-core' {
  interface Locals {
    requestId: string;
    /** the route's own path with its placeholders; the path asked for may hold tokens and search words */
    routePath?: string;
  }
}

/** Gives each request a number, in the answer's X-Request-Id and in its line of the log. */
export const requestLog = (log: Log): RequestHandler => (request, response, next) => {
  const started = performance.now();
  const requestId = randomUUID();
  response.locals.requestId = requestId;
  response.setHeader('X-Request-Id', requestId);
  response.once('close', () => {
    const { routePath } = response.locals;
    if (routePath === undefined && response.statusCode < 400) return; // a file of the client
    log.info('request', {
      requestId, method: request.method, route: routePath ?? 'none', status: response.statusCode,
      ms: Math.round((performance.now() - started) * 10) / 10, whole: response.writableFinished,
    });
  });
  next();
};
