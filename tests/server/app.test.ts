import { mkdtemp, mkdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApi, type TestApi } from './support/api.ts';

let api: TestApi;
let folder: string;
const page = '<!doctype html><title>The client</title>';
beforeAll(async () => {
  const home = await mkdtemp(join(tmpdir(), 'client-'));
  folder = join(home, '.build', 'client');
  await mkdir(join(folder, 'assets'), { recursive: true });
  await writeFile(join(folder, 'index.html'), page);
  await writeFile(join(folder, 'assets', 'main-abc123.js'), `/* ${'x'.repeat(5000)} */`);
  await writeFile(join(folder, 'assets', 'both-abc123.js'), 'const plain = true;');
  await writeFile(
    join(folder, 'assets', 'both-abc123.js.br'),
    brotliCompressSync('const compressed = true;'),
  );
  await writeFile(join(folder, 'theme.js'), '"use strict";');
  await writeFile(join(home, 'secret.txt'), 'secret');
  api = await startApi({ clientFolder: folder });
});
afterAll(async () => {
  await api.close();
  await rm(join(folder, '..', '..'), { recursive: true });
});

const get = (path: string, headers: Record<string, string> = {}) => api.anonymous().fetch(path, { headers });

describe('the client', () => {
  it.each(['/', '/sections', '/sections/7?status=released', '/sign-in', '/s/token'])(
    'is served at %s and never kept',
    async (path) => {
      const response = await get(path, { accept: 'text/html,*/*' });
      expect(response.status).toBe(200);
      expect(await response.text()).toBe(page);
      expect(response.headers.get('content-type')).toMatch(/^text\/html/);
      expect(response.headers.get('cache-control')).toBe('no-cache');
      expect(response.headers.get('etag')).not.toBeNull();
    },
  );

  it('sends the brotli form that lies beside a script to whom takes it', async () => {
    const packed = await get('/assets/both-abc123.js', { 'accept-encoding': 'br' });
    expect(await packed.text()).toBe('const compressed = true;');
    expect(packed.headers.get('content-encoding')).toBe('br');
    expect(packed.headers.get('content-type')).toBe('text/javascript; charset=utf-8');
    expect(packed.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    expect(packed.headers.get('vary')).toMatch(/accept-encoding/i);
    const plain = await get('/assets/both-abc123.js', { 'accept-encoding': 'identity' });
    expect(await plain.text()).toBe('const plain = true;');
    expect(plain.headers.get('content-encoding')).toBeNull();
  });

  it('has its hashed files kept for a year, compressed, and the others asked for again', async () => {
    const hashed = await get('/assets/main-abc123.js', { 'accept-encoding': 'gzip' });
    expect(hashed.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    expect(hashed.headers.get('content-encoding')).toBe('gzip');
    expect(hashed.headers.get('content-type')).toMatch(/javascript/);
    expect((await get('/theme.js')).headers.get('cache-control')).toBe('no-cache');
  });

  it.each([
    '/assets/gone-123.js',
    '/favicon.ico',
    '/../secret.txt',
    '/..%2f..%2fsecret.txt',
    '/%2e%2e/secret.txt',
    '/assets/..%5c..%5csecret.txt',
  ])('is not served in place of the file %s', async (path) => {
    const response = await get(path);
    expect(response.status).toBe(404);
    expect(await response.text()).not.toContain('secret\n');
  });

  it.each(['/api', '/api/nonsense', '/auth/nonsense'])('is not served in place of %s', async (path) => {
    const response = await get(path, { accept: 'text/html' });
    expect(response.status).toBe(404);
    expect(response.headers.get('content-type')).toMatch(/^application\/problem\+json/);
  });

  it('takes no writes', async () => {
    expect((await api.anonymous().fetch('/sections', { method: 'POST' })).status).toBe(404);
  });
});

describe('every answer', () => {
  it.each(['/', '/api/health', '/api/nonsense', '/auth/csrf'])(
    'of %s carries the security headers and an id',
    async (path) => {
      const { headers } = await get(path);
      const policy = headers.get('content-security-policy') ?? '';
      expect(policy).toContain("default-src 'self'");
      expect(policy).toContain("script-src 'self';");
      expect(policy).toContain("style-src 'self';");
      expect(policy).toContain("frame-ancestors 'none'");
      expect(policy).not.toMatch(/unsafe|upgrade-insecure/);
      expect(headers.get('x-content-type-options')).toBe('nosniff');
      expect(headers.get('x-powered-by')).toBeNull();
      expect(headers.get('strict-transport-security')).toBeNull();
      expect(headers.get('x-request-id')).toMatch(/^[0-9a-f-]{36}$/);
    },
  );

  it('of the health says that all is well', async () => {
    const health = await api.anonymous().call('health');
    expect(health.reply).toEqual({
      status: 'ok',
      database: 'ok',
      version: expect.stringMatching(/^\d+\.\d+\.\d+/) as string,
    });
  });
});
