import fc from 'fast-check';
import { parseStringSync } from 'gcode-parser';
import { expect, test } from 'vitest';
import { kerfFromEnds } from '#geometry/cutting/kerf.ts';
import { STRIP_WIDTHS_MM, planWireStrip } from '#geometry/cutting/test-strip.ts';
import { PLAN } from './plans.ts';

const STRIP = {
  machine: PLAN.machine,
  material: PLAN.material,
  block: { lengthMm: 120, heightMm: 100, spanMm: 600 },
  widthsMm: [...STRIP_WIDTHS_MM],
  kerfMm: 0.8,
  clearanceMm: 10,
  warmUpS: 3,
};
const codesOf = (changes: object) =>
  planWireStrip({ ...STRIP, ...changes }).findings.map(({ code, path }) => `${code} ${path}`);

test('four level cuts for three pieces, from the top downwards, both towers alike', () => {
  const { strip, findings } = planWireStrip(STRIP);
  expect(findings).toEqual([]);
  expect(strip!.pieces.map(({ commandedMm, topMm, bottomMm }) => [commandedMm, topMm, bottomMm])).toEqual([
    [10, 95, 85],
    [20, 85, 65],
    [40, 65, 25],
  ]);
  expect(strip!.pieces.map(({ expectedMm }) => Number(expectedMm.toFixed(9)))).toEqual([9.2, 19.2, 39.2]);
  const cuts = strip!.path.nodes.filter(({ kind }) => kind === 'cut');
  // The block stands on 20 mm.
  expect(cuts.map(({ left }) => left.y)).toEqual([115, 105, 85, 45]);
  for (const { left, right } of strip!.path.nodes) expect(left).toEqual(right);
});

test('an independent reader: between two cuts lie the commanded widths, at the material’s feed', () => {
  const { strip } = planWireStrip(STRIP);
  let at = { X: 0, Y: 0, U: 0, V: 0 };
  const levels: number[] = [];
  for (const { words } of parseStringSync(strip!.program.text)) {
    const read = Object.fromEntries(words.filter(([letter]) => 'XYUVF'.includes(letter)));
    if (read['X'] === undefined) continue;
    const next = { ...at, ...read };
    expect([next.U, next.V]).toEqual([next.X, next.Y]);
    // From 60 to 180 mm the foam stands.
    if (Math.min(at.X, next.X) < 180 && Math.max(at.X, next.X) > 60 && next.Y <= 120) {
      expect(next.Y).toBe(at.Y);
      const minutes = 1 / read['F']!;
      expect(Math.abs(next.X - at.X) / minutes).toBeLessThanOrEqual(240 + 1e-6);
      expect(Math.abs(next.X - at.X) / minutes).toBeCloseTo(240, 3);
      if (!levels.includes(next.Y)) levels.push(next.Y);
    }
    at = next;
  }
  expect(levels).toEqual([115, 105, 85, 45]);
  expect(at).toMatchObject({ X: 0, Y: 0 });
});

test('the simulated kerf leaves the expected pieces; another kerf would not', () => {
  const { strip } = planWireStrip(STRIP);
  expect(strip!.simulation.largestDeviationMm).toBeLessThan(1e-9);
  expect(strip!.simulation.deviations).toHaveLength(21);
  const widths = strip!.pieces.map(({ expectedMm }) => expectedMm);
  const { kerf } = kerfFromEnds(STRIP.widthsMm, widths, widths);
  expect(kerf!.kerfMm).toBeCloseTo(0.8, 9);
});

test('comments say what to measure, and the cautions', () => {
  const { text } = planWireStrip(STRIP).strip!.program;
  for (const line of [
    '(Pieces: 10, 20, 40 mm, from the top)',
    '(Kerf: commanded less measured width, at the left and the right end)',
    '(Material: EPS 20, 240 mm per min)',
    '(Caution: hot wire and styrene vapour, cut with ventilation)',
    '(Caution: dry run with a cold wire first, emergency stop in reach)',
  ])
    expect(text).toContain(line);
  for (const line of text.split('\n')) if (line.startsWith('(')) expect(line).toMatch(/\)$/);
});

test('random strips: clear of the foam while travelling, simulated as expected, the same bytes', () => {
  const strips = fc.record({
    widthsMm: fc.array(fc.double({ min: 8, max: 25, noNaN: true }), { minLength: 1, maxLength: 5 }),
    kerfMm: fc.double({ min: 0, max: 3, noNaN: true }),
    trailingEdge: fc.constantFrom('origin' as const, 'far' as const),
    lengthMm: fc.double({ min: 20, max: 300, noNaN: true }),
  });
  fc.assert(
    fc.property(strips, ({ widthsMm, kerfMm, trailingEdge, lengthMm }) => {
      const values = {
        ...STRIP,
        machine: { ...PLAN.machine, trailingEdge },
        widthsMm,
        kerfMm,
        block: { lengthMm, heightMm: 150, spanMm: 600 },
      };
      const { strip, findings } = planWireStrip(values);
      expect(findings).toEqual([]);
      expect(planWireStrip(values).strip!.program.text).toBe(strip!.program.text);
      // Decimals of the machine: half of 0.0001 mm in each axis.
      expect(strip!.simulation.largestDeviationMm).toBeLessThanOrEqual(1e-4);
      const { nodes } = strip!.path;
      nodes.slice(1).forEach((node, i) => {
        if (node.kind !== 'travel') return;
        const last = nodes[i]!;
        const [low, high] = [last.left.x, node.left.x].sort((a, b) => a - b);
        const crosses = low! < 60 + lengthMm && high! > 60;
        if (crosses) expect(Math.min(last.left.y, node.left.y)).toBeGreaterThanOrEqual(20 + 150 + 10);
      });
    }),
    { numRuns: 15 },
  );
});

test('values that can’t be are findings with their field', () => {
  expect(codesOf({ block: { ...STRIP.block, heightMm: 60 } })).toEqual(['larger-than-block block.heightMm']);
  expect(codesOf({ widthsMm: [4], kerfMm: 3.5 })).toEqual(['piece-too-thin widthsMm.0']);
  expect(codesOf({ machine: { ...PLAN.machine, towerDistanceMm: 300 } })).toEqual([
    'towers-too-close machine.towerDistanceMm',
  ]);
  expect(codesOf({ widthsMm: [] })).toEqual(['bad-value widthsMm']);
  expect(codesOf({ widthsMm: [10, 1000] })).toEqual(['bad-value widthsMm.1']);
  expect(codesOf({ machine: { ...PLAN.machine, blockXMm: 4 } })).toContain(
    'outside-travel machine.travelXMm',
  );
  expect(planWireStrip(null)).toMatchObject({ strip: null, findings: [{ severity: 'error' }] });
});
