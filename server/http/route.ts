import express, { type Express, type NextFunction, type Request, type RequestHandler, type Response } from 'express';
import { z } from 'zod';

import type { Actor } from '@/server/auth/actor';
import type { Sessions } from '@/server/auth/sessions';
import { mayAdminister } from '@/server/features/admin/policy';
import { id } from '@/shared/contracts/common';
import { LIMITS } from '@/shared/limits';
import { problemText } from '@/shared/text/problems';
import { fieldErrors, fieldWords } from './fieldWords';
import { Problem } from './problems';

declare module 'express-serve-static-core' {
  interface Locals {
    who?: Actor | null;
  }
}

/**
 * Who may come in. none: the session is not even read; optional: whoever, `who` may be null; person: signed in;
 * administrator: of the site. What a person may do beyond that is the feature's policy.
 */
export type Access = 'none' | 'optional' | 'person' | 'administrator';
type WhoFor<A extends Access> = A extends 'none' ? null : A extends 'optional' ? Actor | null : Actor;

type Method = 'get' | 'post' | 'put' | 'delete';

/** The route writes its bytes itself; only their type is told here. */
export interface FileAnswer {
  file: string;
}

interface RouteSpec<S extends string, A extends Access, P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType | FileAnswer> {
  method: Method;
  /** with placeholders: /api/cases/:caseId. One whose name ends in Id is a UUID unless `params` says otherwise. */
  path: S;
  summary: string;
  access: A;
  params?: P;
  query?: Q;
  body?: B;
  /** the body is bytes (application/octet-stream) of at most this many; `body` is then a Buffer and no schema is given */
  uploadBytes?: number;
  response: R;
  status?: number;
  /** skip checking our own answer in production, with the reason beside it; tests and development always check */
  trusted?: boolean;
}

export interface Call<A extends Access, P, Q, B> {
  who: WhoFor<A>;
  params: P;
  query: Q;
  body: B;
  req: Request;
  res: Response;
}

type Placeholder<S extends string> = S extends `${string}:${infer Name}/${infer Rest}` ? Name | Placeholder<`/${Rest}`> : S extends `${string}:${infer Name}` ? Name : never;
type Params<S extends string, P extends z.ZodType> = unknown extends z.output<P> ? Record<Placeholder<S>, string> : z.output<P>;
type BodyOf<B extends z.ZodType> = unknown extends z.output<B> ? Buffer : z.output<B>;
type AnswerOf<R> = R extends z.ZodType ? z.input<R> : void;

/** A route as the table holds it: enough to mount it and to describe it. */
export interface Route {
  method: Method;
  path: string;
  summary: string;
  access: Access;
  params: z.ZodType | null;
  query: z.ZodType | null;
  body: z.ZodType | null;
  uploadBytes: number | null;
  response: z.ZodType | FileAnswer;
  status: number;
  trusted: boolean;
  handle: (call: { who: Actor | null; params: unknown; query: unknown; body: unknown; req: Request; res: Response }) => unknown;
}

const placeholders = (path: string): string[] => [...path.matchAll(/:(\w+)/g)].map(([, name]) => name ?? '');

/** Every placeholder is checked before the handler sees it: ids by form, anything else by the schema that is given. */
function paramsSchema(path: string, given: z.ZodType | undefined): z.ZodType | null {
  if (given) return given;
  const names = placeholders(path);
  const open = names.find((name) => !name.endsWith('Id'));
  if (open) throw new Error(`The route ${path} must say what :${open} is.`);
  return names.length === 0 ? null : z.object(Object.fromEntries(names.map((name) => [name, id])));
}

/** Describes one route; nothing happens until it is mounted. */
export function route<S extends string, A extends Access, R extends z.ZodType | FileAnswer, P extends z.ZodType = z.ZodUnknown, Q extends z.ZodType = z.ZodUnknown, B extends z.ZodType = z.ZodUnknown>(
  spec: RouteSpec<S, A, P, Q, B, R>,
  handle: (call: Call<A, Params<S, P>, z.output<Q>, BodyOf<B>>) => AnswerOf<R> | Promise<AnswerOf<R>>,
): Route {
  return {
    method: spec.method, path: spec.path, summary: spec.summary, access: spec.access, params: paramsSchema(spec.path, spec.params), query: spec.query ?? null,
    body: spec.body ?? null, uploadBytes: spec.uploadBytes ?? null, response: spec.response, status: spec.status ?? 200, trusted: spec.trusted ?? false,
    // The schemas above are what makes these types true: `run` parses before it calls.
    handle: handle as unknown as Route['handle'],
  };
}

