import type { RequestHandler } from 'express';

import { problemText } from '@/shared/text/problems';
import { Problem } from './problems';

const READS = new Set(['GET', 'HEAD', 'OPTIONS']);

function hostOf(address: string): string | null {
  try {
    return new URL(address).host;
  } catch {
    return null;
  }
}

/**
 * Refuses a change that another site's page could have sent with this person's cookie. A form can send three content
 * types only, none of them JSON or octet-stream; a script of another site is asked by the browser first and has no
 * permission; and Origin and Sec-Fetch-Site, where sent, must name this site.
 * @param publicUrl the site's own address when it is set, for a proxy that changes the Host header
 */
export function sameSite(publicUrl: string | undefined): RequestHandler {
  const publicHost = publicUrl ? hostOf(publicUrl) : null;
  return (request, _response, next) => {
    if (READS.has(request.method)) return next();
    const { origin } = request.headers;
    if (origin !== undefined) {
      const host = hostOf(origin);
      if (host === null || (host !== request.host && host !== publicHost)) throw new Problem('not-allowed', problemText.foreignOrigin);
    }
    const site = request.headers['sec-fetch-site'];
    if (site !== undefined && site !== 'same-origin') throw new Problem('not-allowed', problemText.foreignOrigin);
    next();
  };
}
