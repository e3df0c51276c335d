import { z } from 'zod';

import { downloadHeaders } from '@/server/features/attachments/routes';
import type { CaseDeps } from '@/server/features/cases/deps';
import { findCase, presentRevision, contentOf } from '@/server/features/cases/store';
import type { CaseReads } from '@/server/features/cases/read';
import { route, type Route } from '@/server/http/route';
import { renderSheet } from '@/server/pdf/renderSheet';
import { siTextResponse } from '@/shared/contracts/cases';
import { siText } from '@/shared/format/siText';
import { sheetText } from '@/shared/text/sheet';
import type { Registry } from '@/shared/types/relation';
import { sheetModel } from './model';
import { readSheet } from './read';

const isZone = (zone: string): boolean => {
  try {
    return new Intl.DateTimeFormat('en-GB', { timeZone: zone }).resolvedOptions().timeZone !== '';
  } catch {
    return false;
  }
};

const sheetQuery = z.strictObject({
  paper: z.enum(['A4', 'Letter']).optional(),
  revision: z.coerce.number().int().min(1).max(1_000_000).optional(),
  /** IANA name, as a browser tells it; times are printed in it and the zone is named */
  zone: z.string().max(60).refine(isZone, sheetText.unknownZone).optional(),
});

export const sheetRoutes = (deps: CaseDeps, reads: CaseReads, registry: Registry, root: string): Route[] => [
  route({ method: 'get', path: '/api/cases/:caseId/sheet.pdf', access: 'person', summary: 'The summary sheet of a revision as a PDF', query: sheetQuery, response: { file: 'application/pdf' } },
    async ({ who, params, query, res }) => {
      const input = await readSheet(deps, reads, registry, who, params.caseId, query.revision ?? null, query.zone ?? 'UTC');
      const model = sheetModel(input);
      const bytes = await renderSheet(model, query.paper ?? 'A4', root);
      const name = `${model.code}-r${model.revision}${model.mark ? '-draft' : ''}.pdf`;
      res.set({ ...downloadHeaders('application/pdf', name, bytes.length), 'Content-Disposition': `inline; filename="${name}"` });
      res.end(bytes);
    }),

  route({ method: 'get', path: '/api/cases/:caseId/si-text', access: 'person', summary: 'The readings as a line for the supporting information', response: siTextResponse },
    async ({ who, params }) => ({ text: siText(contentOf(await presentRevision(await findCase(who, params.caseId)))) })),
];
