import { expect, test } from 'vitest';
import { at, boxOf, polylineOf } from '#geometry/cutting/arrays.ts';
import { toBlock, toMachine } from '#geometry/cutting/block.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { PLAN, planWith, prismOf, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const planned = (plan: Plan) => {
  const { core, findings } = planCore(plan, IDENTITY);
  return { core: core!, findings: findings.map(({ code, path }) => `${code} ${path}`) };
};

test('tilt raises the leading edge about the root’s leading edge', () => {
  const line = toBlock(
    { xMm: 10, yMm: 20, tiltDeg: 90 },
    polylineOf([
      { x: 0, y: 0 },
      { x: 5, y: 0 },
    ]),
  );
  expect(at(line.x, 1)).toBeCloseTo(10, 12);
  expect(at(line.y, 1)).toBeCloseTo(15, 12);
});

test('the trailing edge points to the origin or away from it', () => {
  const line = polylineOf([
    { x: 0, y: 1 },
    { x: 260, y: 1 },
  ]);
  expect(Array.from(toMachine(PLAN.machine, PLAN.block, line).x)).toEqual([320, 60]);
  const away = { ...PLAN.machine, trailingEdge: 'far' as const };
  expect(Array.from(toMachine(away, PLAN.block, line).x)).toEqual([60, 320]);
});

test('a core without a place stands in the middle; the margin counts from the kerf', () => {
  const { core } = planned(planWith({ features: [] }));
  const [place] = core.fit!.places;
  const boxes = [core.core.root.path, core.core.tip.path].map((of) => boxOf(toBlock(place!, of)));
  const lowest = Math.min(...boxes.map(({ minY }) => minY)) - 0.4;
  const highest = Math.max(...boxes.map(({ maxY }) => maxY)) + 0.4;
  expect(lowest).toBeCloseTo(60 - highest, 9);
  expect(Math.min(core.fit!.marginMm.root, core.fit!.marginMm.tip)).toBeCloseTo(
    Math.min(lowest, ...boxes.map(({ minX, maxX }) => Math.min(minX, 260 - maxX) - 0.4)),
    9,
  );
});

test('a tip larger than the block, a core beside it and a small margin are findings with their field', () => {
  const large = planned(planWith({ panel: { tip: { shape: section('2412'), chordMm: 300 } } }));
  expect(large.findings).toContain('larger-than-block block.lengthMm');
  expect(planned(planWith({ block: { heightMm: 20 } })).findings).toContain(
    'larger-than-block block.heightMm',
  );
  expect(planned(planWith({ block: { coreXMm: -20 } })).findings).toContain('outside-block block.coreXMm');
  expect(planned(planWith({ block: { coreYMm: 12 } })).findings).toContain('margin-too-small block.coreYMm');
  expect(planned(planWith({ block: { spanMm: 500 } })).findings).toContain('block-too-short block.spanMm');
});

test('a mirrored pair is stacked with the margin between both cores, and its simulated cut agrees', () => {
  const { core, findings } = planned(planWith({ block: { pair: true, heightMm: 90 } }));
  expect(findings.filter((of) => !of.startsWith('skins-meet'))).toEqual([]);
  const [first, second] = core.fit!.places;
  expect(second).toMatchObject({ mirrored: true, xMm: first!.xMm });
  // At the face with the first core's root stands the second core's tip, and the other way round.
  for (const [own, other] of [
    ['root', 'tip'],
    ['tip', 'root'],
  ] as const) {
    const below = boxOf(toBlock(first!, core.core[own].path)).maxY + 0.4;
    const above = boxOf(toBlock(second!, core.core[other].path)).minY - 0.4;
    expect(above - below).toBeGreaterThanOrEqual(5 - 1e-9);
  }
  expect(core.cut!.simulation.deviations).toHaveLength(14);
});

test('a pair that does not fit is a finding, and one core is planned', () => {
  const { core, findings } = planned(planWith({ block: { pair: true } }));
  expect(findings).toContain('pair-does-not-fit block.pair');
  expect(core.fit!.places).toHaveLength(1);
});

test('masses come from volumes and density; features are taken off', () => {
  const bare = planned(prismOf(section('0012'), 200)).core.foam!;
  // Area of the closed 0012 at 200 mm: 3268.24 mm².
  expect(bare.coreVolumeMm3 / (3268.24 * 600)).toBeCloseTo(1, 3);
  expect(bare.coreMassG).toBeCloseTo((bare.coreVolumeMm3 / 1e9) * 20 * 1000, 9);
  expect(bare.blockMassG).toBeCloseTo(0.26 * 0.06 * 0.6 * 20 * 1000, 9);
  const without = planned(planWith({ features: [] })).core.foam!.coreVolumeMm3;
  const slotted = planned(planWith({ features: PLAN.features.slice(1) })).core.foam!.coreVolumeMm3;
  expect(without - slotted).toBeCloseTo(5 * 2 * 600, -2);
});
