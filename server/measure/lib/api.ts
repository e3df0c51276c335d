/** What the product answered over HTTP: the status and the body as read from JSON. */
export interface ApiAnswer {
  status: number;
  body: unknown;
}

export interface Api {
  get(path: string): Promise<ApiAnswer>;
  post(path: string, body: unknown): Promise<ApiAnswer>;
}

/** The product's own API at an address; what a check file or a data set gives goes through here and nowhere else. */
export function apiAt(baseUrl: string): Api {
  return {
    get: (path) => call(`${baseUrl}${path}`, { method: 'GET', headers: { accept: 'application/json' } }),
    post: (path, body) => call(`${baseUrl}${path}`, {
      method: 'POST',
      headers: { accept: 'application/json', 'content-type': 'application/json' },
      body: JSON.stringify(body),
    }),
  };
}

async function call(url: string, init: RequestInit): Promise<ApiAnswer> {
  const response = await fetch(url, init);
  const text = await response.text();
  if (response.status >= 500) throw new Error(`The server answered ${response.status} at ${url}: ${text.slice(0, 300)}`);
  return { status: response.status, body: text === '' ? null : (JSON.parse(text) as unknown) };
}
