import { describe, expect, it } from 'vitest';
import { FIRST_SETTINGS, readSettings, writeSettings } from '#client/sections/editor/sheet-settings.ts';
import { KEPT } from '#client/sections/editor/state-places.ts';

describe('sheet settings', () => {
  it('come back as they were kept, without the ghost of one section', () => {
    const settings = { ...FIRST_SETTINGS, exaggeration: 4 as const, grid: true, station: 0.25, ghost: 2 };
    expect(readSettings(writeSettings(settings))).toEqual({ ...settings, ghost: null });
  });

  it('fall back where the kept text is missing, damaged or out of range', () => {
    for (const text of [null, '', '{', '[]', '{"station":2}', '{"exaggeration":3}']) {
      expect(readSettings(text)).toEqual(FIRST_SETTINGS);
    }
    expect(readSettings('{"grid":true}')).toEqual({ ...FIRST_SETTINGS, grid: true });
  });

  it('are kept in the browser, as the table of places says', () => {
    const kept = Object.keys(JSON.parse(writeSettings(FIRST_SETTINGS)) as object);
    expect(kept.every((key) => KEPT[key as keyof typeof KEPT] === 'browser')).toBe(true);
    expect(Object.keys(FIRST_SETTINGS).filter((key) => !kept.includes(key))).toEqual(['ghost']);
  });
});
