import { Op } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import { AttachmentModel } from '@/server/db/models/AttachmentModel';
import { CaseModel } from '@/server/db/models/CaseModel';
import { inTransaction } from '@/server/db/transaction';
import type { CaseDeps } from '@/server/features/cases/deps';
import { demand } from '@/server/features/cases/service';
import { findCase, lockCase, log } from '@/server/features/cases/store';
import { Problem } from '@/server/http/problems';
import type { Blobs } from '@/server/storage/blobs';
import type { Attachment } from '@/shared/contracts/cases';
import { LIMITS } from '@/shared/limits';
import { casesText } from '@/shared/text/cases';
import { sniff } from './sniff';

const words = casesText.attachment;

/** The name as its owner wrote it, without folders and control characters. @throws Problem when there is none */
export function fileNameFrom(header: string | undefined): string {
  let name = '';
  try {
    name = decodeURIComponent(header ?? '');
  } catch {
    // not percent-encoded: refused below like a missing name
  }
  const plain = name.normalize('NFC').replace(/[\u0000-\u001f\u007f\u2028\u2029\u202a-\u202e\u2066-\u2069]/g, '').split(/[\\/]/).pop()?.trim() ?? '';
  if (plain === '' || plain === '.' || plain === '..' || [...plain].length > LIMITS.fileName) throw new Problem('invalid-input', words.name, { errors: [{ pointer: '#/X-File-Name', detail: words.name }] });
  return plain;
}

export const attachmentService = (deps: CaseDeps, blobs: Blobs) => ({
  /** Keeps a file beside a case. Bytes first, row second: a row never points at bytes that are not there. @throws Problem */
  add: async (who: Actor, caseId: string, fileName: string, bytes: Buffer): Promise<Attachment> => {
    await findCase(who, caseId); // another project's case answers before any byte is looked at
    if (bytes.length === 0) throw new Problem('invalid-input', words.empty);
    if (bytes.length > LIMITS.attachmentBytes) throw new Problem('too-large', words.tooLarge);
    const found = await sniff(bytes);
    if (!found.kept) throw new Problem('unsupported-type', found.sentence);
    const sha256 = await blobs.put(bytes);
    return inTransaction(deps.db, async (tx) => {
      const row = await lockCase(who, caseId, tx);
      const at = deps.now();
      await demand('attach', who, row, at, tx);
      if ((await AttachmentModel.count({ where: { caseId }, transaction: tx })) >= LIMITS.attachmentsPerCase) throw new Problem('invalid-input', words.tooMany);
      const kept = { id: deps.newId(), caseId, fileName, mediaType: found.mediaType, bytes: bytes.length, sha256, byId: who.id, byName: who.name, at };
      await AttachmentModel.create(kept, { transaction: tx });
      await log(row, who, at, 'attached', casesText.event.attached(fileName), tx);
      return { id: kept.id, fileName, mediaType: kept.mediaType, bytes: kept.bytes, sha256, by: { id: who.id, name: who.name }, at: at.toISOString() };
    });
  },

  /** @throws Problem not-found, also for a file of another project's case */
  find: async (who: Actor, attachmentId: string): Promise<AttachmentModel> => {
    const found = await AttachmentModel.findByPk(attachmentId);
    const visible = found && await CaseModel.count({ where: { id: found.caseId, projectId: { [Op.in]: [...who.projectIds] } } });
    if (!found || !visible) throw new Problem('not-found', words.notFound);
    return found;
  },
});
