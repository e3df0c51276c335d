import { problemBody } from '@/shared/contracts/problem';
import { type QuickLookResponse, quickLookResponse } from '@/shared/contracts/quickLook';

import type { Api, ApiAnswer } from '../../lib/api';
import { type Came, NOT_DECIDED } from '../types';

/** Cautions that say "look at this number again" before anything is read from it. */
const WARNINGS = new Set(['negative-vicinal', 'larger-than-usual', 'smaller-than-usual', 'partner-differs', 'beyond-reach', 'sign-not-measured']);

/** Asks the quick look and puts its answer into the words and actions of a check file. */
export async function askQuickLook(api: Api, request: Record<string, unknown>): Promise<Came> {
  const answer = await api.post('/api/quick-look', request);
  return answer.status === 200 ? stated(quickLookResponse.parse(answer.body)) : refusedOr(answer);
}

/**
 * A value that the product refuses, with its sentence. A refusal decides nothing. Only the engine's refusals carry a code at the
 * field; anything else means that the request itself was put wrongly.
 */
export function refusedOr(answer: ApiAnswer): Came {
  const problem = problemBody.safeParse(answer.body);
  if (!problem.success) return { kind: 'unanswered', reason: `the API answered ${answer.status} without a reason` };
  const codes = (problem.data.errors ?? []).flatMap((error) => error.code ?? []);
  const sentence = problem.data.errors?.map((error) => error.detail).join(' ') ?? problem.data.detail;
  if (codes.length === 0) return { kind: 'unanswered', reason: `the API refused the request: ${problem.data.detail} ${sentence}` };
  return { kind: 'answer', words: [NOT_DECIDED], actions: ['error'], printsAngle: false, reason: sentence };
}

function stated(response: QuickLookResponse): Came {
  if (response.state === 'question') {
    return { kind: 'answer', words: [NOT_DECIDED], actions: ['ask'], printsAngle: false, reason: response.question };
  }
  const printsAngle = (response.single?.roots.length ?? 0) + (response.single?.arcs.length ?? 0) > 0;
  const reason = `${response.grade}: ${response.headline}`;
  const words = [response.double?.geometry, response.double?.descriptor].filter((word) => word !== null && word !== undefined);
  return {
    kind: 'answer',
    // a graded answer without a word for it (an angle) is stated by its grade, so that it never passes for "not decided"
    words: response.grade === 'not-decided' ? [NOT_DECIDED] : words.length > 0 ? words : [response.grade],
    actions: actionsOf(response),
    printsAngle,
    reason,
  };
}

function actionsOf(response: Extract<QuickLookResponse, { state: 'answered' }>): string[] {
  const found: string[] = [];
  if (response.cautions.some((caution) => WARNINGS.has(caution.id)) || response.checkFirst.length > 0) found.push('warn');
  if (response.reading.limit === 'upper') found.push('upper-bound');
  if (response.notes.some((note) => note.code !== 'default-error')) found.push('accept-with-note');
  return found.length > 0 ? found : ['accept'];
}
