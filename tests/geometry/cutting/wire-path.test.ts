import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Plan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { PLAN, planWith, plans } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const nodesOf = (plan: Plan) => planCore(plan, IDENTITY).core!.cut!.path.nodes;
const labelsOf = (plan: Plan) => nodesOf(plan).flatMap(({ label }) => label ?? []);

test('the order of the cut: in at the trailing edge, upper, round the nose, lower, features there and back', () => {
  expect(labelsOf(PLAN)).toEqual([
    'Travel to the trailing edge',
    'Lead in',
    'Upper surface',
    'Slot: Cap',
    'Lower surface',
    'Tube: Main tube',
    'Lead out',
  ]);
  const stations = nodesOf(PLAN).flatMap(({ station }) => station ?? []);
  const nose = stations.indexOf(Math.min(...stations));
  stations.slice(1, nose).forEach((station, i) => expect(station).toBeLessThanOrEqual(stations[i]!));
  stations
    .slice(nose + 1)
    .forEach((station, i) => expect(station).toBeGreaterThanOrEqual(stations[nose + i]!));
});

test('a slit comes back to the point where it left the contour', () => {
  const nodes = nodesOf(PLAN);
  for (const name of ['Slot: Cap', 'Tube: Main tube']) {
    const first = nodes.findIndex(({ label }) => label === name);
    const end = nodes.findIndex(({ kind }, i) => i > first && kind !== 'slit');
    expect(nodes[end - 1]!.left).toEqual(nodes[first - 1]!.left);
    expect(nodes[end - 1]!.right).toEqual(nodes[first - 1]!.right);
  }
});

test('two passes leave through the front at the nose and come back by the same slit', () => {
  const plan = planWith({ cut: { order: 'two-passes' } });
  expect(labelsOf(plan)).toContain('Out through the front');
  const nodes = nodesOf(plan);
  const out = nodes.findIndex(({ label }) => label === 'Out through the front');
  expect(nodes[out]!.left.x).toBe(60 + 260 + 10);
  expect(nodes[out]!.right.x).toBe(60 + 260 + 10);
  expect(nodes[out + 1]!.left).toEqual(nodes[out - 1]!.left);
  expect(nodes[out]!.left.y).toBe(nodes[out - 1]!.left.y);
});

test('the wire starts and ends at the origin and travels outside the block alone', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const nodes = nodesOf(plan);
      for (const node of [nodes[0]!, nodes.at(-1)!]) {
        expect([node.left, node.right]).toEqual([
          { x: 0, y: 0 },
          { x: 0, y: 0 },
        ]);
      }
      const { blockXMm, blockYMm } = plan.machine;
      const inside = ({ x, y }: { x: number; y: number }) =>
        x > blockXMm &&
        x < blockXMm + plan.block.lengthMm &&
        y > blockYMm &&
        y < blockYMm + plan.block.heightMm;
      nodes.forEach((node, i) => {
        if (node.kind !== 'travel' || i === 0) return;
        const last = nodes[i - 1]!;
        for (const side of ['left', 'right'] as const) {
          for (let share = 0; share <= 1; share += 0.05) {
            const [a, b] = [last[side], node[side]];
            expect(inside({ x: a.x + share * (b.x - a.x), y: a.y + share * (b.y - a.y) })).toBe(false);
          }
        }
      });
    }),
    { numRuns: 8 },
  );
});

test('the wire warms up once for each core, before it goes in', () => {
  const waits = (plan: Plan) => nodesOf(plan).flatMap(({ waitS }) => waitS ?? []);
  expect(waits(PLAN)).toEqual([3]);
  expect(waits(planWith({ block: { pair: true, heightMm: 90 } }))).toEqual([3, 3]);
});
