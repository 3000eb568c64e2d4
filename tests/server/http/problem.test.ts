import { once } from 'node:events';
import { type IncomingMessage, request } from 'node:http';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema } from '#server/contracts/common.ts';
import { problems } from '#server/contracts/problems.ts';
import { createTestDatabase } from '#tests/database.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { naca4 } from '../support/shapes.ts';

let api: TestApi;
let marsh: TestWorkshop;
let designer: Client;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  designer = await api.signIn(marsh, 'designer');
});
afterAll(() => api.close());

async function problemOf(response: Response) {
  expect(response.headers.get('content-type')).toMatch(/^application\/problem\+json/);
  const problem = problemSchema.strict().parse(await response.json());
  expect(problem.status).toBe(response.status);
  expect(problem.title).toBe(problems[problem.code as keyof typeof problems].title);
  expect(problem.requestId).toBe(response.headers.get('x-request-id'));
  return problem;
}
const json = { 'content-type': 'application/json' };

describe('problems', () => {
  it.each([
    ['an unknown address of the API', '/api/nonsense', {}, 'not-found'],
    ['an address with a slash too many', '/api/sections/', {}, 'not-found'],
    ['an id that is none', '/api/sections/7', {}, 'not-found'],
    [
      'a version number that is none',
      '/api/sections/0190a5b0-1111-7222-8333-444455556666/versions/x',
      {},
      'not-found',
    ],
    ['a path that cannot be decoded', '/api/sections/%E0%A4%A', {}, 'not-found'],
    ['another method', '/api/sections', { method: 'PUT' }, 'method-not-allowed'],
    ['no JSON', '/api/sections', { method: 'POST', headers: json, body: '{"name":' }, 'malformed'],
    ['JSON that is no object', '/api/sections', { method: 'POST', headers: json, body: '7' }, 'malformed'],
    ['a list for an object', '/api/sections', { method: 'POST', headers: json, body: '[]' }, 'invalid'],
    ['nothing at all', '/api/sections', { method: 'POST', headers: json }, 'invalid'],
    [
      'a form',
      '/api/sections',
      { method: 'POST', body: new URLSearchParams({ name: 'x' }) },
      'unsupported-type',
    ],
    [
      'text',
      '/api/sections',
      { method: 'POST', headers: { 'content-type': 'text/plain' }, body: '{}' },
      'unsupported-type',
    ],
    [
      'JSON in another script',
      '/api/sections',
      { method: 'POST', headers: { 'content-type': 'application/json; charset=ebcdic' }, body: '{}' },
      'unsupported-type',
    ],
    [
      'a body too large',
      '/api/sections',
      { method: 'POST', headers: json, body: JSON.stringify({ name: 'x'.repeat(40_000) }) },
      'too-large',
    ],
    ['a query to what takes none', '/api/me?verbose=1', {}, 'invalid'],
  ] as [string, string, RequestInit, keyof typeof problems][])(
    'answer %s',
    async (_name, path, init, code) => {
      const response = await designer.fetch(path, init);
      expect((await problemOf(response)).code).toBe(code);
      expect(api.errors).toEqual([]);
    },
  );

  it('do not arise where the length of an absent body is stated, whatever its type', async () => {
    const made = await designer.call('createSection', { body: { name: 'Bare', shape: naca4() } });
    const cookie = [...designer.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    for (const more of [{}, { 'content-type': 'text/plain' }]) {
      const headers = { cookie, 'content-length': '0', ...more };
      const sent = request(`${api.origin}/api/sections/${made.reply.id}`, { method: 'DELETE', headers });
      sent.end();
      const [response] = (await once(sent, 'response')) as [IncomingMessage];
      response.resume();
      expect(response.statusCode).toBe(204);
    }
  });

  it('say which methods an address takes', async () => {
    const response = await designer.fetch('/api/sections', { method: 'PUT' });
    expect(response.headers.get('allow')).toBe('GET, HEAD, POST');
  });

  it('name an unknown parameter', async () => {
    const problem = await problemOf(await designer.fetch('/api/sections?colour=red&shape=flat'));
    expect(problem.errors?.map(({ path }) => path).sort()).toEqual(['colour', 'shape']);
  });

  it('ask for sign-in before anything else', async () => {
    const response = await api.anonymous().fetch('/api/sections?colour=red');
    expect((await problemOf(response)).code).toBe('unauthenticated');
  });

  it('are never kept by a cache', async () => {
    for (const path of ['/api/nonsense', '/api/sections/7', '/api/sections?sort=x']) {
      expect((await designer.fetch(path)).headers.get('cache-control')).toBe('private, no-store');
    }
  });
});

describe('requests of other sites', () => {
  const write = (headers: Record<string, string>) =>
    designer.fetch('/api/me/preferences', { method: 'PATCH', headers: { ...json, ...headers }, body: '{}' });

  it.each([
    { 'sec-fetch-site': 'cross-site' },
    { 'sec-fetch-site': 'same-site' },
    { origin: 'https://evil.example' },
    { origin: 'null' },
    { origin: 'http://127.0.0.1:1' },
  ])('are refused: %j', async (headers) => {
    expect((await problemOf(await write(headers))).code).toBe('cross-site');
  });

  it('are told from our own pages and from programs', async () => {
    for (const headers of [
      {},
      { origin: api.origin },
      { 'sec-fetch-site': 'same-origin' },
      { 'sec-fetch-site': 'none' },
    ]) {
      expect((await write(headers)).status).toBe(200);
    }
  });

  it('may be links, which only read', async () => {
    expect((await designer.fetch('/api/me', { headers: { 'sec-fetch-site': 'cross-site' } })).status).toBe(
      200,
    );
  });

  it('cannot sign anybody in', async () => {
    const response = await api.anonymous().fetch('/auth/callback/credentials', {
      method: 'POST',
      headers: { 'sec-fetch-site': 'cross-site' },
      body: new URLSearchParams({ email: 'x', password: 'y' }),
    });
    expect((await problemOf(response)).code).toBe('cross-site');
  });
});

describe('when something breaks', () => {
  it('an unforeseen error is kept under the request id and shown without anything from inside', async () => {
    const broken = await startApi();
    try {
      const fen = await broken.addWorkshop('fen');
      const owner = await broken.signIn(fen, 'owner');
      await broken.knex.raw('ALTER TABLE section_drafts RENAME TO elsewhere');
      await broken.knex.raw('ALTER TABLE sections CHANGE purpose intent varchar(200) NOT NULL');
      const response = await owner.fetch('/api/sections?search=very-private');
      expect(response.status).toBe(500);
      const text = await response.clone().text();
      const problem = await problemOf(response);
      expect(problem.code).toBe('internal');
      expect(text).not.toMatch(/purpose|select|sections|stack|knex|ER_/i);
      const logged = broken.errors.join('\n');
      expect(logged).toContain(problem.requestId);
      expect(logged).toContain('ER_BAD_FIELD_ERROR');
      expect(logged).not.toMatch(/very-private|owner@fen|127\.0\.0\.1|cookie/i);
    } finally {
      await broken.close();
    }
  });

  it('a database that is away is 503 with Retry-After, and nobody is signed out by it', async () => {
    const database = await createTestDatabase();
    const away = await startApi({ database });
    try {
      const fen = await away.addWorkshop('fen');
      const owner = await away.signIn(fen, 'owner');
      await database.knex.destroy();
      const csrf = await owner.fetch('/auth/csrf');
      expect(csrf.status).toBe(200);
      const answers = [
        await owner.fetch('/api/me'),
        await owner.fetch('/api/sections', {
          method: 'POST',
          headers: json,
          body: JSON.stringify({ name: 'x', shape: naca4() }),
        }),
        await owner.fetch('/auth/session'),
        await owner.offer(fen.email('owner'), 'whatever it was'),
      ];
      for (const response of answers) {
        expect(response.headers.get('retry-after')).toBe('5');
        expect((await problemOf(response)).code).toBe('unavailable');
      }
      const health = await owner.fetch('/api/health');
      expect(health.status).toBe(503);
      expect(health.headers.get('retry-after')).toBe('5');
      expect(await health.json()).toMatchObject({ status: 'unavailable', database: 'unavailable' });
      expect([...owner.cookies.keys()].some((name) => name.includes('session-token'))).toBe(true);
    } finally {
      await away.close();
    }
  });
});
