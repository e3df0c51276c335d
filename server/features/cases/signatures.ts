import type { Transaction } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import type { CaseModel } from '@/server/db/models/CaseModel';
import type { CaseRevisionModel } from '@/server/db/models/CaseRevisionModel';
import { SignatureModel } from '@/server/db/models/SignatureModel';
import { Problem } from '@/server/http/problems';
import { casesText } from '@/shared/text/cases';
import type { SignatureMeaning } from '@/shared/types/roles';
import type { CaseDeps } from './deps';
import { signatureHash } from './hash';
import { hashHolds } from './store';

/** Has this person signed the authorship of the present revision? */
export async function hasAuthorship(found: CaseModel, signerId: string, tx: Transaction): Promise<boolean> {
  return (await SignatureModel.count({ where: { caseId: found.id, revision: found.revision, signerId, meaning: 'authorship', contentHash: found.contentHash }, transaction: tx })) > 0;
}

/**
 * Adds a signature to the present revision. What is stored is hashed again first, so that nobody signs a content that was
 * changed behind the product's back. @throws Problem when stored content and hash do not agree
 */
export async function recordSignature(deps: Pick<CaseDeps, 'newId'>, { found, revision, who, meaning, at }: {
  found: CaseModel; revision: CaseRevisionModel; who: Pick<Actor, 'id' | 'name'>; meaning: SignatureMeaning; at: Date;
}, tx: Transaction): Promise<void> {
  if (revision.contentHash !== found.contentHash || !(await hashHolds(revision, tx))) throw new Problem('wrong-state', casesText.hashMismatch);
  const record = { caseId: found.id, revision: revision.number, meaning, signerId: who.id, signerName: who.name, signedAt: at, contentHash: revision.contentHash };
  await SignatureModel.create({ id: deps.newId(), ...record, recordHash: signatureHash(record) }, { transaction: tx });
}