export interface MountOptions {
  sessions: Sessions | null;
  /** parse our own answers even where a route is trusted */
  checkTrusted: boolean;
}

const isRead = (method: Method) => method === 'get';

/** The one content type that a route takes. A DELETE without a body needs none: no form can send it, no script of another site may. */
function contentType({ method, uploadBytes }: Route): RequestHandler {
  const wanted = uploadBytes === null ? 'application/json' : 'application/octet-stream';
  return (request, _response, next) => {
    const sent = request.headers['content-type'];
    const bodyless = sent === undefined && (request.headers['content-length'] ?? '0') === '0' && request.headers['transfer-encoding'] === undefined;
    if (bodyless && method === 'delete') return next();
    if (sent?.split(';')[0]?.trim().toLowerCase() !== wanted) throw new Problem('unsupported-type', uploadBytes === null ? problemText.needsJson : problemText.needsBytes);
    next();
  };
}

const readJson = express.json({ limit: LIMITS.jsonBytes, type: () => true });

function enter({ access }: Route, sessions: Sessions): RequestHandler {
  return async (request, response, next) => {
    const who = await sessions.actorOf(request);
    response.locals.who = who;
    response.setHeader('Cache-Control', 'no-store');
    if (!who && access !== 'optional') throw new Problem('not-signed-in', problemText.signInFirst);
    if (access === 'administrator' && !(who && mayAdminister(who))) throw new Problem('not-allowed', problemText.administratorsOnly);
    next();
  };
}

function parsed(schema: z.ZodType | null, value: unknown): unknown {
  if (!schema) return value;
  const result = schema.safeParse(value, { error: fieldWords });
  if (result.success) return result.data;
  const errors = fieldErrors(result.error.issues);
  throw new Problem('invalid-input', problemText.checkFields, { errors });
}

function parsedParams(schema: z.ZodType | null, value: unknown): unknown {
  if (!schema) return value;
  const result = schema.safeParse(value);
  if (!result.success) throw new Problem('not-found', problemText.noSuchPath); // an address that can name nothing
  return result.data;
}

function run(one: Route, checkTrusted: boolean) {
  const answerSchema = one.response instanceof z.ZodType ? one.response : null;
  const check = !one.trusted || checkTrusted;
  return async (request: Request, response: Response, _next: NextFunction): Promise<void> => {
    const answer = await one.handle({
      who: response.locals.who ?? null, params: parsedParams(one.params, request.params), query: parsed(one.query, request.query),
      body: one.uploadBytes === null ? parsed(one.body, request.body ?? {}) : request.body, req: request, res: response,
    });
    if (!answerSchema || response.headersSent) return; // a file wrote itself
    const body = check ? answerSchema.parse(answer) : answer;
    if (response.statusCode === 200) response.status(one.status); // unless the handler knew better
    response.setHeader('Content-Type', 'application/json; charset=utf-8');
    response.end(JSON.stringify(body));
  };
}

/** Mounts the routes in order. One that needs no session gets no session code at all. */
export function mount(app: Express, routes: readonly Route[], { sessions, checkTrusted }: MountOptions): void {
  for (const one of routes) {
    const mark: RequestHandler = (_request, response, next) => {
      response.locals.routePath = one.path;
      next();
    };
    const chain: RequestHandler[] = [mark];
    if (one.access !== 'none') {
      if (!sessions) throw new Error(`The route ${one.path} needs sessions.`);
      chain.push(sessions.middleware, enter(one, sessions));
    }
    if (!isRead(one.method)) {
      chain.push(contentType(one));
      chain.push(one.uploadBytes === null ? readJson : express.raw({ limit: one.uploadBytes, type: () => true }));
    }
    app[one.method](one.path, ...chain, run(one, checkTrusted));
  }
}
