import { expect, test } from 'vitest';
import { areaOf, boxOf, polylineOf } from '#geometry/cutting/arrays.ts';
import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { type CorePlan } from '#geometry/cutting/planner.ts';
import { RIBS, planWith } from '../plans.ts';
import { type ReadDxf, SHEET, WHOLE, planned, readDxf } from './sheet-example.ts';

const whole = planned(WHOLE);
const thirty = planned(
  planWith({
    ribs: {
      ...RIBS,
      stations: { kind: 'count', count: 30 },
      sheet: { ...RIBS.sheet, widthMm: 500, heightMm: 250 },
    },
  }),
);

const ribFiles = (core: CorePlan) => cutFiles(core, SHEET).filter(({ part }) => part === 'ribs');
const sheetsOf = (core: CorePlan) => ribFiles(core).map(({ text }) => readDxf(text));
const boxes = (dxf: ReadDxf, layer: string) =>
  dxf.on(layer).flatMap(({ vertices, center, radius }) => {
    if (vertices) return [boxOf(polylineOf(vertices))];
    if (!center || radius === undefined) return [];
    const { x, y } = center;
    return [{ minX: x - radius, maxX: x + radius, minY: y - radius, maxY: y + radius }];
  });

test('layers, unit and the sheet’s border', () => {
  const [dxf] = sheetsOf(whole);
  expect(dxf!.layers).toEqual(['0', 'CUT', 'ENGRAVE', 'REFERENCE', 'TEXT']);
  expect(dxf!.header).toMatchObject({ $INSUNITS: 4, $EXTMAX: { x: 600, y: 300 } });
  expect(dxf!.on('REFERENCE')).toHaveLength(1);
  expect(boxes(dxf!, 'REFERENCE')).toEqual([{ minX: 0, maxX: 600, minY: 0, maxY: 300 }]);
});

test('thirty ribs are all there, each on one sheet, inside its border', () => {
  const files = ribFiles(thirty);
  expect(files.length).toBe(thirty.ribs!.layout.sheets);
  expect(files.length).toBeGreaterThan(1);
  expect(files.map(({ name }) => name)).toEqual(files.map((_, i) => `ribs-${i + 1}.dxf`));
  const numbers = files.flatMap(({ facts }) => (facts.kind === 'ribs' ? facts.numbers : []));
  expect(numbers.toSorted((a, b) => a - b)).toEqual(Array.from({ length: 30 }, (_, i) => i + 1));
  for (const dxf of sheetsOf(thirty)) {
    for (const { minX, maxX, minY, maxY } of [...boxes(dxf, 'CUT'), ...boxes(dxf, 'ENGRAVE')]) {
      expect(Math.min(minX, minY)).toBeGreaterThanOrEqual(5 - 1e-4);
      expect(maxX).toBeLessThanOrEqual(495 + 1e-4);
      expect(maxY).toBeLessThanOrEqual(245 + 1e-4);
    }
  }
});

test('edges less holes have the ribs’ area, so turned ribs are neither mirrored nor stretched', () => {
  for (const core of [whole, thirty]) {
    expect(core.ribs!.layout.places.some(({ turned }) => turned)).toBe(true);
    let area = 0;
    for (const dxf of sheetsOf(core)) {
      const cut = dxf.on('CUT');
      const edges = cut.filter(({ vertices }) => vertices && areaOf(polylineOf(vertices)) > 100);
      const tubes = cut.filter(({ vertices }) => vertices && Math.abs(areaOf(polylineOf(vertices))) <= 100);
      for (const { shape } of [...edges, ...tubes]) expect(shape).toBe(true);
      for (const { vertices } of edges) area += areaOf(polylineOf(vertices!));
      for (const { vertices } of tubes) area -= Math.abs(areaOf(polylineOf(vertices!)));
      for (const { radius } of cut.filter(({ type }) => type === 'CIRCLE')) area -= Math.PI * radius! ** 2;
    }
    const wanted = core.ribs!.ribs.reduce((sum, { areaMm2 }) => sum + areaMm2, 0);
    expect(Math.abs(area - wanted)).toBeLessThan(0.05);
  }
});

test('holes are circles of the rib’s radii, and come before the edge that frees the rib', () => {
  const [dxf] = sheetsOf(whole);
  const radii = whole.ribs!.ribs.flatMap(({ holes }) => holes.map(({ radius }) => radius));
  const circles = dxf!.on('CUT').filter(({ type }) => type === 'CIRCLE');
  const sorted = (of: readonly number[]) => of.toSorted((a, b) => a - b);
  sorted(circles.map(({ radius }) => radius!)).forEach((radius, i) =>
    expect(Math.abs(radius - sorted(radii)[i]!)).toBeLessThanOrEqual(1e-5),
  );
  expect(circles).toHaveLength(radii.length);
  const order = dxf!
    .on('CUT')
    .map(({ type, vertices }) =>
      type === 'CIRCLE' || Math.abs(areaOf(polylineOf(vertices!))) <= 100 ? 'hole' : 'edge',
    );
  order.forEach((kind, i) => {
    const { number } = whole.ribs!.layout.places[order.slice(0, i).filter((of) => of === 'edge').length]!;
    const { holes, tubes } = whole.ribs!.ribs[number - 1]!;
    if (kind === 'edge') expect(order.slice(i - holes.length - tubes.length, i)).not.toContain('edge');
  });
  expect(order.at(-1)).toBe('edge');
});

test('every engraved line has two points or more, and numbers are among them', () => {
  for (const core of [whole, thirty]) {
    const lines = sheetsOf(core).flatMap((dxf) => dxf.on('ENGRAVE'));
    for (const { vertices, shape } of lines) {
      expect(vertices!.length).toBeGreaterThan(1);
      expect(shape).toBe(false);
    }
    const wanted = core.ribs!.ribs.flatMap(({ engraved }) => engraved.filter(({ x }) => x.length > 1));
    expect(lines).toHaveLength(wanted.length);
  }
});

test('says which ribs, which sheet, which material, and where each rib stands', () => {
  const [file] = ribFiles(whole);
  const texts = readDxf(file!.text)
    .on('TEXT')
    .map(({ text }) => text);
  expect(texts).toEqual([
    'Reed wing v3, released',
    'Part: ribs 1, 2, 3, 4, 5, 6, 7, 8, sheet 1 of 1, unit mm',
    'Chords: root 220 mm, tip 160 mm; material 3 mm of Poplar plywood',
    'Sheet checksum 3f2a9c81b0de, code 7WN9-S0DG',
    'CUT is the finished edge: the width of the cut is not in it',
    'Caution: ventilate, wear eye protection, never leave a laser alone',
  ]);
  expect(file!.text).toContain('Rib 8: outline at 597 mm from the root face');
});

test('ribs that no sheet holds are in no file', () => {
  const core = planned(
    planWith({ ribs: { ...RIBS, sheet: { ...RIBS.sheet, widthMm: 190, heightMm: 100 } } }),
  );
  const { tooLarge } = core.ribs!.layout;
  expect(tooLarge.length).toBeGreaterThan(0);
  const numbers = ribFiles(core).flatMap(({ facts }) => (facts.kind === 'ribs' ? facts.numbers : []));
  expect([...numbers, ...tooLarge].toSorted((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
});
