import fc from 'fast-check';
import { parseStringSync } from 'gcode-parser';
import { expect, test } from 'vitest';
import { at } from '#geometry/cutting/arrays.ts';
import { type Controller, type Plan, planSchema } from '#geometry/cutting/plan.ts';
import { type CorePlan, planCore } from '#geometry/cutting/planner.ts';
import { benchOf, toTowers } from '#geometry/cutting/towers.ts';
import { PLAN, planWith } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 3, checksum: '3f2a9c81b0de5577a1c0', part: 'core' };
const withController = (changes: Partial<Controller>) =>
  planWith({ machine: { controller: { ...PLAN.machine.controller, ...changes } } });
const cutOf = (plan: Plan, identity = IDENTITY) => {
  const core: CorePlan = planCore(plan, identity).core!;
  return core.cut!;
};
const wordsOf = (text: string) =>
  parseStringSync(text).map(({ words }) => Object.fromEntries(words.filter(([letter]) => letter !== 'G')));
const codesOf = (text: string) =>
  parseStringSync(text).flatMap(({ words }) =>
    words.filter(([letter]) => letter === 'G').map(([, value]) => value),
  );

test('an independent reader finds every node of the path at its coordinates', () => {
  const plan = withController({ decimals: 4 });
  const { program, path } = cutOf(plan);
  const towers = toTowers(benchOf(plan), path.left, path.right);
  const parsed = wordsOf(program.text.trimEnd());
  program.lineOfNode.forEach((line, i) => {
    if (line === 0) return;
    const words = parsed[line - 1]!;
    expect(Math.abs(words['X']! - at(towers.left.x, i))).toBeLessThanOrEqual(0.5001e-4);
    expect(Math.abs(words['Y']! - at(towers.left.y, i))).toBeLessThanOrEqual(0.5001e-4);
    expect(Math.abs(words['U']! - at(towers.right.x, i))).toBeLessThanOrEqual(0.5001e-4);
    expect(Math.abs(words['V']! - at(towers.right.y, i))).toBeLessThanOrEqual(0.5001e-4);
    expect(words['F']).toBeGreaterThan(0);
  });
});

test('it says millimetres, absolute and inverse time, and goes back to G94 at the end', () => {
  const { program } = cutOf(PLAN);
  const codes = codesOf(program.text);
  expect(codes.slice(0, 3)).toEqual([21, 90, 93]);
  expect(codes.filter((code) => code !== 1)).toEqual([21, 90, 93, 4, 94]);
  const lines = program.text.trimEnd().split('\n');
  expect(lines.slice(-2)).toEqual([expect.stringMatching(/^N\d+ M5$/), expect.stringMatching(/^N\d+ M2$/)]);
  expect(lines.filter((line) => line.includes('G1 ')).every((line) => / F\d/.test(line))).toBe(true);
});

test.each([
  [[], ['M2']],
  [['M5 (M2 follows)'], ['M5 (M2 follows)', 'M2']],
  [['M30'], ['M30']],
  [
    ['M5', 'M02 (end)'],
    ['M5', 'M02 (end)'],
  ],
])('the footer %j makes it end in %j', (footer, end) => {
  const machine = {
    ...PLAN.machine,
    controller: { ...PLAN.machine.controller, footer, lineNumbers: false },
  };
  const lines = cutOf(planWith({ machine })).program.text.trimEnd().split('\n');
  expect(lines.slice(lines.indexOf('G94') + 1)).toEqual(end);
});

test('5 mm at 200 mm/min under G93: F40 per minute, F0.666667 per second, F1.5 as time', () => {
  const prism = {
    panel: { ...PLAN.panel, tip: PLAN.panel.root, sweepMm: 0, washoutDeg: 0, verticalOffsetMm: 0 },
    material: { ...PLAN.material, feedMmMin: 200 },
  };
  const wanted = {
    'per-minute': (s: number) => 60 / s,
    'per-second': (s: number) => 1 / s,
    seconds: (s: number) => s,
  };
  expect(wanted['per-minute'](1.5)).toBeCloseTo(40, 12);
  for (const inverseTime of ['per-minute', 'per-second', 'seconds'] as const) {
    const plan = planSchema.parse({ ...withController({ inverseTime }), ...prism });
    const { program, path } = cutOf(plan);
    const parsed = wordsOf(program.text.trimEnd());
    program.lineOfNode.forEach((line, i) => {
      if (line === 0 || path.nodes[i]!.kind !== 'cut') return;
      const [a, b] = [parsed[line - 2]!, parsed[line - 1]!];
      if (a['X'] === undefined) return;
      // A prism: towers and faces move alike. 60 s for each 200 mm.
      const seconds = (Math.hypot(b['X']! - a['X'], b['Y']! - a['Y']!) / 200) * 60;
      expect(Math.abs(b['F']! - wanted[inverseTime](seconds))).toBeLessThanOrEqual(1.1e-6 + 1e-9 * b['F']!);
    });
  }
});

