import { z } from 'zod';

/** One field that needs attention, RFC 6901 pointer into the request body (`#/j`). */
export const fieldError = z.object({
  pointer: z.string(),
  detail: z.string(),
  code: z.string().optional(),
  mends: z.array(z.object({ label: z.string(), field: z.string(), value: z.string() })).optional(),
});

export const PROBLEM_KINDS = [
  'invalid-input', 'unreadable-body', 'too-large', 'unsupported-type', 'not-signed-in', 'not-allowed', 'not-found', 'changed-meanwhile',
  'wrong-state', 'held-by-another', 'too-many-tries', 'gone', 'unavailable', 'internal', 'offline', 'unreadable-answer',
] as const;
export type ProblemKind = (typeof PROBLEM_KINDS)[number];

/** Every error leaves as application/problem+json (RFC 9457). `detail` is the one sentence a person reads. */
export const problemBody = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  instance: z.string().optional(),
  requestId: z.string().optional(),
  errors: z.array(fieldError).optional(),
  /** 'changed-meanwhile': the version that is on the server now */
  current: z.unknown().optional(),
  retryAfterS: z.number().optional(),
});
export type FieldError = z.infer<typeof fieldError>;
export type ProblemBody = z.infer<typeof problemBody>;
