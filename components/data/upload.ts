import { useMutation, useQueryClient } from '@tanstack/react-query';

import type { Attachment } from '@/shared/contracts/cases';

import { caseKeys } from './cases';
import { parse } from './parse';
import { offlineProblem, problemFrom, timeoutProblem, unreadableProblem, type ApiProblem } from './problems';

const TIMEOUT_MS = 120_000;

/**
 * Sends a file with its progress. XMLHttpRequest on purpose: fetch does not tell how much of a body has left, and on a
 * laboratory's network ten megabytes without a word look like a broken page.
 */
export function sendFile(caseId: string, file: File, told: { onProgress: (share: number) => void; signal: AbortSignal }): Promise<Attachment> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', `/api/cases/${caseId}/attachments`);
    request.timeout = TIMEOUT_MS;
    request.setRequestHeader('accept', 'application/json');
    request.setRequestHeader('content-type', 'application/octet-stream');
    request.setRequestHeader('x-file-name', encodeURIComponent(file.name));
    request.upload.onprogress = (event) => { if (event.lengthComputable) told.onProgress(event.loaded / event.total); };
    request.onerror = () => reject(offlineProblem());
    request.ontimeout = () => reject(timeoutProblem());
    request.onabort = () => reject(new DOMException('stopped', 'AbortError'));
    request.onload = () => {
      let json: unknown = null;
      try { json = JSON.parse(request.responseText); } catch { reject(unreadableProblem()); return; }
      if (request.status >= 200 && request.status < 300) parse('attachmentResponse', json).then(resolve, reject);
      else reject(problemFrom(request.status, json));
    };
    told.signal.addEventListener('abort', () => request.abort(), { once: true });
    request.send(file);
  });
}

export function useUpload(caseId: string) {
  const client = useQueryClient();
  return useMutation<Attachment, ApiProblem | DOMException, { file: File; onProgress: (share: number) => void; signal: AbortSignal }>({
    mutationFn: ({ file, ...told }) => sendFile(caseId, file, told),
    onSuccess: () => client.invalidateQueries({ queryKey: caseKeys.one(caseId) }),
  });
}
