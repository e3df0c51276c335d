import type { Request } from 'express';

import type { Env } from '@/server/env';

/** Where a link in a mail leads. Without PUBLIC_URL, the address the request came to (mails then stay on this machine: env.ts). */
export const siteAddress = (env: Env, request: Request): string => env.publicUrl ?? `${request.protocol}://${request.host}`;

export const sitePaths = {
  invitation: (token: string) => `/invitation/${token}`,
  reset: (token: string) => `/reset/${token}`,
  forgot: () => '/forgot',
  oneCase: (caseId: string) => `/cases/${caseId}`,
} as const;
