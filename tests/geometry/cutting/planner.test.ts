import fc from 'fast-check';
import { expect, test } from 'vitest';
import { ENDS } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { shapes } from '#tests/geometry/shapes/samples.ts';
import { crossingsByHand } from './measuring.ts';
import { PLAN, RIBS, TEMPLATE, plans, planWith } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };

test('the tapered panel of the shop: notes alone, and a cut that agrees', () => {
  const { core, findings } = planCore(PLAN, IDENTITY);
  expect(findings.map(({ severity, code, at }) => [severity, code, at?.end])).toEqual([
    ['note', 'skins-meet', 'root'],
    ['note', 'skins-meet', 'tip'],
  ]);
  const [root, tip] = core!.core.skinsMeet;
  // Two skins of 1 mm, the slopes of the surfaces within 1 %: the section is 2 mm thick where they meet.
  for (const meeting of [root!, tip!]) expect(meeting.thicknessMm).toBeCloseTo(2, 1);
  expect(tip!.station).toBeLessThan(root!.station);
});

test('random plans: in step, no crossing, the simulator agrees', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const { core, findings } = planCore(plan, IDENTITY);
      expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
      const { panel, root, tip } = core!.core;
      for (const line of [root.core, root.path, tip.core, tip.path]) {
        expect(line.x).toHaveLength(panel.chain.station.length);
        expect(line.y).toHaveLength(panel.chain.station.length);
        expect([...line.x, ...line.y].every(Number.isFinite)).toBe(true);
        expect(crossingsByHand(line)).toBe(0);
      }
      const { path, simulation } = core!.cut!;
      expect(path.left.x).toHaveLength(path.right.x.length);
      expect(simulation.deviations).toHaveLength(7);
      expect(simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
    }),
    { numRuns: 20 },
  );
}, 120_000);

test('the same plan gives the same program, byte for byte, and the same findings', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const [one, two] = [planCore(plan, IDENTITY), planCore(structuredClone(plan), IDENTITY)];
      expect(two.core!.cut!.program.text).toBe(one.core!.cut!.program.text);
      expect(two.findings).toEqual(one.findings);
    }),
    { numRuns: 4 },
  );
}, 60_000);

test('any accepted shapes and sizes end in finite numbers or findings, never in an exception', () => {
  fc.assert(
    fc.property(
      shapes,
      shapes,
      fc.double({ min: 10, max: 4000, noNaN: true }),
      fc.double({ min: 10, max: 4000, noNaN: true }),
      fc.double({ min: 0, max: 20, noNaN: true }),
      fc.double({ min: 0, max: 6, noNaN: true }),
      (root, tip, rootChord, tipChord, skin, kerf) => {
        const plan = planWith({
          panel: { root: { shape: root, chordMm: rootChord }, tip: { shape: tip, chordMm: tipChord } },
          allowances: { upperMm: skin, lowerMm: skin / 2 },
          kerfMm: { root: kerf, tip: kerf / 3 },
          ribs: RIBS,
          template: TEMPLATE,
        });
        const { core, findings } = planCore(plan, IDENTITY);
        for (const { message, path } of findings) {
          expect(message).not.toMatch(/NaN|Infinity|undefined/);
          expect(path).not.toBe('');
        }
        if (!core) return;
        for (const end of ENDS) {
          expect([...core.core[end].path.x, ...core.core[end].core.y].every(Number.isFinite)).toBe(true);
        }
        expect(core.cut?.program.text ?? '').not.toMatch(/NaN|Infinity/);
      },
    ),
    { numRuns: 10 },
  );
}, 120_000);

test('bare foam that runs out to less than the least trailing edge is warned of', () => {
  const { findings } = planCore(planWith({ allowances: { upperMm: 0, lowerMm: 0 } }), IDENTITY);
  expect(findings.filter(({ code }) => code === 'thin-trailing-edge')).toHaveLength(2);
});

test('stock at both edges: cut square, and the simulated cut agrees', () => {
  const plan = planWith({ stock: { leadingEdgeStation: 0.05, trailingEdgeStation: 0.72 } });
  const { core, findings } = planCore(plan, IDENTITY);
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  expect(core!.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
});

test('unequal skins are scarfed behind the nose, and the simulated cut agrees', () => {
  const { core, findings } = planCore(planWith({ allowances: { upperMm: 0.4, lowerMm: 1.2 } }), IDENTITY);
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  expect(core!.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
});
