import { vi } from 'vitest';

export interface Asked {
  readonly method: string;
  readonly path: string;
  readonly query: URLSearchParams;
  readonly body: unknown;
  readonly headers: Headers;
}
type Answer = Response | Promise<Response>;
type Route = (asked: Asked) => Answer;

/** Answers fetch in the place of a server: routes by "METHOD /path", everything asked is kept in `asked`. */
export function fakeServer(routes: Readonly<Record<string, Route>>) {
  const asked: Asked[] = [];
  vi.stubGlobal('fetch', async (address: string, init: RequestInit = {}) => {
    const url = new URL(address, 'http://localhost');
    const method = init.method ?? 'GET';
    const one = {
      method,
      path: url.pathname,
      query: url.searchParams,
      body: bodyOf(init.body),
      headers: new Headers(init.headers),
    };
    asked.push(one);
    const route = routes[`${method} ${url.pathname}`];
    if (!route) return problem(404, { title: `The fake server has no ${method} ${url.pathname}.` });
    return route(one);
  });
  return {
    asked,
    of: (method: string, path: string) => asked.filter((one) => one.method === method && one.path === path),
  };
}

function bodyOf(body: RequestInit['body']): unknown {
  if (typeof body === 'string') return JSON.parse(body);
  if (body instanceof URLSearchParams) return Object.fromEntries(body);
  return undefined;
}

export function json(value: unknown, status = 200): Response {
  return new Response(JSON.stringify(value), { status, headers: { 'content-type': 'application/json' } });
}

export function problem(
  status: number,
  members: Record<string, unknown> = {},
  headers: Record<string, string> = {},
): Response {
  const body = { type: 'about:blank', title: 'Refused.', status, code: 'refused', ...members };
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/problem+json', ...headers },
  });
}

/** What fetch does when there is no network. */
export function noAnswer(): never {
  throw new TypeError('fetch failed');
}
