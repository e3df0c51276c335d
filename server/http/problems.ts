import type { ErrorRequestHandler, Request, Response } from 'express';
import { ConnectionError, ConnectionAcquireTimeoutError, DatabaseError, type BaseError } from 'sequelize';

import type { FieldError, ProblemBody, ProblemKind } from '@/shared/contracts/problem';
import { LIMITS } from '@/shared/limits';
import { problemText, problemTitles } from '@/shared/text/problems';

/** Kinds that a server sends; the two others are made by a client that got no answer. */
export type ServerProblemKind = Exclude<ProblemKind, 'offline' | 'unreadable-answer'>;

const STATUS: Readonly<Record<ServerProblemKind, number>> = {
  'invalid-input': 422, 'unreadable-body': 400, 'too-large': 413, 'unsupported-type': 415, 'not-signed-in': 401, 'not-allowed': 403,
  'not-found': 404, 'changed-meanwhile': 409, 'wrong-state': 409, 'held-by-another': 409, 'too-many-tries': 429, gone: 410,
  unavailable: 503, internal: 500,
};

interface Extra {
  errors?: FieldError[];
  current?: unknown;
  retryAfterS?: number;
}

/** An answer that is not the wished one; thrown anywhere below a route, told in one sentence. */
export class Problem extends Error {
  constructor(readonly kind: ServerProblemKind, detail: string, readonly extra: Extra = {}) {
    super(detail);
    this.name = 'Problem';
  }
  get status(): number {
    return STATUS[this.kind];
  }
}

/** One field that needs attention, for rules that no schema can hold. */
export const fieldProblem = (field: string, detail: string): Problem =>
  new Problem('invalid-input', detail, { errors: [{ pointer: `#/${field}`, detail }] });

/** The body of a problem as it is sent. */
export function problemJson(problem: Problem, request: { path: string }, requestId: string): ProblemBody {
  return {
    type: `/problems/${problem.kind}`, title: problemTitles[problem.kind], status: problem.status, detail: problem.message,
    instance: request.path, requestId, ...problem.extra,
  };
}

const megabytes = (bytes: number) => `${Math.round(bytes / (1024 * 1024))}\u00A0MB`;

/** What Express and its body readers throw for a bad request; they carry a status and mostly a `type`. */
interface HttpError {
  status: number;
  type?: string;
  limit?: number;
}
function isHttpError(error: unknown): error is HttpError {
  const status = (error as { status?: unknown } | null)?.status;
  return typeof status === 'number' && status >= 400 && status < 500;
}

function fromHttpError(error: HttpError): Problem {
  if (error instanceof URIError) return new Problem('not-found', problemText.noSuchPath);
  if (error.status === 413) return new Problem('too-large', problemText.tooLarge(megabytes(error.limit ?? LIMITS.jsonBytes)));
  if (error.status === 415) return new Problem('unsupported-type', problemText.unreadableEncoding);
  if (error.status === 404) return new Problem('not-found', problemText.noSuchPath);
  return new Problem('unreadable-body', error.type === 'entity.parse.failed' ? problemText.unreadableJson : problemText.brokenOff);
}

/** The connection broke, or the database is starting up or going down: nobody's input is at fault. */
const AWAY = new Set(['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ER_SOCKET_UNEXPECTED_CLOSE', 'ER_SERVER_SHUTDOWN', 'ER_CMD_CONNECTION_CLOSED', 'ER_CONNECTION_TIMEOUT']);
export function databaseIsAway(error: unknown): boolean {
  if (error instanceof ConnectionError || error instanceof ConnectionAcquireTimeoutError) return true;
  if (!(error instanceof DatabaseError)) return false;
  const code = (error as BaseError & { parent?: { code?: string } }).parent?.code;
  return code !== undefined && AWAY.has(code);
}

export function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (databaseIsAway(error)) return new Problem('unavailable', problemText.databaseAway, { retryAfterS: 5 });
  if (isHttpError(error)) return fromHttpError(error);
  return new Problem('internal', problemText.internal);
}

export function sendProblem(problem: Problem, request: Request, response: Response): void {
  if (problem.extra.retryAfterS !== undefined) response.setHeader('Retry-After', String(problem.extra.retryAfterS));
  response.setHeader('Cache-Control', 'no-store');
  response.status(problem.status).type('application/problem+json').send(JSON.stringify(problemJson(problem, request, response.locals.requestId)));
}

/** Last in the chain: every error leaves as application/problem+json (RFC 9457); the cause of a 500 stays in the log. */
export const problemHandler = (logError: (error: unknown, requestId: string) => void): ErrorRequestHandler => (error: unknown, request, response, next) => {
  const problem = asProblem(error);
  if (problem.kind === 'internal') logError(error, response.locals.requestId);
  if (response.headersSent) next(error); // half an answer is out: Express closes the connection
  else sendProblem(problem, request, response);
};
