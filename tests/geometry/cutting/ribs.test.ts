import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Polyline, areaOf, at, between, boxOf } from '#geometry/cutting/arrays.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type RibSet } from '#geometry/cutting/ribs.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { crossingsByHand, distanceTo, farthest, fine } from './measuring.ts';
import { PLAN, RIBS, SLOT, TUBE, planWith, prismOf, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'ribs' };

function ribsOf(plan: Plan): RibSet {
  const { core } = planCore(plan, IDENTITY);
  if (!core?.ribs) throw new Error('no ribs');
  return core.ribs;
}
const codesOf = (plan: Plan) => planCore(plan, IDENTITY).findings.map(({ code, path }) => `${code} ${path}`);
const bare = { ...RIBS, lighteningHoles: null, jigTabs: null };

test('ribs of a prism without sheeting are the section', () => {
  const plan = planWith({ ...prismOf(section('2412'), 200), ribs: bare });
  const exact = fine(outlineOf(section('2412')), 200);
  const { ribs } = ribsOf(plan);
  expect(ribs).toHaveLength(8);
  for (const rib of ribs) {
    expect(rib.outlines).toHaveLength(1);
    expect(farthest(exact, rib.outlines[0]!)).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
    expect(farthest(rib.outlines[0]!, exact)).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
  }
});

test('a rib is the true ruled section at its larger face, inset by the sheeting', () => {
  const plan = planWith({ ribs: bare, features: [] });
  const { core } = planCore(plan, IDENTITY);
  const { ribs } = core!.ribs!;
  // The root is larger: outlines stand 1.5 mm nearer to it than the ribs' middles, the end ribs within the panel.
  expect(ribs.map(({ spanMm }) => Number(spanMm.toFixed(6)))).toEqual([
    0, 84.214286, 169.928571, 255.642857, 341.357143, 427.071429, 512.785714, 597,
  ]);
  const rib = ribs[3]!;
  const ruled = between(core!.core.panel.chain.root, core!.core.panel.chain.tip, rib.spanMm / 600);
  rib.outlines[0]!.x.forEach((x, i) => {
    expect(Math.abs(distanceTo(ruled, x, at(rib.outlines[0]!.y, i)) - 1)).toBeLessThanOrEqual(0.02);
  });
});

test('a list of stations is kept in order, and those beyond the span are named', () => {
  const stations = { kind: 'list' as const, mm: [300, 100, 700] };
  const plan = planWith({ ribs: { ...bare, stations } });
  expect(ribsOf(plan).ribs.map(({ spanMm }) => spanMm)).toEqual([98.5, 298.5]);
  expect(codesOf(plan)).toContain('rib-outside-panel ribs.stations.mm.2');
  const close = planWith({ ribs: { ...bare, stations: { kind: 'list', mm: [100, 101] } } });
  expect(codesOf(close)).toContain('ribs-too-close ribs.stations');
});

test('a notch has the spar’s width with the fit, runs from the sheeting line and takes its area away', () => {
  const without = ribsOf(planWith({ ribs: bare, features: [] })).ribs[4]!;
  const rib = ribsOf(planWith({ ribs: bare, features: [SLOT] })).ribs[4]!;
  const outline = rib.outlines[0]!;
  expect(crossingsByHand(outline)).toBe(0);
  const floor = floorOf(without.outlines[0]!, outline);
  expect(floor.maxX - floor.minX).toBeCloseTo(5.1, 6);
  // 5.1 mm wide and 2 mm deep at its middle, of a nearly level surface.
  expect(areaOf(without.outlines[0]!) - areaOf(outline)).toBeCloseTo(5.1 * 2, 1);
});

/** The level points of an outline that are not on another one. */
function floorOf(whole: Polyline, notched: Polyline) {
  const off = Array.from(notched.x.keys()).filter(
    (i) => distanceTo(whole, at(notched.x, i), at(notched.y, i)) > 0.5,
  );
  return boxOf({
    x: Float64Array.from(off, (i) => at(notched.x, i)),
    y: Float64Array.from(off, (i) => at(notched.y, i)),
  });
}

