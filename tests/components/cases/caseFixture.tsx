import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';

import { CaseContext, type CaseSheet, type CaseView } from '@/components/cases/caseContext';
import type { CaseEditor } from '@/components/cases/logic/useCaseEditor';
import { openEditor } from '@/components/cases/logic/editorState';
import { caseResponse, type CaseResponse } from '@/shared/contracts/cases';
import type { CaseContent } from '@/shared/types/case';

import { content } from './contents';

const person = (name: string, n: number) => ({ id: `00000000-0000-4000-8000-00000000000${n}`, name });
export const author = person('Mira Adeyemi', 1);
export const reviewer = person('Rafe Okonjo', 2);
const no = { edit: false, submit: false, comment: false, attach: false, claim: false, release: false, check: false, query: false, answerQuery: false, sign: false, withdraw: false, supersede: false, reopen: false, addend: false };

/** An answer of the server, read against its contract so that the fixture cannot drift from it. */
export function caseAnswer(change: Partial<CaseResponse> = {}, may: Partial<CaseResponse['may']> = {}): CaseResponse {
  return caseResponse.parse({
    id: '00000000-0000-4000-8000-0000000000aa', code: 'HAZ-0024', project: { id: '00000000-0000-4000-8000-0000000000bb', key: 'HAZ', name: 'Hazel route B', notebookPattern: '' },
    state: 'in-review', version: 4, revision: 4, contentHash: '7c41e09b52d8'.padEnd(64, '0'), author, createdAt: '2026-11-28T10:00:00.000Z', changedAt: '2026-11-29T10:00:00.000Z', changedBy: author,
    content: content({ answer: { grade: 'not-decided', candidateId: null, statement: '12.4 Hz between cis and trans', reasons: 'border', leftOpen: 'the other isomer', overrideReason: '' } }),
    trail: {
      format: 1, engineVersion: '1', relations: [], calculations: [], candidates: [], notTested: ['twist form'],
      answer: { grade: 'not-decided', candidateId: null, headline: 'Both remain', detail: '' }, cautions: [], measureNext: [], steps: [],
    },
    review: { reviewer, heldUntil: '2026-12-01T14:40:00.000Z', dueOn: '2026-12-03', checks: [{ step: 'reciprocity', state: 'open', by: null, at: null }], queries: [], submittedAt: '2026-11-29T11:00:00.000Z' },
    signatures: [], addenda: [], comments: [], attachments: [], changedSinceSubmission: [], supersededBy: null, supersedes: null, ...change,
    may: { ...no, why: {}, ...may },
  });
}

/** Puts a part of the case screen where it stands in the product: in a case, with a reader, before a server that the test plays. */
export function inCase(part: ReactNode, found: CaseResponse, { reader = reviewer, edits = [], opened = [], mayEdit = false }: {
  reader?: { id: string; name: string }; edits?: CaseContent[]; opened?: CaseSheet[]; mayEdit?: boolean;
} = {}) {
  const state = openEditor({ version: found.version, revision: found.revision, content: found.content, changedBy: '', changedAt: found.changedAt }, false, null);
  const edit: CaseEditor['edit'] = (change) => { edits.push(change(edits.at(-1) ?? found.content)); };
  const editor: CaseEditor = {
    state, content: found.content, edit, remove: (_name, change) => edit(change), removed: null, isDirty: false, lacksReason: false, isKept: true,
    setReason: () => undefined, again: () => undefined, choose: () => undefined, discard: () => undefined,
  };
  const view: CaseView = { found, content: found.content, editor, mayEdit, reader: { ...reader, email: 'rafe.okonjo@hazel.example' }, now: new Date('2026-12-01T12:00:00Z'), open: (sheet) => opened.push(sheet) };
  return (
    <QueryClientProvider client={new QueryClient({ defaultOptions: { mutations: { retry: false }, queries: { retry: false } } })}>
      <CaseContext value={view}>{part}</CaseContext>
    </QueryClientProvider>
  );
}
