import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { isBuilt, sumOf } from '#server/start/client-build.ts';

let root: string;
const write = (path: string, text: string): void => {
  mkdirSync(join(root, path, '..'), { recursive: true });
  writeFileSync(join(root, path), text);
};

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'client-build-'));
  write('client/main.tsx', 'one');
  write('geometry/shapes/naca4.ts', 'two');
  write('server/contracts/people.ts', 'three');
  write('server/app.ts', 'four');
});

afterEach(() => {
  rmSync(root, { recursive: true });
});

describe('sumOf', () => {
  it('is the same for the same files', () => {
    const before = sumOf(root);
    write('client/main.tsx', 'one');
    expect(sumOf(root)).toBe(before);
  });

  it.each(['client/main.tsx', 'client/ui/new.tsx', 'geometry/shapes/naca4.ts', 'server/contracts/people.ts'])(
    'changes with %s',
    (path) => {
      const before = sumOf(root);
      write(path, 'changed');
      expect(sumOf(root)).not.toBe(before);
    },
  );

  it('changes with the name of a file, and with the border between two', () => {
    const before = sumOf(root);
    renameSync(join(root, 'client/main.tsx'), join(root, 'client/other.tsx'));
    expect(sumOf(root)).not.toBe(before);
    write('client/a', 'xy');
    write('client/b', 'z');
    const split = sumOf(root);
    write('client/a', 'x');
    write('client/b', 'yz');
    expect(sumOf(root)).not.toBe(split);
  });

  it('does not change with the server’s own files', () => {
    const before = sumOf(root);
    write('server/app.ts', 'changed');
    expect(sumOf(root)).toBe(before);
  });
});

describe('isBuilt', () => {
  it('asks for the built page and the same sum', () => {
    expect(isBuilt(root, 'abc')).toBe(false);
    write('.build/client.sum', 'abc');
    expect(isBuilt(root, 'abc')).toBe(false);
    write('.build/client/index.html', '<!doctype html>');
    expect(isBuilt(root, 'abc')).toBe(true);
    expect(isBuilt(root, 'abd')).toBe(false);
  });
});