test('a spar notch and a tube hole lie on straight lines from rib to rib', () => {
  const { ribs } = ribsOf(planWith({ ribs: bare, features: [SLOT, TUBE] }));
  const centres = ribs.map(({ tubes, spanMm }) => {
    const box = boxOf(tubes[0]!);
    expect(box.maxY - box.minY).toBeCloseTo(6.1, 2);
    return { spanMm, x: (box.minX + box.maxX) / 2, y: (box.minY + box.maxY) / 2 };
  });
  const [first, last] = [centres[0]!, centres.at(-1)!];
  for (const { spanMm, x, y } of centres) {
    const share = (spanMm - first.spanMm) / (last.spanMm - first.spanMm);
    expect(x).toBeCloseTo(first.x + share * (last.x - first.x), 6);
    expect(y).toBeCloseTo(first.y + share * (last.y - first.y), 6);
  }
});

test('lightening holes keep the web to the outline, to the tube and to one another', () => {
  const { ribs } = ribsOf(planWith({ ribs: RIBS }));
  expect(ribs.some(({ holes }) => holes.length > 1)).toBe(true);
  for (const { outlines, holes, tubes } of ribs) {
    holes.forEach(({ x, y, radius }, i) => {
      expect(2 * radius).toBeGreaterThanOrEqual(5);
      expect(distanceTo(outlines[0]!, x, y) - radius).toBeGreaterThanOrEqual(4 - 1e-9);
      expect(distanceTo(tubes[0]!, x, y) - radius).toBeGreaterThanOrEqual(4 - 1e-9);
      for (const other of holes.slice(0, i)) {
        expect(Math.hypot(x - other.x, y - other.y) - radius - other.radius).toBeGreaterThanOrEqual(4 - 1e-9);
      }
    });
  }
});

test('jig tabs end on one board below the lowest rib, with a level line and the hidden surface engraved', () => {
  const plan = planWith({ ribs: RIBS, features: [] });
  const { ribs, boardY } = ribsOf(plan);
  const withoutTabs = ribsOf(planWith({ ribs: bare, features: [] })).ribs;
  const lowest = Math.min(...withoutTabs.map(({ outlines }) => boxOf(outlines[0]!).minY));
  expect(boardY).toBeCloseTo(lowest - 6, 9);
  for (const rib of ribs) {
    const outline = rib.outlines[0]!;
    const onBoard = Array.from(outline.y).filter((y) => y === boardY);
    expect(onBoard).toHaveLength(4);
    expect(crossingsByHand(outline)).toBe(0);
    // The level line, the surface hidden by each tab, and one stroke of the number's single digit.
    expect(rib.engraved).toHaveLength(4);
    const [level, ...hidden] = rib.engraved.slice(0, -1);
    expect(level!.y[0]).toBe(level!.y[1]);
    for (const line of hidden) {
      line.x.forEach((x, i) =>
        expect(distanceTo(withoutTabs[rib.number - 1]!.outlines[0]!, x, at(line.y, i))).toBeLessThan(1e-9),
      );
    }
  }
});

test('a tab in a notch or beside the rib is a finding', () => {
  const lower = { ...SLOT, surface: 'lower' as const, rootStation: 0.65, tipStation: 0.65 };
  expect(codesOf(planWith({ ribs: RIBS, features: [lower] }))).toContain(
    'tab-meets-notch ribs.jigTabs.stations.1',
  );
  const off = { ...RIBS, jigTabs: { ...RIBS.jigTabs!, stations: [0.15, 1] as [number, number] } };
  expect(codesOf(planWith({ ribs: off }))).toContain('tab-outside-rib ribs.jigTabs.stations.1');
});

test('a strip through both surfaces divides the rib', () => {
  const strip = { kind: 'strip' as const, name: 'Web', rootStation: 0.3, tipStation: 0.3, widthMm: 3 };
  const whole = ribsOf(planWith({ ribs: bare, features: [] })).ribs[2]!;
  const rib = ribsOf(planWith({ ribs: bare, features: [strip] })).ribs[2]!;
  expect(rib.outlines).toHaveLength(2);
  const [fore, aft] = rib.outlines.map((of) => boxOf(of));
  expect(aft!.minX - fore!.maxX).toBeCloseTo(3.1, 9);
  expect(whole.areaMm2 - rib.areaMm2).toBeGreaterThan(3.1 * 15);
});

