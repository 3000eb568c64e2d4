import { randomBytes, randomInt } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** Letters and digits that are not mistaken for each other. */
const plainCharacters = 'abcdefghjkmnpqrstuvwxyz23456789';

/** A password to be read and typed by people: three groups of five, 74 bits. */
export function readablePassword(): string {
  const group = (): string =>
    Array.from({ length: 5 }, () => plainCharacters[randomInt(plainCharacters.length)]).join('');
  return [group(), group(), group()].join('-');
}

/** A secret for machines, 256 bits. */
export function longSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** The secret kept under this name in the folder, readable by its owner only; made at the first call. */
export function keptSecret(folder: string, name: string, make: () => string): string {
  const path = join(folder, name);
  if (existsSync(path)) {
    const kept = readFileSync(path, 'utf8').trim();
    if (kept !== '') return kept;
  }
  const made = make();
  mkdirSync(folder, { recursive: true });
  writeFileSync(path, `${made}\n`, { mode: 0o600 });
  return made;
}
