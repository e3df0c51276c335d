import { z } from 'zod';

import { apiDocsText as words } from '@/shared/text/apiDocs';
import type { Route } from '../route';
import { asAnswered, asSent, tagOf } from './openapi';
import { shape } from './shape';

const escaped = (text: string): string => text.replace(/[&<>"]/g, (mark) => `&#${mark.charCodeAt(0)};`);
const part = (title: string, schema: z.ZodType | null, read: (one: z.ZodType) => ReturnType<typeof asSent>): string =>
  (schema ? `<dt>${escaped(title)}</dt><dd><pre tabindex="0">${escaped(shape(read(schema)))}</pre></dd>` : '');

function routeHtml(one: Route): string {
  const answer = one.response instanceof z.ZodType ? part(words.answers, one.response, asAnswered) : `<dt>${escaped(words.answers)}</dt><dd>${escaped(words.file(one.response.file))}</dd>`;
  const upload = one.uploadBytes === null ? '' : `<dt>${escaped(words.body)}</dt><dd>${escaped(words.bytes(`${Math.round(one.uploadBytes / 1024 / 1024)}\u00A0MB`))}</dd>`;
  return `<details class="route"><summary><span class="method method-${one.method}">${one.method.toUpperCase()}</span> <code>${escaped(one.path)}</code> <span class="what">${escaped(one.summary)}</span></summary>
<p class="who">${escaped(words.access[one.access])}</p>
<dl>${part(words.address, one.params, asSent)}${part(words.query, one.query, asSent)}${part(words.body, one.body, asSent)}${upload}${answer}</dl></details>`;
}

/** The description of the API as a page: no script, no inline style, so it stands under the product's own policy. */
export function docsPage(routes: readonly Route[]): string {
  const tags = [...new Set(routes.map(tagOf))];
  const groups = tags.map((tag) => `<section aria-labelledby="${tag}"><h2 id="${tag}">${escaped(tag)}</h2>${routes.filter((one) => tagOf(one) === tag).map(routeHtml).join('\n')}</section>`);
  return `<!doctype html>
<html lang="en" class="docs"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escaped(words.title)}</title>
<link rel="stylesheet" href="/app.css"><link rel="stylesheet" href="/api/docs.css"><link rel="icon" href="data:,"></head>
<body><main><h1>${escaped(words.title)}</h1>
<p>${escaped(words.intro)}</p><p>${escaped(words.changing)}</p><p>${escaped(words.machine)} <a href="/api/openapi.json">/api/openapi.json</a></p>
<nav aria-label="${escaped(words.title)}">${tags.map((tag) => `<a href="#${tag}">${escaped(tag)}</a>`).join(' ')}</nav>
${groups.join('\n')}</main></body></html>`;
}

/** The look of design/identity.md on the variables of app.css, with the same values where that file is not served. */
export const docsStyle = `
.docs { --card: #FFFDF8; --rule: #DDD5C4; --muted: #5D6470; }
@media (prefers-color-scheme: dark) { .docs { --card: #1B212B; --rule: #39414E; --muted: #A9AFB9; } }
.docs, .docs body { height: auto; overflow: visible; }
.docs main { max-width: 1120px; margin: 0 auto; padding: 24px 16px 64px; }
.docs h1 { margin: 8px 0 16px; font: 600 28px/32px "Brygada 1918", "Source Sans 3", serif; }
.docs h2 { margin: 32px 0 8px; font: 600 22px/28px "Brygada 1918", "Source Sans 3", serif; }
.docs p { max-width: 44em; margin: 0 0 12px; }
.docs nav { display: flex; flex-wrap: wrap; gap: 8px; margin-top: 16px; }
.docs nav a { display: inline-flex; align-items: center; min-height: 48px; padding: 0 16px; border: 1px solid var(--rule); border-radius: 6px; background: var(--card); text-decoration: none; }
.docs .route { margin: 8px 0; border: 1px solid var(--rule); border-radius: 8px; background: var(--card); }
.docs summary { min-height: 48px; padding: 12px 16px; cursor: pointer; overflow-wrap: anywhere; }
.docs .method { display: inline-block; min-width: 64px; font-weight: 700; }
.docs code, .docs pre { font: 400 15px/20px "Source Sans 3", sans-serif; font-variant-numeric: tabular-nums; }
.docs code { font-weight: 600; }
.docs .what, .docs .who { color: var(--muted); }
.docs .who, .docs dl { margin: 0; padding: 0 16px 12px; }
.docs dt { margin-top: 8px; font-size: 14px; line-height: 20px; font-weight: 600; }
.docs dd { margin: 4px 0 0; }
.docs pre { margin: 0; padding: 12px; overflow-x: auto; border-radius: 6px; background: var(--paper); white-space: pre; }
@media (max-width: 700px) { .docs .what { display: block; } }
`;
