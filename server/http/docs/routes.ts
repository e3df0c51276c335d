import type { Response } from 'express';

import { route, type Route } from '../route';
import { openApi } from './openapi';
import { docsPage, docsStyle } from './page';

function send(response: Response, type: string, text: string): void {
  response.setHeader('Cache-Control', 'no-cache');
  response.type(type).send(text);
}

/** Made at the first question: a start need not wait for it. */
function once<T>(make: () => T): () => T {
  let made: { value: T } | null = null;
  return () => (made ??= { value: make() }).value;
}

/** @param all every route, these among them */
export function docsRoutes(all: () => readonly Route[]): Route[] {
  const description = once(() => JSON.stringify(openApi(all()), null, 1));
  const page = once(() => docsPage(all()));
  return [
    route({ method: 'get', path: '/api/openapi.json', access: 'none', summary: 'This description as OpenAPI 3.1', response: { file: 'application/json' } },
      ({ res }) => send(res, 'application/json', description())),
    route({ method: 'get', path: '/api/docs', access: 'none', summary: 'This description as a page', response: { file: 'text/html' } },
      ({ res }) => send(res, 'text/html', page())),
    route({ method: 'get', path: '/api/docs.css', access: 'none', summary: 'The look of that page', response: { file: 'text/css' } },
      ({ res }) => send(res, 'text/css', docsStyle)),
  ];
}
