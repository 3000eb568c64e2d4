import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { settings, type Setting } from '#server/config.ts';

const readme = readFileSync(new URL('../../../README.md', import.meta.url), 'utf8');
const rows = readme.split('\n').filter((line) => line.startsWith('|'));

it.each(settings.map(({ name }) => name))('%s has a row in the table of the README', (name) => {
  expect(rows.filter((row) => new RegExp(`^\\|\\s*\`${name}\`\\s*\\|`).test(row))).toHaveLength(1);
});

it('names each setting once, and says what it means and what holds without it', () => {
  expect(new Set(settings.map(({ name }) => name)).size).toBe(settings.length);
  expect(settings.every((setting: Setting) => setting.meaning !== '' && setting.default !== '')).toBe(true);
});
