import { chmodSync, mkdirSync, mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { canEnter, serverAccount } from '#server/start/mariadb/account.ts';
import { choosePlace, farFolder, nearOrFar } from '#server/start/place.ts';

let parent: string;
let root: string;

beforeEach(() => {
  parent = mkdtempSync(join(tmpdir(), 'place-'));
  chmodSync(parent, 0o755);
  root = join(parent, 'checkout');
  mkdirSync(root);
});

afterEach(() => {
  chmodSync(parent, 0o755);
  rmSync(parent, { recursive: true });
});

describe('choosePlace', () => {
  it('takes .data in the checkout, which others may pass through but not list', () => {
    expect(choosePlace(root, null, serverAccount())).toEqual({ folder: join(root, '.data'), remark: null });
    expect(statSync(join(root, '.data')).mode & 0o777).toBe(0o711);
  });

  it('takes DATA_DIR, from the checkout where it is relative', () => {
    expect(choosePlace(root, 'kept/here', serverAccount()).folder).toBe(join(root, 'kept/here'));
    expect(choosePlace(root, join(parent, 'there'), serverAccount()).folder).toBe(join(parent, 'there'));
  });

  it('has a place for each checkout under /var/lib', () => {
    expect(farFolder(root)).toMatch(/^\/var\/lib\/ribwright-[0-9a-f]{12}$/);
    expect(farFolder(root)).not.toBe(farFolder(`${root}2`));
  });
});

describe('nearOrFar', () => {
  const usual = { isGiven: false, canEnterNear: true, nearHasData: false, farHasData: false };

  it('stays in the checkout where that can be entered', () => {
    expect(nearOrFar(usual)).toBe('near');
    expect(nearOrFar({ ...usual, nearHasData: true })).toBe('near');
  });

  it('goes far where the checkout is closed', () => {
    expect(nearOrFar({ ...usual, canEnterNear: false })).toBe('far');
  });

  it('stays far once data are there, even when the checkout is opened', () => {
    expect(nearOrFar({ ...usual, farHasData: true })).toBe('far');
  });

  it('does not begin anew where the checkout has data that can no longer be reached', () => {
    expect(nearOrFar({ ...usual, canEnterNear: false, nearHasData: true })).toBeNull();
  });

  it('takes the folder asked for or none', () => {
    expect(nearOrFar({ ...usual, isGiven: true, farHasData: true })).toBe('near');
    expect(nearOrFar({ ...usual, isGiven: true, canEnterNear: false })).toBeNull();
  });
});

describe('canEnter', () => {
  it('tells whether a folder can be entered', () => {
    expect(canEnter(root, serverAccount())).toBe(true);
    expect(canEnter(join(root, 'absent'), serverAccount())).toBe(false);
    // Root itself may enter everything, so it asks for the server's account.
    chmodSync(parent, process.getuid?.() === 0 ? 0o700 : 0o600);
    expect(canEnter(root, serverAccount())).toBe(false);
  });
});
