import { expect, test } from 'vitest';
import { singleLine } from '#geometry/formats/text.ts';
import { BAND_MM, templateBand } from '#geometry/pages/templates/template-band.ts';
import { PAPERS } from '#geometry/pages/templates/template-pages.ts';
import { tilingOf } from '#geometry/pages/templates/tiles.ts';
import { faultsOf, wordsOf } from '../checking.ts';
import { DETAILS, HOSTILE_NAMES } from '../samples.ts';

const OUTLINE = [
  { x: 0, y: 0 },
  { x: 900, y: 10 },
  { x: 0, y: 120 },
];
const TILING = tilingOf({ minX: -10, maxX: 910, minY: -130, maxY: 10 }, { width: 268, height: 100 });

function band(width: number, name: string) {
  const words = singleLine(name);
  const content = {
    title: words,
    part: `Root template, ${words}`,
    status: words,
    lines: [words, words, words, words, words],
    shortCode: words,
    checksum: words,
    address: words,
    sheet: `Sheet 12 of 144`,
    tile: words,
  };
  const rect = { x: 10, y: 100, width, height: BAND_MM };
  const map = { tiling: TILING, tile: TILING.tiles[3]!, outline: OUTLINE };
  return { frame: rect, marks: templateBand(content, map, DETAILS, rect) };
}

test.each(HOSTILE_NAMES)('nothing overlaps and nothing leaves the foot: %s', (name) => {
  for (const { widthMm } of Object.values(PAPERS)) {
    const { frame, marks } = band(widthMm - 20, name);
    expect(faultsOf({ widthMm, heightMm: 200, frame, marks })).toEqual([]);
  }
});

test('scale bar, cautions and all tiles are there', () => {
  const { marks } = band(277, 'Marsh');
  const words = wordsOf(marks).join(' ');
  expect(words).toContain('100 mm');
  expect(words).toContain('Print at 100 %');
  expect(words).toContain('Hot wire');
  expect(words).toContain('Fumes');
  expect(words).toContain('crosses on crosses');
  const boxes = marks.filter((of) => of.kind === 'line' && of.closed && of.points.length === 4);
  // The band, each tile, and this tile once more.
  expect(boxes).toHaveLength(TILING.tiles.length + 2);
});
