import { type z } from 'zod';
import { problemSchema } from '#server/contracts/common.ts';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { type EndpointName, endpoints } from '#server/contracts/endpoints.ts';

export interface Input {
  readonly params?: Readonly<Record<string, string | number>>;
  readonly query?: Readonly<Record<string, string | number | boolean | undefined>>;
  readonly body?: unknown;
  /** Sent as the one file of a form. */
  readonly file?: Uint8Array | undefined;
  readonly headers?: Readonly<Record<string, string>>;
}

interface Answer<Name extends EndpointName = EndpointName> {
  readonly status: number;
  readonly headers: Headers;
  /** The reply, parsed by its contract; only when the call succeeded. */
  readonly reply: (typeof endpoints)[Name]['reply'] extends infer Schema extends z.ZodType
    ? z.output<Schema>
    : null;
  /** The problem, parsed by its contract, with all its members; only when it failed. */
  readonly problem: z.output<typeof problemSchema> & Record<string, unknown>;
  readonly text: string;
}

/** Address of an endpoint with its parameters in place. */
function pathOf(name: EndpointName, { params = {}, query = {} }: Input = {}): string {
  const path = endpoints[name].path.replace(/:(\w+)/g, (_, key: string) =>
    encodeURIComponent(String(params[key])),
  );
  const given = Object.entries(query).filter(([, value]) => value !== undefined);
  const search = new URLSearchParams(given.map(([key, value]) => [key, String(value)]));
  return given.length > 0 ? `${path}?${search}` : path;
}

function bodyOf({ body, file, headers }: Input): RequestInit {
  if (file) {
    const form = new FormData();
    form.append('file', new Blob([new Uint8Array(file)]), 'photograph.jpg');
    return { body: form, ...(headers && { headers }) };
  }
  if (body === undefined) return { ...(headers && { headers }) };
  return { body: JSON.stringify(body), headers: { 'content-type': 'application/json', ...headers } };
}

/** Somebody at a browser: keeps cookies, and checks every answer against its contract. */
export class Client {
  readonly origin: string;
  readonly cookies = new Map<string, string>();

  constructor(origin: string) {
    this.origin = origin;
  }

  async fetch(path: string, init: RequestInit = {}): Promise<Response> {
    const headers = new Headers(init.headers);
    if (this.cookies.size > 0) {
      headers.set('cookie', [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; '));
    }
    const response = await fetch(this.origin + path, { ...init, headers, redirect: 'manual' });
    for (const line of response.headers.getSetCookie()) {
      const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
      if (value === '') this.cookies.delete(name);
      else this.cookies.set(name, value);
    }
    return response;
  }

  /** POSTs credentials as the sign-in page does. */
  async offer(email: string, password: string, headers: Record<string, string> = {}): Promise<Response> {
    const token = (await (await this.fetch('/auth/csrf', { headers })).json()) as { csrfToken: string };
    return this.fetch('/auth/callback/credentials', {
      method: 'POST',
      headers: {
        'content-type': 'application/x-www-form-urlencoded',
        'x-auth-return-redirect': '1',
        ...headers,
      },
      body: new URLSearchParams({ email, password, csrfToken: token.csrfToken }),
    });
  }

  async signIn(email: string, password: string): Promise<void> {
    const response = await this.offer(email, password);
    const { url } = (await response.json()) as { url: string };
    if (response.status !== 200 || url.includes('error=')) throw new Error(`No sign-in for ${email}: ${url}`);
  }

  async call<Name extends EndpointName>(name: Name, input: Input = {}): Promise<Answer<Name>> {
    const endpoint: Endpoint = endpoints[name];
    const response = await this.fetch(pathOf(name, input), {
      method: endpoint.method,
      ...bodyOf(input),
    });
    const text = await response.text();
    return {
      status: response.status,
      headers: response.headers,
      text,
      ...contentOf(endpoint, response, text),
    } as Answer<Name>;
  }
}

function contentOf(
  endpoint: Endpoint,
  response: Response,
  text: string,
): { reply?: unknown; problem?: unknown } {
  const type = response.headers.get('content-type') ?? '';
  if (response.ok) {
    if (endpoint.reply === null || endpoint.file) return { reply: null };
    return { reply: endpoint.reply.parse(JSON.parse(text)) };
  }
  if (response.status === 304 || !type.startsWith('application/problem+json')) return {};
  const problem: unknown = JSON.parse(text);
  problemSchema.parse(problem);
  return { problem };
}
