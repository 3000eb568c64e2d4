import { expect, test } from 'vitest';
import { expectedCores } from '#geometry/cutting/expected-core.ts';
import { type WirePlan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { simulate } from '#geometry/cutting/simulate.ts';
import { PLAN, planWith, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const { core: WHOLE } = planCore(PLAN, IDENTITY);
const TEXT = WHOLE!.cut!.program.text;
const EXPECTED = expectedCores(PLAN, WHOLE!.core, WHOLE!.features, WHOLE!.fit!.places);
const run = (text: string, plan: WirePlan = PLAN) => simulate(text, plan, EXPECTED);
const edited = (find: RegExp, change: (line: string) => string) => {
  const lines = TEXT.split('\n');
  const index = lines.findIndex((line) => find.test(line));
  lines[index] = change(lines[index]!);
  return { text: lines.join('\n'), line: index + 1 };
};

test('the written program cuts the plan within 0.02 mm in seven planes', () => {
  const { deviations, findings, totalSeconds } = run(TEXT);
  expect(findings).toEqual([]);
  expect(deviations.map(({ share }) => Number(share.toFixed(4)))).toEqual([
    0, 0.1667, 0.3333, 0.5, 0.6667, 0.8333, 1,
  ]);
  for (const { deviationMm } of deviations) {
    expect(deviationMm).toBeLessThanOrEqual(0.02);
    // It is measured, not assumed: the polygon's own error shows.
    expect(deviationMm).toBeGreaterThan(1e-5);
  }
  expect(totalSeconds).toBeCloseTo(WHOLE!.cut!.program.totalSeconds, 2);
});

test('a point moved by 0.1 mm is found, with its line', () => {
  const path = WHOLE!.cut!;
  const node = path.path.nodes.findIndex(
    ({ station }) => station !== null && station > 0.55 && station < 0.7,
  );
  const number = path.program.lineOfNode[node]!;
  const lines = TEXT.split('\n');
  lines[number - 1] = lines[number - 1]!.replace(
    /Y(\S+)/,
    (_, y: string) => `Y${(Number(y) - 0.1).toFixed(4)}`,
  );
  const differs = run(lines.join('\n')).findings.filter(({ code }) => code === 'cut-differs');
  expect(differs.length).toBeGreaterThan(0);
  for (const { at } of differs) expect(Math.abs(at!.line! - number)).toBeLessThanOrEqual(1);
});

test('a kerf that the plan does not have, and a wire that never comes, differ', () => {
  const wider = planWith({ kerfMm: { root: 1, tip: 1 } });
  const built = planCore(wider, IDENTITY).core!;
  const expected = expectedCores(wider, built.core, built.features, built.fit!.places);
  expect(simulate(TEXT, wider, expected).largestDeviationMm).toBeGreaterThan(0.05);
  expect(run('G21 G90\nG93\nG1 X1 Y1 U1 V1 F10\n').largestDeviationMm).toBeGreaterThan(10);
});

test('travel, feed and block are checked on the text, each breach with its line', () => {
  const far = edited(/G1 /, (line) => line.replace(/X\S+/, 'X700'));
  expect(run(far.text).findings).toContainEqual(
    expect.objectContaining({ code: 'outside-travel', path: 'machine.travelXMm', at: { line: far.line } }),
  );
  const fast = edited(/G1 X1[45]\d/, (line) => line.replace(/F\S+/, 'F9999'));
  const codes = run(fast.text)
    .findings.filter(({ at }) => at?.line === fast.line)
    .map(({ code }) => code);
  expect(codes).toEqual(expect.arrayContaining(['axis-too-fast', 'wire-too-fast']));
  const low = planWith({ block: { coreYMm: -2 } });
  const outside = planCore(low, IDENTITY).findings.filter(
    ({ code, at }) => code === 'outside-block' && at?.line,
  );
  expect(outside.length).toBeGreaterThan(0);
});

test('many breaches of a kind are counted, not listed', () => {
  const slow = planWith({ material: { maxFeedMmMin: 10, feedMmMin: 240 } });
  const found = simulate(TEXT, slow, EXPECTED).findings.filter(({ code }) => code === 'wire-too-fast');
  expect(found).toHaveLength(13);
  expect(found.at(-1)!.message).toMatch(/^\d+ further lines/);
});

test('what a straight wire can’t do between the ends is one warning, where it is largest', () => {
  // Three times as thick at the tip: behind the nose the normals stand up to 30° apart, 0.75 mm (1 − cos 15°) = 0.026 mm.
  const plan = planWith({
    panel: {
      root: { shape: section('0006'), chordMm: 220 },
      tip: { shape: section('0018'), chordMm: 200 },
      washoutDeg: 0,
    },
    allowances: { upperMm: 0, lowerMm: 0 },
    kerfMm: { root: 1.5, tip: 1.5 },
    features: [],
  });
  const { core, findings } = planCore(plan, IDENTITY);
  const { deviations, largestDeviationMm } = core!.cut!.simulation;
  expect(largestDeviationMm).toBeGreaterThan(0.024);
  expect(largestDeviationMm).toBeLessThan(0.032);
  expect(findings.filter(({ code }) => code.startsWith('cut-differs'))).toMatchObject([
    { severity: 'warning', code: 'cut-differs-between', path: 'panel', at: { spanMm: 300 } },
  ]);
  for (const { share, deviationMm } of deviations)
    if (share === 0 || share === 1) expect(deviationMm).toBeLessThanOrEqual(0.01);
});
