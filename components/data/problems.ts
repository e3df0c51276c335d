import type { FieldError, ProblemBody, ProblemKind } from '@/shared/contracts/problem';
import { apiText } from '@/shared/text/uiApi';

/** Every failed request as one thing: what the server said (RFC 9457), or what became of its answer. */
export class ApiProblem extends Error {
  constructor(readonly body: ProblemBody) {
    super(body.detail);
    this.name = 'ApiProblem';
  }
  is(kind: ProblemKind): boolean {
    return this.body.type.endsWith(`/${kind}`);
  }
  get status(): number {
    return this.body.status;
  }
  /** The one sentence for a person. */
  get detail(): string {
    return this.body.detail;
  }
  get errors(): readonly FieldError[] {
    return this.body.errors ?? [];
  }
  /** The sentence for one field, named as in the request body (`content/readings/0/j`). */
  field(name: string): FieldError | undefined {
    return this.errors.find((error) => error.pointer === `#/${name}`);
  }
}

const problem = (kind: ProblemKind, status: number, title: string, detail: string): ApiProblem =>
  new ApiProblem({ type: `/problems/${kind}`, title, status, detail });

export const offlineProblem = () => problem('offline', 0, apiText.offlineTitle, apiText.offline);
export const timeoutProblem = () => problem('unavailable', 0, apiText.timeoutTitle, apiText.timeout);
export const unreadableProblem = (detail: string = apiText.unreadable) => problem('unreadable-answer', 0, apiText.unreadableTitle, detail);

export const asApiProblem = (error: unknown): ApiProblem => (error instanceof ApiProblem ? error : unreadableProblem());

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
const text = (value: unknown, otherwise: string) => (typeof value === 'string' ? value : otherwise);

function fieldErrors(value: unknown): FieldError[] | undefined {
  if (!Array.isArray(value)) return undefined;
  return value.filter(isRecord).map((entry) => ({
    pointer: text(entry['pointer'], '#/'),
    detail: text(entry['detail'], ''),
    code: typeof entry['code'] === 'string' ? entry['code'] : undefined,
    mends: Array.isArray(entry['mends'])
      ? entry['mends'].filter(isRecord).map((mend) => ({ label: text(mend['label'], ''), field: text(mend['field'], ''), value: text(mend['value'], '') }))
      : undefined,
  }));
}

/**
 * Reads a problem body by hand: it is needed before any contract is loaded, and must be readable when the server is older or
 * newer than the page.
 */
export function problemFrom(status: number, body: unknown): ApiProblem {
  if (!isRecord(body) || typeof body['detail'] !== 'string') return unreadableProblem();
  return new ApiProblem({
    type: text(body['type'], '/problems/unreadable-answer'),
    title: text(body['title'], apiText.unreadableTitle),
    status,
    detail: body['detail'],
    requestId: typeof body['requestId'] === 'string' ? body['requestId'] : undefined,
    errors: fieldErrors(body['errors']),
    current: body['current'],
    retryAfterS: typeof body['retryAfterS'] === 'number' ? body['retryAfterS'] : undefined,
  });
}
