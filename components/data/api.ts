import { offlineProblem, problemFrom, timeoutProblem, unreadableProblem } from './problems';
import { parse, type Answer, type ContractName } from './parse';

export interface RequestOptions { signal?: AbortSignal; timeoutMs?: number }

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
const TIMEOUT_MS = 20_000;
/** Told to the shell whenever the server was reached or not, so that one strip speaks for all screens. */
type Reached = (reached: boolean) => void;
const watchers = new Set<Reached>();
export function onReach(watch: Reached): () => void {
  watchers.add(watch);
  return () => watchers.delete(watch);
}
const tell = (reached: boolean) => watchers.forEach((watch) => watch(reached));

/** A signal that ends with the caller's own or when the time is over; written out because phones of a few years ago have no `AbortSignal.any`. */
function within(timeoutMs: number, outer: AbortSignal | undefined): { signal: AbortSignal; stop: () => void } {
  const own = new AbortController();
  const end = () => own.abort();
  const timer = setTimeout(end, timeoutMs);
  if (outer?.aborted) end();
  outer?.addEventListener('abort', end);
  return {
    signal: own.signal,
    stop: () => {
      clearTimeout(timer);
      outer?.removeEventListener('abort', end);
    },
  };
}

async function send(method: Method, path: string, body: BodyInit | undefined, headers: Record<string, string>, options: RequestOptions): Promise<unknown> {
  const clock = within(options.timeoutMs ?? TIMEOUT_MS, options.signal);
  let response: Response;
  let text: string;
  try {
    response = await fetch(path, {
      method,
      credentials: 'same-origin',
      headers: { accept: 'application/json', ...headers },
      body,
      signal: clock.signal,
    });
    text = await response.text();
  } catch (error) {
    if (options.signal?.aborted) throw error; // given up by the caller, who asks no more
    tell(false);
    throw clock.signal.aborted ? timeoutProblem() : offlineProblem();
  } finally {
    clock.stop();
  }
  tell(true);
  let json: unknown;
  try {
    json = text === '' ? null : JSON.parse(text);
  } catch {
    throw unreadableProblem();
  }
  if (!response.ok) throw problemFrom(response.status, json);
  return json;
}

const sendJson = (method: Method, path: string, body: unknown, options: RequestOptions) =>
  send(method, path, body === undefined ? undefined : JSON.stringify(body), method === 'GET' ? {} : { 'content-type': 'application/json' }, options);

const writing = (method: Method) => async <Name extends ContractName>(path: string, body: unknown, contract: Name, options: RequestOptions = {}): Promise<Answer<Name>> =>
  parse(contract, await sendJson(method, path, body ?? {}, options));

/**
 * The only way to the server. Each answer is read against its contract (`parse.ts`), named by the export of shared/contracts;
 * everything that goes wrong is an ApiProblem, save an abort by the caller's own signal.
 */
export const api = {
  get: async <Name extends ContractName>(path: string, contract: Name, options: RequestOptions = {}): Promise<Answer<Name>> =>
    parse(contract, await sendJson('GET', path, undefined, options)),
  post: writing('POST'),
  put: writing('PUT'),
  patch: writing('PATCH'),
  delete: writing('DELETE'),
  /** A file as the body itself, its name in a header (percent-encoded): the type is found by the server. */
  upload: async <Name extends ContractName>(path: string, file: File, contract: Name, options: RequestOptions = {}): Promise<Answer<Name>> =>
    parse(contract, await send('POST', path, file, { 'content-type': 'application/octet-stream', 'x-file-name': encodeURIComponent(file.name) }, { timeoutMs: 120_000, ...options })),
  /** For the quick look's own path, which loads no contract library: the caller guards what it reads. */
  raw: {
    get: (path: string, options: RequestOptions = {}) => sendJson('GET', path, undefined, options),
    post: (path: string, body: unknown, options: RequestOptions = {}) => sendJson('POST', path, body, options),
  },
};
