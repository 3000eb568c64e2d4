import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { signInLimit } from '#server/account/attempt-limit.ts';
import { problemSchema } from '#server/contracts/common.ts';
import { password, startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { Client } from '../support/client.ts';

let api: TestApi;
let marsh: TestWorkshop;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
});
afterAll(() => api.close());

const urlOf = async (response: Response) => ((await response.json()) as { url: string }).url;

describe('signing in', () => {
  it('takes the right password, whatever the case of the address', async () => {
    const client = api.anonymous();
    await client.signIn('Designer@MARSH.example', password);
    const me = await client.call('me');
    expect(me.status).toBe(200);
    expect(me.reply).toMatchObject({
      role: 'designer',
      email: 'designer@marsh.example',
      workshop: { name: 'marsh' },
    });
  });

  it('sets one session cookie that scripts cannot read and other sites cannot send', async () => {
    const response = await api.anonymous().offer(marsh.email('builder'), password);
    const cookie = response.headers.getSetCookie().find((line) => line.includes('session-token'));
    expect(cookie).toMatch(/^authjs\.session-token=/);
    expect(cookie).toMatch(/; HttpOnly/i);
    expect(cookie).toMatch(/; SameSite=Lax/i);
    expect(cookie).toMatch(/; Path=\//i);
    expect(cookie).not.toMatch(/; Secure/i);
  });

  it('takes JSON as well as a form', async () => {
    const client = api.anonymous();
    const { csrfToken } = (await (await client.fetch('/auth/csrf')).json()) as { csrfToken: string };
    const response = await client.fetch('/auth/callback/credentials', {
      method: 'POST',
      headers: { 'content-type': 'application/json', 'x-auth-return-redirect': '1' },
      body: JSON.stringify({ email: marsh.email('owner'), password, csrfToken }),
    });
    expect(await urlOf(response)).not.toContain('error');
    expect((await client.call('me')).reply.role).toBe('owner');
  });

  it('answers a wrong password, an unknown address and a person out of action in the same words', async () => {
    const fen = await api.addWorkshop('fen');
    await api.knex('people').where({ id: fen.people.builder }).update({ active: false });
    const answers: string[] = [];
    for (const [email, offered] of [
      [fen.email('owner'), 'not the password'],
      ['nobody@fen.example', password],
      [fen.email('builder'), password],
      ['no address', password],
      ["' OR 1=1 -- @fen.example", password],
    ] as const) {
      const response = await api.anonymous().offer(email, offered);
      expect(response.status).toBe(200);
      expect(response.headers.getSetCookie().some((line) => line.includes('session-token'))).toBe(false);
      answers.push(await urlOf(response));
    }
    expect(new Set(answers).size).toBe(1);
    expect(answers[0]).toContain('error=CredentialsSignin');
    expect(api.errors).toEqual([]);
  });

  it('refuses a form without the token of the page', async () => {
    const client = api.anonymous();
    const response = await client.fetch('/auth/callback/credentials', {
      method: 'POST',
      headers: { 'content-type': 'application/json', 'x-auth-return-redirect': '1' },
      body: JSON.stringify({ email: marsh.email('owner'), password }),
    });
    expect(response.headers.getSetCookie().some((line) => line.includes('session-token'))).toBe(false);
    expect((await client.call('me')).status).toBe(401);
  });

  it('keeps Auth.js’ own pages and other addresses away', async () => {
    for (const path of ['/auth/signin', '/auth/providers', '/auth/error', '/auth/nonsense', '/auth']) {
      const response = await api.anonymous().fetch(path);
      expect([path, response.status]).toEqual([path, 404]);
      problemSchema.parse(await response.json());
    }
  });
});

describe('the session', () => {
  it('ends with signing out', async () => {
    const client = await api.signIn(marsh, 'builder');
    const { csrfToken } = (await (await client.fetch('/auth/csrf')).json()) as { csrfToken: string };
    await client.fetch('/auth/signout', { method: 'POST', body: new URLSearchParams({ csrfToken }) });
    expect([...client.cookies.keys()].some((name) => name.includes('session-token'))).toBe(false);
    expect((await client.call('me')).status).toBe(401);
  });

  it('holds nothing about the person but the id and the epoch', async () => {
    const client = await api.signIn(marsh, 'designer');
    const session = (await (await client.fetch('/auth/session')).json()) as object;
    expect(Object.keys(session).sort()).toEqual(['epoch', 'expires', 'personId']);
  });

  it('is nothing for a made-up or altered cookie', async () => {
    const client = await api.signIn(marsh, 'designer');
    const token = client.cookies.get('authjs.session-token')!;
    for (const forged of ['x', `${token.slice(0, -4)}AAAA`, 'a.b.c.d.e']) {
      client.cookies.set('authjs.session-token', forged);
      expect((await client.call('me')).status).toBe(401);
    }
    expect(api.errors).toEqual([]);
  });

  it.each([
    ['the role changes', { role: 'builder' }],
    ['the password changes', { password_hash: 'another' }],
    ['the person is put out of action', { active: false }],
  ])('ends at once when %s', async (_name, change) => {
    const heath = await api.addWorkshop(`heath${Object.keys(change)[0]?.replace('_', '')}`);
    const client = await api.signIn(heath, 'designer');
    expect((await client.call('me')).status).toBe(200);
    await api.knex('people').where({ id: heath.people.designer }).update(change);
    expect((await client.call('me')).status).toBe(401);
    expect(await (await client.fetch('/auth/session')).json()).toBeNull();
  });

  it('goes on when only name or preferences change', async () => {
    const client = await api.signIn(marsh, 'designer');
    await api.knex('people').where({ id: marsh.people.designer }).update({ name: 'Another name' });
    expect((await client.call('changePreferences', { body: { theme: 'night' } })).reply.name).toBe(
      'Another name',
    );
    expect((await client.call('me')).reply.preferences).toEqual({ units: 'mm', theme: 'night' });
  });
});

describe('a new password', () => {
  it('takes the present one, ends every session, and is the one that counts', async () => {
    const moor = await api.addWorkshop('moor');
    const [here, elsewhere] = [await api.signIn(moor, 'owner'), await api.signIn(moor, 'owner')];
    const next = 'an entirely new password';
    const changed = await here.call('changePassword', { body: { current: password, next } });
    expect(changed.status).toBe(204);
    expect([(await here.call('me')).status, (await elsewhere.call('me')).status]).toEqual([401, 401]);
    const [old, fresh] = [await api.anonymous().offer(moor.email('owner'), password), api.anonymous()];
    expect(await urlOf(old)).toContain('error=');
    await fresh.signIn(moor.email('owner'), next);
    expect((await fresh.call('me')).status).toBe(200);
  });

  it('is refused with the field named, and guessing the present one is slowed down', async () => {
    const weir = await api.addWorkshop('weir');
    const client = await api.signIn(weir, 'owner');
    const short = await client.call('changePassword', { body: { current: password, next: 'short' } });
    expect(short.status).toBe(422);
    expect(short.problem.errors?.[0]?.path).toBe('next');
    for (let i = 0; i < signInLimit.free; i += 1) {
      const wrong = await client.call('changePassword', {
        body: { current: `guess ${i}`, next: 'a new long password' },
      });
      expect(wrong.problem.errors).toEqual([
        { path: 'current', message: 'This is not your present password.' },
      ]);
    }
    const slowed = await client.call('changePassword', {
      body: { current: password, next: 'a new long password' },
    });
    expect(slowed.status).toBe(429);
    expect(Number(slowed.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await client.call('me')).status).toBe(200);
  });
});

describe('too many attempts', () => {
  it('make the account wait as seen from one address, say how long, and leave everybody else alone', async () => {
    const proxied = await startApi({ trustProxy: 1 });
    try {
      const tarn = await proxied.addWorkshop('tarn');
      const from = (ip: string, email: string, offered = 'wrong password') =>
        new Client(proxied.origin).offer(email, offered, { 'x-forwarded-for': ip });
      const owner = tarn.email('owner');
      for (let i = 0; i < signInLimit.free; i += 1) expect((await from('192.0.2.1', owner)).status).toBe(200);
      const slowed = await from('192.0.2.1', owner.toUpperCase(), password);
      expect(slowed.status).toBe(429);
      expect(slowed.headers.get('content-type')).toContain('application/problem+json');
      expect(Number(slowed.headers.get('retry-after'))).toBeGreaterThanOrEqual(1);
      expect(problemSchema.parse(await slowed.json()).code).toBe('too-many');
      const elsewhere = await from('198.51.100.7', owner, password);
      expect(await urlOf(elsewhere)).not.toContain('error=');
      const colleague = await from('192.0.2.1', tarn.email('builder'), password);
      expect(await urlOf(colleague)).not.toContain('error=');
      const sameNetwork = ['2001:db8:1:2::1', '2001:db8:1:2:ffff::9'];
      for (let i = 0; i < signInLimit.free; i += 1) await from(sameNetwork[i % 2]!, owner);
      expect((await from(sameNetwork[0]!, owner)).status).toBe(429);
    } finally {
      await proxied.close();
    }
  });

  it('do not add up when they are right', async () => {
    const beck = await api.addWorkshop('beck');
    for (let i = 0; i < signInLimit.free + 2; i += 1) {
      expect((await api.anonymous().offer(beck.email('technician'), password)).status).toBe(200);
    }
    expect((await api.signIn(beck, 'technician')).cookies.size).toBeGreaterThan(0);
  });

  it('count together for one address, whatever the account', async () => {
    const crowd = await startApi({ trustProxy: 1 });
    try {
      const statuses = new Set<number>();
      for (let i = 0; i < 104; i += 1) {
        const headers = { 'x-forwarded-for': '203.0.113.5' };
        statuses.add((await new Client(crowd.origin).offer(`no address ${i}`, 'x', headers)).status);
      }
      expect([...statuses]).toEqual([200, 429]);
      const other = await new Client(crowd.origin).offer('no address', 'x', {
        'x-forwarded-for': '203.0.113.6',
      });
      expect(other.status).toBe(200);
    } finally {
      await crowd.close();
    }
  });
});

describe('behind a proxy with https', () => {
  it('marks the cookie as secure and finds it again', async () => {
    const secure = await startApi({ trustProxy: 1, publicUrl: 'https://sections.example' });
    try {
      const pond = await secure.addWorkshop('pond');
      const headers = { 'x-forwarded-proto': 'https' };
      const client = new Client(secure.origin);
      const response = await client.offer(pond.email('owner'), password, headers);
      const cookie = response.headers.getSetCookie().find((line) => line.includes('session-token'));
      expect(cookie).toMatch(/^__Secure-authjs\.session-token=.*; Secure/i);
      const me = await client.call('me', { headers });
      expect(me.status).toBe(200);
      expect(me.headers.get('strict-transport-security')).toContain('max-age=');
    } finally {
      await secure.close();
    }
  });

  it('believes no proxy that is not trusted', async () => {
    const client = new Client(api.origin);
    const response = await client.offer(marsh.email('owner'), password, {
      'x-forwarded-proto': 'https',
      'x-forwarded-host': 'evil.example',
    });
    const cookie = response.headers.getSetCookie().find((line) => line.includes('session-token'));
    expect(cookie).toMatch(/^authjs\.session-token=/);
    expect(await urlOf(response)).not.toContain('evil.example');
    expect((await client.call('me', { headers: { 'x-forwarded-proto': 'https' } })).status).toBe(200);
  });
});
