import { pipeline } from 'node:stream/promises';

import type { CaseDeps } from '@/server/features/cases/deps';
import { Problem } from '@/server/http/problems';
import { route, type Route } from '@/server/http/route';
import type { Blobs } from '@/server/storage/blobs';
import { attachmentResponse } from '@/shared/contracts/cases';
import { LIMITS } from '@/shared/limits';
import { casesText } from '@/shared/text/cases';
import { attachmentService, fileNameFrom } from './service';

/** Always as a download, never as a page of ours: neither type nor content is guessed, and nothing in it may run. */
export const downloadHeaders = (mediaType: string, fileName: string, bytes: number): Record<string, string> => ({
  'Content-Type': mediaType, 'Content-Length': String(bytes), 'X-Content-Type-Options': 'nosniff', 'Cache-Control': 'private, no-store',
  'Content-Security-Policy': "sandbox; default-src 'none'",
  'Content-Disposition': `attachment; filename="${fileName.replace(/[^\x20-\x7e]|["\\%]/g, '_')}"; filename*=UTF-8''${encodeURIComponent(fileName).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`)}`,
});

export const attachmentRoutes = (deps: CaseDeps, blobs: Blobs): Route[] => {
  const service = attachmentService(deps, blobs);
  return [
    route({ method: 'post', path: '/api/cases/:caseId/attachments', access: 'person', summary: 'Attach a file: its bytes as the body, its name in X-File-Name', uploadBytes: LIMITS.attachmentBytes, response: attachmentResponse, status: 201 },
      ({ who, params, body, req }) => service.add(who, params.caseId, fileNameFrom(req.get('X-File-Name')), Buffer.isBuffer(body) ? body : Buffer.alloc(0))),

    route({ method: 'get', path: '/api/attachments/:attachmentId', access: 'person', summary: 'The bytes of a file as they came', response: { file: 'application/octet-stream' } },
      async ({ who, params, res }) => {
        const found = await service.find(who, params.attachmentId);
        const stream = await blobs.open(found.sha256, found.bytes);
        if (!stream) throw new Problem('gone', casesText.attachment.missing);
        res.set(downloadHeaders(found.mediaType, found.fileName, found.bytes));
        await pipeline(stream, res);
      }),
  ];
};
