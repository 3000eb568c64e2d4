import { mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, it } from 'vitest';
import { keptSecret, longSecret, readablePassword } from '#server/start/secrets.ts';

const folder = mkdtempSync(join(tmpdir(), 'secrets-'));
afterAll(() => {
  rmSync(folder, { recursive: true });
});

it('makes a secret once and keeps it for its owner alone', () => {
  const made = keptSecret(folder, 'auth-secret', longSecret);
  expect(keptSecret(folder, 'auth-secret', longSecret)).toBe(made);
  expect(readdirSync(folder)).toEqual(['auth-secret']);
  expect(statSync(join(folder, 'auth-secret')).mode & 0o777).toBe(0o600);
});

it('makes secrets of the strength asked for', () => {
  expect(longSecret()).toMatch(/^[\w-]{43}$/);
  expect(readablePassword()).toMatch(/^([a-hjkmnp-z2-9]{5}-){2}[a-hjkmnp-z2-9]{5}$/);
  expect(readablePassword()).not.toBe(readablePassword());
});
