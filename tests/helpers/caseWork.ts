import type { CaseResponse } from '@/shared/contracts/cases';
import type { CaseContent } from '@/shared/types/case';
import { REVIEW_STEPS } from '@/shared/types/trail';
import { cinnamate } from './caseContent';
import { PASSWORD } from './password';
import type { Answer, Client } from './server';

/** Whoever asks the server: through supertest, or with the cookies of a browser. */
export type Caller = Pick<Client, 'get' | 'post' | 'put' | 'delete'>;

/** An answer that must be the wished one; what came instead is in the error. */
export function ok<T>(answer: Answer<T>, status = 200): T {
  if (answer.status !== status) throw new Error(`expected ${status}, got ${answer.status}: ${answer.text}`);
  return answer.body;
}

/** A saved draft with this content. */
export async function draft(client: Caller, projectId: string, content: CaseContent = cinnamate()): Promise<CaseResponse> {
  const opened = ok(await client.post<CaseResponse>('/api/cases', { projectId, question: content.question }), 201);
  return ok(await client.put<CaseResponse>(`/api/cases/${opened.id}`, { seenVersion: opened.version, content }));
}

export const submit = async (client: Caller, one: CaseResponse): Promise<CaseResponse> =>
  ok(await client.post<CaseResponse>(`/api/cases/${one.id}/submit`, { seenVersion: one.version, password: PASSWORD }));

export const claim = async (client: Caller, caseId: string): Promise<CaseResponse> => ok(await client.post<CaseResponse>(`/api/cases/${caseId}/claim`));

/** Checks all five steps of the present revision. */
export async function checkAll(client: Caller, one: CaseResponse): Promise<CaseResponse> {
  let now = one;
  for (const step of REVIEW_STEPS) now = ok(await client.post<CaseResponse>(`/api/cases/${one.id}/checks`, { step, checked: true, revision: one.revision }));
  return now;
}

/** A signature as the screen asks for it; the answer is a case or a refusal. */
export const sign = <T = CaseResponse>(client: Caller, one: CaseResponse, more: object = {}): Promise<Answer<T>> =>
  client.post<T>(`/api/cases/${one.id}/sign`, { seenVersion: one.version, contentHash: one.contentHash, meaning: 'review', password: PASSWORD, ...more });

/** The whole way from a draft to a signed case. */
export async function signedCase(author: Caller, reviewer: Caller, projectId: string, content?: CaseContent): Promise<CaseResponse> {
  const sent = await submit(author, await draft(author, projectId, content));
  await claim(reviewer, sent.id);
  return ok(await sign(reviewer, await checkAll(reviewer, sent)));
}
