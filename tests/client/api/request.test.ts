import { afterEach, describe, expect, it, vi } from 'vitest';
import {
  fieldErrors,
  fileUrl,
  OfflineError,
  onSessionEnd,
  ProblemError,
  ReplyError,
  request,
} from '#client/api/request.ts';
import { fakeServer, json, noAnswer, problem } from '#tests/client/support/fake-server.ts';
import { idOf, personOf, sectionOf } from '#tests/client/support/samples.ts';
import { accountEndpoints } from '#server/contracts/account-endpoints.ts';
import { sectionEndpoints } from '#server/contracts/section-endpoints.ts';

afterEach(() => {
  vi.unstubAllGlobals();
});

const failure = (promise: Promise<unknown>) =>
  promise.then(
    () => {
      throw new Error('It was expected to fail.');
    },
    (error: unknown) => error,
  );

describe('request', () => {
  it('fills the path, leaves absent parts out of the query, and parses the reply', async () => {
    const server = fakeServer({
      'GET /api/sections': () => json({ items: [sectionOf(1, 'Heron')], nextCursor: null }),
    });
    const page = await request(sectionEndpoints.listSections, {
      query: { search: '', cursor: undefined, sort: 'name' },
    });
    expect(page.items.map((section) => section.name)).toEqual(['Heron']);
    expect(server.asked[0]?.query.toString()).toBe('sort=name');
  });

  it('sends a body as JSON and gives nothing for 204', async () => {
    const path = `/api/sections/${idOf(7)}/draft`;
    const server = fakeServer({
      [`DELETE ${path}`]: () => new Response(null, { status: 204 }),
      'POST /api/me/password': () => new Response(null, { status: 204 }),
    });
    expect(await request(sectionEndpoints.dropDraft, { params: { sectionId: idOf(7) } })).toBeUndefined();
    await request(accountEndpoints.changePassword, { body: { current: 'a', next: 'b' } });
    expect(server.asked[0]?.headers.has('content-type')).toBe(false);
    expect(server.asked[1]?.body).toEqual({ current: 'a', next: 'b' });
    expect(server.asked[1]?.headers.get('content-type')).toBe('application/json');
  });

  it('throws the problem with its fields and the time to wait', async () => {
    const errors = [
      { path: 'name', message: 'Give the section a name.' },
      { path: 'name', message: 'second' },
    ];
    fakeServer({ 'GET /api/me': () => problem(422, { code: 'invalid', errors }, { 'retry-after': '30' }) });
    const error = await failure(request(accountEndpoints.me));
    expect(error).toBeInstanceOf(ProblemError);
    expect(error).toMatchObject({ status: 422, retryAfterSeconds: 30, problem: { code: 'invalid' } });
    expect([...fieldErrors(error)]).toEqual([['name', 'Give the section a name.']]);
  });

  it('makes a problem of a refusal in any other form', async () => {
    fakeServer({ 'GET /api/me': () => new Response('<h1>Bad gateway</h1>', { status: 502 }) });
    expect(await failure(request(accountEndpoints.me))).toMatchObject({
      status: 502,
      problem: { code: 'unexplained' },
    });
  });

  it('tells no answer from an answer', async () => {
    fakeServer({ 'GET /api/me': noAnswer });
    expect(await failure(request(accountEndpoints.me))).toBeInstanceOf(OfflineError);
  });

  it('refuses a reply that does not fit its schema', async () => {
    fakeServer({ 'GET /api/me': () => json({ ...personOf('owner'), role: 'king' }) });
    expect(await failure(request(accountEndpoints.me))).toBeInstanceOf(ReplyError);
  });

  it('passes an abort on as what it is', async () => {
    fakeServer({
      'GET /api/me': () => {
        throw new DOMException('left', 'AbortError');
      },
    });
    expect(await failure(request(accountEndpoints.me))).toMatchObject({ name: 'AbortError' });
  });

  it('tells listeners that the session ended, until they leave', async () => {
    fakeServer({ 'GET /api/me': () => problem(401) });
    let ends = 0;
    const leave = onSessionEnd(() => (ends += 1));
    await failure(request(accountEndpoints.me));
    leave();
    await failure(request(accountEndpoints.me));
    expect(ends).toBe(1);
  });
});

it('fileUrl names the file with its options, lists joined by commas', () => {
  const url = fileUrl(
    sectionEndpoints.dxfFile,
    { sectionId: idOf(3), number: 2 },
    { chordMm: 220, layers: 'OUTLINE,TEXT' },
  );
  expect(url).toBe(`/api/sections/${idOf(3)}/versions/2/contour.dxf?chordMm=220&layers=OUTLINE%2CTEXT`);
});
