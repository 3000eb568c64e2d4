import { type z } from 'zod';
import { problemSchema } from '#server/contracts/common.ts';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { OfflineError, ProblemError, ReplyError } from './errors.ts';

export { fieldErrors, OfflineError, ProblemError, ReplyError } from './errors.ts';

type InputOf<E extends Endpoint, Part extends 'params' | 'query' | 'body'> =
  E extends Record<Part, infer Schema extends z.ZodType> ? z.input<Schema> : undefined;

/** What an endpoint answers; 204 answers nothing. */
export type Reply<E extends Endpoint> = E['reply'] extends infer Schema extends z.ZodType
  ? z.output<Schema>
  : undefined;

interface RequestInput<E extends Endpoint> {
  readonly params?: InputOf<E, 'params'> | undefined;
  readonly query?: InputOf<E, 'query'> | undefined;
  readonly body?: InputOf<E, 'body'> | undefined;
  readonly signal?: AbortSignal | undefined;
}

const sessionEndListeners = new Set<() => void>();

/** Calls `listener` whenever the server answers 401; returns the way to stop listening. */
export function onSessionEnd(listener: () => void): () => void {
  sessionEndListeners.add(listener);
  return () => sessionEndListeners.delete(listener);
}

/**
 * The one door to the API: typed by an endpoint of the contracts, the reply parsed with its schema.
 * Throws ProblemError (the server said no), OfflineError (no answer), ReplyError (an answer of an unknown form),
 * and passes the AbortError of `signal` on.
 */
export async function request<E extends Endpoint>(
  endpoint: E,
  input: RequestInput<E> = {},
): Promise<Reply<E>> {
  const response = await send(addressOf(endpoint, input.params, input.query), {
    method: endpoint.method,
    headers: {
      accept: 'application/json',
      ...(input.body === undefined ? {} : { 'content-type': 'application/json' }),
    },
    ...(input.body === undefined ? {} : { body: JSON.stringify(input.body) }),
    ...(input.signal ? { signal: input.signal } : {}),
  });
  if (!response.ok) {
    if (response.status === 401) for (const listener of sessionEndListeners) listener();
    throw await problemOf(response);
  }
  if (endpoint.reply === null) return undefined as Reply<E>;
  const parsed = endpoint.reply.safeParse(await bodyOf(response));
  if (!parsed.success) throw new ReplyError(response.headers.get('x-request-id'), { cause: parsed.error });
  return parsed.data as Reply<E>;
}

/** The address of a cut file, for a download; the answer is the file itself. */
export function fileUrl<E extends Endpoint & { readonly file: string }>(
  endpoint: E,
  params: InputOf<E, 'params'>,
  query: InputOf<E, 'query'>,
): string {
  return addressOf(endpoint, params, query);
}

/** fetch that tells "no answer" from "the answer was no". Cookies of this origin go along. */
export async function send(address: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(address, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new OfflineError({ cause: error });
  }
}

/** Turns a refusal into a ProblemError, also when something between here and the server answered in another form. */
export async function problemOf(response: Response): Promise<ProblemError> {
  const body = await bodyOf(response).catch(() => null);
  const parsed = problemSchema.safeParse(body);
  const problem = parsed.success
    ? parsed.data
    : {
        type: 'about:blank',
        title: `The server answered ${String(response.status)} without saying why.`,
        status: response.status,
        code: 'unexplained',
      };
  return new ProblemError(problem, { retryAfterSeconds: retryAfterOf(response), body });
}

function retryAfterOf(response: Response): number | null {
  const header = response.headers.get('retry-after');
  if (header === null) return null;
  const seconds = Number(header);
  if (Number.isFinite(seconds)) return Math.max(0, seconds);
  const until = Date.parse(header);
  return Number.isNaN(until) ? null : Math.max(0, Math.ceil((until - Date.now()) / 1000));
}

async function bodyOf(response: Response): Promise<unknown> {
  const text = await response.text();
  if (!(response.headers.get('content-type') ?? '').includes('json')) return text;
  try {
    return JSON.parse(text);
  } catch {
    return text;
  }
}

function addressOf(endpoint: Endpoint, params: unknown, query: unknown): string {
  const values = (params ?? {}) as Record<string, unknown>;
  const path = endpoint.path.replace(/:(\w+)/g, (_, key: string) => {
    const value = values[key];
    if (value === undefined) throw new Error(`The path ${endpoint.path} needs "${key}".`);
    return encodeURIComponent(String(value));
  });
  const search = new URLSearchParams();
  for (const [key, value] of Object.entries((query ?? {}) as Record<string, unknown>)) {
    if (value === undefined || value === null || value === '') continue;
    search.set(key, Array.isArray(value) ? value.join(',') : String(value));
  }
  return search.size === 0 ? path : `${path}?${search.toString()}`;
}
