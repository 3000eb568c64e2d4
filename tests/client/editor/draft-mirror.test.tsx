import { beforeEach, describe, expect, it } from 'vitest';
import { chooseDraft, draftMirror } from '#client/sections/editor/draft-mirror.ts';
import { naca2412 } from './editor-driver.ts';

const input = { basedOn: 3, shape: naca2412, chordMm: 220 };
const other = { ...input, shape: { ...naca2412, maxThickness: 0.14 } };
const at = Date.parse('2026-11-03T10:00:00.000Z');
const server = { ...input, updatedAt: '2026-11-03T10:00:00.000Z' };

describe('draftMirror', () => {
  beforeEach(() => {
    localStorage.clear();
  });

  it('gives back what was written, for that person and section only', () => {
    draftMirror(localStorage, 'ines', 'heron').write(input, at);
    expect(draftMirror(localStorage, 'ines', 'heron').read()).toEqual({ ...input, at });
    expect(draftMirror(localStorage, 'oda', 'heron').read()).toBeNull();
    expect(draftMirror(localStorage, 'ines', 'teal').read()).toBeNull();
    draftMirror(localStorage, 'ines', 'heron').clear();
    expect(draftMirror(localStorage, 'ines', 'heron').read()).toBeNull();
  });

  it('reads nothing from a damaged copy and survives a store that refuses', () => {
    localStorage.setItem('ribwright.draft.ines.heron', '{"basedOn":3,"shape":{"kind":"naca4"}}');
    expect(draftMirror(localStorage, 'ines', 'heron').read()).toBeNull();
    localStorage.setItem('ribwright.draft.ines.heron', '{');
    expect(draftMirror(localStorage, 'ines', 'heron').read()).toBeNull();
    const full = {
      getItem: () => null,
      setItem: () => {
        throw new DOMException('full', 'QuotaExceededError');
      },
      removeItem: () => undefined,
    };
    expect(() => draftMirror(full, 'ines', 'heron').write(input, at)).not.toThrow();
  });
});

describe('chooseDraft', () => {
  it('opens the only one there is', () => {
    expect(chooseDraft(null, null)).toEqual({ from: 'none', draft: null });
    expect(chooseDraft(server, null)).toEqual({ from: 'server', draft: input });
    expect(chooseDraft(null, { ...other, at })).toEqual({ from: 'browser', draft: other });
  });

  it('opens the newer of two, and the server’s where both are the same', () => {
    expect(chooseDraft(server, { ...other, at: at + 1 }).from).toBe('browser');
    expect(chooseDraft(server, { ...other, at: at - 1 })).toEqual({ from: 'server', draft: input });
    expect(chooseDraft(server, { ...input, at: at + 1 }).from).toBe('server');
  });
});
