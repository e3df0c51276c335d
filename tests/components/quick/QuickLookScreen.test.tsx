import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';

import { createQueryClient } from '@/components/data/sessionEnd';
import { QuickLookScreen } from '@/components/quick/QuickLookScreen';
import { quickLookRequest } from '@/shared/contracts/quickLook';
import { quickLook, registryFromJson } from '@/shared/engine';
import { tableRows } from '@/shared/engine/relations/tables';

/** The server's side of the quick look with the real engine, in this process: what a field says and does is tested here, HTTP in tests/api. */
const registry = registryFromJson(tableRows);
/** What the client reads of a Response, which jsdom does not have. */
const json = (status: number, body: unknown) => ({ ok: status < 400, status, text: () => Promise.resolve(JSON.stringify(body)) }) as Response;
let isAway = false;
let asked: unknown[] = [];

function answer(path: string, body: string): Response {
  if (path === '/api/session') return json(200, { user: null, reviewsWaiting: 0, demo: null });
  if (path !== '/api/quick-look') return json(404, { type: '/problems/not-found', title: 'Not found', status: 404, detail: 'There is nothing at this address.' });
  asked.push(JSON.parse(body));
  const result = quickLook(quickLookRequest.parse(JSON.parse(body)), registry);
  if (result.state !== 'refused') return json(200, result);
  const errors = result.problems.map(({ field, code, sentence, mends }) => ({ pointer: `#/${field.replaceAll('.', '/')}`, detail: sentence, code, mends }));
  return json(422, { type: '/problems/invalid-input', title: 'Some fields need attention', status: 422, detail: 'Check the marked fields.', errors });
}

beforeEach(() => {
  isAway = false;
  asked = [];
  window.sessionStorage.clear();
  window.history.replaceState(null, '', '/');
  globalThis.fetch = (path, init) => (isAway ? Promise.reject(new TypeError('Failed to fetch')) : Promise.resolve(answer(typeof path === 'string' ? path : 'url' in path ? path.url : path.href, typeof init?.body === 'string' ? init.body : '')));
});

function open(search = '') {
  window.history.replaceState(null, '', `/${search}`);
  render(<QueryClientProvider client={createQueryClient()}><QuickLookScreen /></QueryClientProvider>);
}
const field = () => screen.getByRole('textbox', { name: 'Measured three J H H, in hertz' });
const errorField = () => screen.getByRole('textbox', { name: 'Standard error of J, in hertz' });
const strip = () => screen.getByRole('region', { name: 'Calculated answer' });
const strips = (text: string | RegExp) => waitFor(() => expect(strip().textContent).toMatch(text), { timeout: 5_000 });

describe('the quick look', () => {
  it('asks nothing before a J is typed, and answers with its grade first', async () => {
    open();
    expect(strip().textContent).toContain('Type a ³J to begin');
    await userEvent.type(field(), '3,2');
    await strips(/^(tentative|not decided)/);
    expect(screen.getByText(/Decimal comma: 3,2 is read as 3.2/)).toBeTruthy();
    expect(asked.at(-1)).toMatchObject({ bond: 'single', j: '3,2', groups: null });
  });

  it('tells a refused value at its field, keeps it, and mends it by one press', async () => {
    open('?j=9.6&se=0');
    await waitFor(() => expect(errorField().getAttribute('aria-invalid')).toBe('true'), { timeout: 5_000 });
    expect((errorField() as HTMLInputElement).value).toBe('0');
    await userEvent.click(screen.getByRole('button', { name: /^Use 0.2/ }));
    expect((errorField() as HTMLInputElement).value).toBe('0.2');
    await strips(/^(tentative|not decided)/);
  });

  it('asks for the field when a distance in ppm was typed', async () => {
    open('?j=0.0178');
    await waitFor(() => expect(screen.getByRole('textbox', { name: /Spectrometer/ })).toBeTruthy(), { timeout: 5_000 });
    await userEvent.type(screen.getByRole('textbox', { name: /Spectrometer/ }), '500');
    await userEvent.click(await screen.findByRole('button', { name: /^Use 8.9/ }, { timeout: 5_000 }));
    expect((field() as HTMLInputElement).value).toBe('8.9');
  });

  it('holds its inputs in the address', async () => {
    open();
    await userEvent.type(field(), '9.6');
    await waitFor(() => expect(window.location.search).toBe('?j=9.6'), { timeout: 5_000 });
  });

  it('says cis or trans for a double bond, and names what would decide when it does not', async () => {
    open('?bond=double&j=15.8&left=C(H,H,H)~H&right=C(=O,O)~H');
    await strips(/^(assigned|tentative).*E/);
    expect(within(strip()).getByRole('heading').textContent).toMatch(/trans/i);
  });

  it('shows no odds beside "not decided"', async () => {
    open('?bond=double&j=12.4&left=O(C)~H&right=C(C,H,H)~H');
    await strips(/^not decided/);
    expect(strip().textContent).not.toMatch(/in 100/);
    expect(screen.getByRole('region', { name: 'What would decide' })).toBeTruthy();
  });

  it('keeps what was typed when the server is away, and answers when asked again', async () => {
    isAway = true;
    open('?j=9.6');
    await strips(/No connection/);
    expect((field() as HTMLInputElement).value).toBe('9.6');
    isAway = false;
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    await strips(/^(tentative|not decided)/);
  });
});