test('G94 gives F over the left tower or over all axes, and takes as long', () => {
  const inverse = cutOf(PLAN);
  for (const feedOver of ['left-tower', 'all-axes'] as const) {
    const cut = cutOf(withController({ timeMode: 'feed-per-minute', feedOver }));
    expect(codesOf(cut.program.text)[2]).toBe(94);
    expect(cut.simulation.totalSeconds).toBeCloseTo(inverse.simulation.totalSeconds, 1);
    expect(cut.simulation.findings).toEqual([]);
  }
});

test('axis letters, decimals and line numbers are those of the controller', () => {
  const axes = { leftX: 'X', leftY: 'Y', rightX: 'A', rightY: 'Z' } as const;
  const { program, simulation } = cutOf(withController({ axes, decimals: 3, lineNumbers: false }));
  const moves = program.text.split('\n').filter((line) => line.startsWith('G1 '));
  expect(moves.length).toBeGreaterThan(100);
  for (const move of moves)
    expect(move).toMatch(/^G1 X-?\d+\.\d{3} Y-?\d+\.\d{3} A-?\d+\.\d{3} Z-?\d+\.\d{3} F\d+\.\d+$/);
  expect(program.text).not.toMatch(/^N/m);
  expect(simulation.findings).toEqual([]);
});

test('comments name sheet, version, checksum, origin and direction', () => {
  const { text } = cutOf(PLAN).program;
  expect(text).toContain('(Sheet: Reed wing v3)');
  expect(text).toContain('(Checksum: 3f2a9c81b0de)');
  expect(text).toContain('(Origin: both towers at zero, unit mm)');
  expect(text).toContain('(Direction: root left, trailing edge toward the origin)');
  expect(text).toContain('(Order: upper surface first, round)');
});

test('no name can end a comment, begin a line or carry a code', () => {
  const nasty = fc.oneof(
    fc.string({ unit: 'binary', maxLength: 60 }),
    fc.constantFrom(
      ') G0 X999 (',
      'a\nG0 X999',
      'b\r\nM30',
      '; G28',
      '(MSG, hi)',
      'x\u2028G1 X5',
      '%',
      'ﬁn（G0）',
    ),
  );
  const plain = cutOf(PLAN).program.text;
  const codeOf = (text: string) => text.split('\n').filter((line) => !line.startsWith('('));
  const withName = (sheetName: string, name: string) => {
    const plan = planWith({
      features: [{ ...PLAN.features[0]!, name: name.slice(0, 60) }, PLAN.features[1]!],
    });
    return cutOf(plan, { ...IDENTITY, sheetName, checksum: name, part: sheetName }).program.text;
  };
  fc.assert(
    fc.property(nasty, nasty, (sheetName, name) => {
      const text = withName(sheetName, name);
      expect(codeOf(text).join('\n')).toBe(codeOf(plain).join('\n'));
      const whole = /^(\([A-Za-z0-9 .,:/+-]*\)|N\d+ [A-Z0-9 .-]+( \(wire on\))?|)$/;
      expect(text.split('\n').filter((line) => !whole.test(line))).toEqual([]);
    }),
    { numRuns: 10 },
  );
  const wordsIn = (text: string) => parseStringSync(text).map(({ words }) => words);
  expect(wordsIn(withName(') G0 X999 (', 'b\r\nM30'))).toEqual(wordsIn(plain));
}, 60_000);

test('a moment on the wire: it warms up once before it goes in, in the unit of the controller', () => {
  expect(cutOf(PLAN).program.text.match(/G4 P3\.000/g)).toHaveLength(1);
  expect(cutOf(withController({ dwellUnit: 'milliseconds' })).program.text).toContain('G4 P3000.000');
});
