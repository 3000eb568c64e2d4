import { describe, expect, test } from 'vitest';
import { type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import {
  coordinatesTitle,
  endLines,
  featureLines,
  ribLines,
  ribStationLines,
  sheetTitle,
} from '#geometry/cutting/files/words.ts';
import { SHEET, WHOLE, planned } from './sheet-example.ts';

const whole = planned(WHOLE);

test('a name that is empty or invisible gives way to what the thing is', () => {
  const nameless = { ...SHEET, sheetName: ' \u200b ', root: { ...SHEET.root, sectionName: '\n' } };
  expect(sheetTitle(nameless)).toBe('Cut sheet v3');
  expect(endLines(whole, nameless, 'root')[2]).toBe('Section v5, NACA 2412, checksum a1b2c3d4e5f6');
  const [tube] = whole.features;
  const unnamed = [{ ...tube!, feature: { ...tube!.feature, name: ' ' } }];
  expect(featureLines(unnamed)).toEqual(['SLOT 1: tube']);
  expect(featureLines(whole.features)).toEqual(['SLOT 1: tube, Main tube', 'SLOT 2: slot, Cap']);
});

describe('each line is one line, whatever its names are', () => {
  const broken = 'a\r\n  0\u2028b\tc';
  const end = { ...SHEET.root, sectionName: broken, designation: broken, checksum: broken };
  const identity: SheetIdentity = {
    ...SHEET,
    sheetName: broken,
    status: broken,
    checksum: broken,
    shortCode: broken,
    root: end,
    tip: end,
    machineName: broken,
    materialName: broken,
    ribMaterialName: broken,
  };
  const { ribs } = whole.ribs!;
  test.each([
    ['an end', endLines(whole, identity, 'tip')],
    ['ribs', ribLines(whole, identity, { number: 1, count: 1, ribs })],
    ['stations', ribStationLines(ribs)],
    ['coordinates', [coordinatesTitle(whole, identity, 'tip', 0.01)]],
    [
      'features',
      featureLines([{ ...whole.features[0]!, feature: { ...whole.features[0]!.feature, name: broken } }]),
    ],
  ])('%s', (_, lines) => {
    expect(lines.length).toBeGreaterThan(0);
    for (const line of lines) expect(line).toMatch(/^[\x21-\x7e][\x20-\x7e]*[\x21-\x7e]$/);
  });
});

test('lengths carry no needless decimals, checksums twelve digits', () => {
  expect(coordinatesTitle(whole, SHEET, 'root', 0.0125)).toBe(
    'Reed wing v3 root, released, Section Marsh v5, NACA 2412, checksum a1b2c3d4e5f6, chord 220 mm, unit mm, tolerance 0.0125 mm, Sheet checksum 3f2a9c81b0de, code 7WN9-S0DG',
  );
});