test('the number is engraved inside the rib, clear of holes and tubes, and shrinks where there is no room', () => {
  for (const numberHeightMm of [3, 25]) {
    const plan = planWith({ ribs: { ...RIBS, jigTabs: null, numberHeightMm } });
    for (const { label, outlines, holes, tubes, engraved } of ribsOf(plan).ribs) {
      expect(engraved).toHaveLength(1);
      const [stroke] = engraved;
      const box = boxOf(stroke!);
      expect(box.maxY - box.minY).toBeCloseTo(0.9 * label.heightMm, 9);
      stroke!.x.forEach((x, i) => {
        const y = at(stroke!.y, i);
        // Half the stroke's thickness stays on its outside.
        const clear = label.heightMm / 20 - 1e-9;
        for (const line of [outlines[0]!, tubes[0]!]) expect(distanceTo(line, x, y)).toBeGreaterThan(clear);
        for (const hole of holes)
          expect(Math.hypot(x - hole.x, y - hole.y) - hole.radius).toBeGreaterThan(clear);
      });
    }
  }
  expect(codesOf(planWith({ ribs: { ...RIBS, numberHeightMm: 25 } }))).toContain(
    'number-smaller ribs.numberHeightMm',
  );
});

test('a rib too small for a number says so instead of cutting through it', () => {
  const tiny = planWith({ ...prismOf(section('0004'), 20), ribs: { ...bare, numberHeightMm: 2 } });
  expect(codesOf(tiny)).toContain('number-without-room ribs.numberHeightMm');
  for (const { engraved } of ribsOf(tiny).ribs) expect(engraved).toEqual([]);
});

test('sheeting that fills a rib, and a rib larger than the sheet', () => {
  const small = { ...RIBS.sheet, widthMm: 150, heightMm: 100 };
  const plan = planWith({ ribs: { ...bare, sheet: small } });
  expect(codesOf(plan)).toContain('rib-larger-than-sheet ribs.sheet.widthMm');
  expect(ribsOf(plan).layout.tooLarge).toContain(1);
});

test('ribs on the sheets neither overlap nor leave them, and the yield is their area over the sheets’', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 30 }), fc.integer({ min: 240, max: 700 }), (count, heightMm) => {
      const sheet = { ...RIBS.sheet, heightMm };
      const { ribs, layout } = ribsOf(
        planWith({ ribs: { ...RIBS, stations: { kind: 'count', count }, sheet } }),
      );
      expect(layout.places).toHaveLength(ribs.length);
      const boxes = layout.places.map(({ number, turned, dx, dy, sheet: index }) => {
        const { minX, maxX, minY, maxY } = boxOf(...ribs[number - 1]!.outlines);
        return turned
          ? { index, minX: dx - maxY, maxX: dx - minY, minY: dy + minX, maxY: dy + maxX }
          : { index, minX: dx + minX, maxX: dx + maxX, minY: dy + minY, maxY: dy + maxY };
      });
      boxes.forEach((a, i) => {
        expect(Math.min(a.minX, a.minY)).toBeGreaterThanOrEqual(5 - 1e-9);
        expect(a.maxX).toBeLessThanOrEqual(595 + 1e-9);
        expect(a.maxY).toBeLessThanOrEqual(heightMm - 5 + 1e-9);
        for (const b of boxes.slice(0, i)) {
          const apart = Math.max(a.minX - b.maxX, b.minX - a.maxX, a.minY - b.maxY, b.minY - a.maxY);
          if (a.index === b.index) expect(apart).toBeGreaterThanOrEqual(3 - 1e-9);
        }
      });
      const area = ribs.reduce((sum, { areaMm2 }) => sum + areaMm2, 0);
      expect(layout.yield).toBeCloseTo(area / (layout.sheets * 600 * heightMm), 12);
    }),
    { numRuns: 5 },
  );
}, 60_000);

test('the same plan gives the same ribs in the same places', () => {
  const plan = planWith({ ribs: RIBS });
  expect(ribsOf(plan)).toEqual(ribsOf(plan));
});
