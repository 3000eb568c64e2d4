import { expect, test } from 'vitest';
import { textBox } from '#geometry/pages/lettering.ts';
import { contentOf, drawTemplate, usedTiles } from '#geometry/pages/templates/template-drawing.ts';
import { isInside } from '#geometry/pages/templates/inside.ts';
import { tilingOf } from '#geometry/pages/templates/tiles.ts';
import { PLANS, planned } from '../samples.ts';

const { plan } = planned(PLANS['chord of 1200 mm']);
const template = plan.templates[0]!;
const tiling = tilingOf(contentOf(template), { width: 268, height: 136 });
const { toPanel } = plan.core.panel.root;
const chord = [toPanel({ x: 0, y: 0 }), toPanel({ x: 1, y: 0 })] as const;
const drawn = (of: typeof tiling) => drawTemplate(template, chord, of, ['ROOT 1200 mm, Reed', 'ROOT']);

test('tiles without anything of the template are left out, those it covers stay', () => {
  const used = usedTiles(template, tiling.tiles);
  expect(used.length).toBeLessThan(tiling.tiles.length);
  const { outline } = drawn(tiling);
  for (const tile of tiling.tiles) {
    const corner = outline.some(
      ({ x, y }) => x > tile.minX && x < tile.maxX && -y > tile.minY && -y < tile.maxY,
    );
    if (corner) expect(used).toContain(tile);
  }
});

test('crosses stand wholly in both tiles that they join', () => {
  const { lines } = drawn(tiling);
  const circles = lines.filter((of) => of.kind === 'circle').filter(({ ink }) => ink === 'graphite');
  const upright = tiling.columns - 1;
  expect(circles).toHaveLength(2 * (upright * tiling.rows + tiling.columns * (tiling.rows - 1)));
  for (const { centre, radiusMm } of circles) {
    const holding = tiling.tiles.filter(
      ({ minX, maxX, minY, maxY }) =>
        centre.x - 2 * radiusMm >= minX &&
        centre.x + 2 * radiusMm <= maxX &&
        -centre.y - 2 * radiusMm >= minY &&
        -centre.y + 2 * radiusMm <= maxY,
    );
    expect(holding.length).toBeGreaterThanOrEqual(2);
  }
});

test('each tile’s part says what it is, inside of the edge', () => {
  const { outline, texts } = drawn(tiling);
  const titles = texts.filter(({ text }) => text.startsWith('ROOT'));
  expect(titles.length).toBeGreaterThanOrEqual(8);
  for (const mark of titles) {
    const { x, y, width, height } = textBox(mark);
    for (const corner of [
      { x, y },
      { x: x + width, y },
      { x, y: y + height },
      { x: x + width, y: y + height },
    ])
      expect(isInside(corner, outline)).toBe(true);
  }
});

test('the outline is the template’s, point for point, and the pins have their size', () => {
  const { outline, lines } = drawn(tiling);
  expect(outline.map(({ x }) => x)).toEqual(Array.from(template.outline.x));
  expect(outline.map(({ y }) => -y)).toEqual(Array.from(template.outline.y));
  const pins = lines.filter((of) => of.kind === 'circle').filter(({ ink }) => ink === 'ink');
  expect(pins.map(({ centre }) => ({ x: centre.x, y: -centre.y }))).toEqual(template.pins);
  for (const { radiusMm } of pins) expect(2 * radiusMm).toBe(template.pinDiameterMm);
});
