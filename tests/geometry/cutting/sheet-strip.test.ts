import { expect, test } from 'vitest';
import { areaOf, at, boxOf } from '#geometry/cutting/arrays.ts';
import { planSheetStrip } from '#geometry/cutting/sheet-strip.ts';

const STRIP = {
  kind: 'laser',
  machineName: 'Laser',
  materialName: 'Birch plywood 2 mm',
  sheet: { widthMm: 300, heightMm: 200 },
  widthsMm: [10, 20, 40],
};
const codesOf = (changes: object) =>
  planSheetStrip({ ...STRIP, ...changes }).findings.map(({ code, path }) => `${code} ${path}`);

test('squares of the commanded widths stand in the plate, farther apart than the widest kerf', () => {
  const { strip, findings } = planSheetStrip(STRIP);
  expect(findings).toEqual([]);
  const plate = boxOf(strip!.plate);
  expect([plate.minX, plate.minY]).toEqual([0, 0]);
  const boxes = strip!.squares.map(({ outline }) => boxOf(outline));
  boxes.forEach((box, i) => {
    expect([box.maxX - box.minX, box.maxY - box.minY]).toEqual([STRIP.widthsMm[i], STRIP.widthsMm[i]]);
    expect(areaOf(strip!.squares[i]!.outline)).toBe(STRIP.widthsMm[i]! ** 2);
    for (const room of [box.minX, box.minY, plate.maxX - box.maxX, plate.maxY - box.maxY])
      expect(room).toBeGreaterThanOrEqual(10);
    if (i > 0) expect(box.minX - boxes[i - 1]!.maxX).toBeGreaterThanOrEqual(10);
  });
});

test('each square’s width is engraved below it, inside the plate', () => {
  const { strip } = planSheetStrip({ ...STRIP, widthsMm: [3.25, 12.5] });
  // 3 . 2 5 and 1 2 . 5.
  expect(strip!.engraved).toHaveLength(8);
  const floor = boxOf(strip!.squares[0]!.outline).minY;
  for (const line of strip!.engraved) {
    const box = boxOf(line);
    expect(box.maxY).toBeLessThan(floor);
    expect(box.minY).toBeGreaterThan(0);
    expect(box.maxX).toBeLessThan(boxOf(strip!.plate).maxX);
  }
  const second = boxOf(strip!.squares[1]!.outline).minX;
  expect(boxOf(strip!.engraved[3]!).maxX).toBeLessThan(second);
});

test('the drawing engraves first and cuts the plate last; its layers are those it names', () => {
  const { entities, layers, extents, comments } = planSheetStrip(STRIP).strip!.document;
  const cuts = entities.filter(({ layer }) => layer === 'CUT');
  expect(entities.findIndex(({ layer }) => layer === 'CUT')).toBe(6);
  expect(cuts).toHaveLength(4);
  const last = cuts.at(-1)!;
  expect(last.kind === 'polyline' && last.closed && at(last.chain.x, 1)).toBe(extents.maxX);
  expect(new Set(entities.map(({ layer }) => layer))).toEqual(new Set(layers.map(({ name }) => name)));
  expect(comments.join('\n')).toMatch(/kerf is commanded less measured\nCaution: beam and fumes/);
  const router = planSheetStrip({ ...STRIP, kind: 'router' }).strip!.document;
  expect(router.comments.at(-1)).toMatch(/^Caution: rotating cutter/);
});

test('the same values give the same drawing', () => {
  expect(planSheetStrip(structuredClone(STRIP))).toEqual(planSheetStrip(STRIP));
});

test('a sheet too small and values that can’t be are findings with their field', () => {
  expect(codesOf({ sheet: { widthMm: 90, heightMm: 50 } })).toEqual([
    'strip-larger-than-sheet sheet.widthMm',
    'strip-larger-than-sheet sheet.heightMm',
  ]);
  expect(codesOf({ kind: 'saw' })).toEqual(['bad-value kind']);
  expect(codesOf({ widthsMm: [1] })).toEqual(['bad-value widthsMm.0']);
  expect(planSheetStrip(undefined).strip).toBeNull();
});
