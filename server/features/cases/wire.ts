import type { Deps } from '@/server/deps';
import { attachmentRoutes } from '@/server/features/attachments/routes';
import { reviewRoutes } from '@/server/features/reviews/routes';
import { confirmPassword } from '@/server/features/session/service';
import { sheetRoutes } from '@/server/features/sheet/routes';
import type { Route } from '@/server/http/route';
import { fileBlobs } from '@/server/storage/blobs';
import { caseTrail, quickLook } from '@/shared/engine';
import type { CaseDeps } from './deps';
import { resolveQuickLook } from './quickLookInput';
import { caseReads } from './read';
import { remarkService } from './remarks';
import { caseRoutes } from './routes';

/** What cases need, from what the server has. */
export const caseDeps = ({ db, now, newId, mail, passwords, throttle, relations }: Deps): CaseDeps => ({
  db, now, newId, mail,
  confirm: (userId, password) => confirmPassword({ passwords, throttle }, userId, password),
  trailOf: (content) => caseTrail(content, relations),
  quickLook: (input) => quickLook(input, relations),
});

/** Routes of cases, reviews, attachments and the sheet. The fonts of the sheet lie under the folder the server runs in. */
export function caseFeatureRoutes(deps: Deps): Route[] {
  const own = caseDeps(deps);
  const reads = caseReads(own);
  const remarks = remarkService(own);
  return [
    ...caseRoutes(own, deps.env, reads, remarks, resolveQuickLook),
    ...reviewRoutes(own, deps.env, reads, remarks),
    ...attachmentRoutes(own, fileBlobs(deps.env.dataDir)),
    ...sheetRoutes(own, reads, deps.relations, process.cwd()),
  ];
}
