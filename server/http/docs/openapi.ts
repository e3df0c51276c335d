import { z } from 'zod';

import { version } from '@/package.json';
import { problemBody } from '@/shared/contracts/problem';
import { apiDocsText } from '@/shared/text/apiDocs';
import type { Route } from '../route';

export type JsonSchema = z.core.JSONSchema.BaseSchema;

interface Operation {
  operationId: string;
  summary: string;
  tags: string[];
  security: Record<string, string[]>[];
  parameters?: { name: string; in: 'path' | 'query'; required: boolean; schema: JsonSchema }[];
  requestBody?: { required: true; content: Record<string, { schema: JsonSchema }> };
  responses: Record<string, { description: string; content: Record<string, { schema: JsonSchema }> }>;
}
export interface OpenApi {
  openapi: '3.1.0';
  info: { title: string; version: string; description: string };
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: { Problem: JsonSchema }; securitySchemes: Record<string, unknown> };
}

/** What a caller may send: the side of a schema before its transforms. */
export const asSent = (schema: z.ZodType): JsonSchema => bare(z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }));
/** What a caller gets: the side after them. */
export const asAnswered = (schema: z.ZodType): JsonSchema => bare(z.toJSONSchema(schema, { io: 'output', unrepresentable: 'any' }));

function bare({ $schema: _dialect, ...schema }: JsonSchema): JsonSchema {
  return schema;
}

/** The part of the product that a path belongs to: its first word. */
export const tagOf = ({ path }: Route): string => (path === '/api/openapi.json' ? 'docs' : path.split('/')[2]?.replace(/\..*$/, '') ?? '');

const bytes: JsonSchema = { type: 'string', format: 'binary' };

function parametersOf(schema: z.ZodType | null, where: 'path' | 'query'): NonNullable<Operation['parameters']> {
  if (!schema) return [];
  const { properties = {}, required = [] } = asSent(schema);
  return Object.entries(properties).map(([name, one]) => ({ name, in: where, required: where === 'path' || required.includes(name), schema: typeof one === 'boolean' ? {} : one }));
}

function operationOf(one: Route): Operation {
  const parameters = [...parametersOf(one.params, 'path'), ...parametersOf(one.query, 'query')];
  const answer = one.response instanceof z.ZodType ? { 'application/json': { schema: asAnswered(one.response) } } : { [one.response.file]: { schema: bytes } };
  return {
    operationId: `${one.method} ${one.path}`, summary: one.summary, tags: [tagOf(one)],
    security: one.access === 'none' ? [] : one.access === 'optional' ? [{}, { session: [] }] : [{ session: [] }],
    ...(parameters.length > 0 ? { parameters } : {}),
    ...(one.body ? { requestBody: { required: true, content: { 'application/json': { schema: asSent(one.body) } } } } : {}),
    ...(one.uploadBytes === null ? {} : { requestBody: { required: true, content: { 'application/octet-stream': { schema: bytes } } } }),
    responses: {
      [one.status]: { description: one.summary, content: answer },
      default: { description: apiDocsText.problem, content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } } },
    },
  };
}

/** The OpenAPI description of exactly the routes that are mounted. */
export function openApi(routes: readonly Route[]): OpenApi {
  const paths: OpenApi['paths'] = {};
  for (const one of routes) {
    const path = one.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [one.method]: operationOf(one) };
  }
  return {
    openapi: '3.1.0',
    info: { title: apiDocsText.title, version, description: `${apiDocsText.intro} ${apiDocsText.changing}` },
    paths,
    components: { schemas: { Problem: asAnswered(problemBody) }, securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'tb.sid' } } },
  };
}
