import { expect, test } from 'vitest';
import { buildCore } from '#geometry/cutting/core.ts';
import { compareReading, inspectionRows } from '#geometry/cutting/inspection.ts';
import { buildPanel } from '#geometry/cutting/panel.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { PLAN, planWith, prismOf, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const rowsOf = (plan: Plan) => inspectionRows(plan, buildCore(plan, buildPanel(plan)).core!);
const codesOf = (plan: Plan) =>
  planCore(plan, IDENTITY)
    .findings.filter(({ code }) => code.startsWith('inspection'))
    .map(({ severity, code, path, at }) => [severity, code, path, at?.end]);

/** Half thickness of a symmetric 4-digit section, in per cent of a thickness of 20 %: NACA Report 460, eq. (6). */
const half = (x: number) =>
  0.2969 * Math.sqrt(x) - 0.126 * x - 0.3516 * x ** 2 + 0.2843 * x ** 3 - 0.1015 * x ** 4;

test('the thickness of a 0012 of 200 mm with skins is that of its formula', () => {
  const plan = planWith({
    ...prismOf(section('0012', 'open'), 200),
    allowances: { upperMm: 1, lowerMm: 1 },
    inspection: { stations: [0.1, 0.3, 0.6], measured: 'with-skin', toleranceMm: 0.25 },
  });
  const rows = rowsOf(plan);
  expect(rows.map(({ end, station }) => [end, station])).toEqual([
    ['root', 0.1],
    ['root', 0.3],
    ['root', 0.6],
    ['tip', 0.1],
    ['tip', 0.3],
    ['tip', 0.6],
  ]);
  for (const { station, nominalMm, toleranceMm } of rows) {
    // y_t = t/0.2 · half(x): 12 % of 200 mm, both sides.
    expect(Math.abs(nominalMm - 2 * 0.6 * half(station) * 200)).toBeLessThan(1e-9);
    expect(toleranceMm).toBe(0.25);
  }
});

test('a core is thinner by both skins where the surfaces are level, and by skin over cosine where they slope', () => {
  const plan = planWith({
    ...prismOf(section('0012', 'open'), 200),
    allowances: { upperMm: 1, lowerMm: 1 },
    cut: { ...PLAN.cut, toleranceMm: 0.002 },
    inspection: { ...PLAN.inspection, stations: [0.3, 0.6] },
  });
  const [level, sloping] = rowsOf(plan);
  expect(Math.abs(level!.nominalMm - (2 * 0.6 * half(0.3) * 200 - 2))).toBeLessThan(0.005);
  const slope = (0.6 * (half(0.6001) - half(0.5999))) / 0.0002;
  const wanted = 2 * (0.6 * half(0.6) * 200 - Math.hypot(1, slope));
  // The skin's inner side is parallel to a curve, not to its tangent: second order, r = 2 mm² / radius.
  expect(Math.abs(sloping!.nominalMm - wanted)).toBeLessThan(0.005);
});

test('washout, sweep and offset do not change what the caliper shows; chords scale it', () => {
  const still = { washoutDeg: 0, sweepMm: 0, verticalOffsetMm: 0 };
  const of = (panel: object) => rowsOf(planWith({ panel: { ...PLAN.panel, ...panel }, features: [] }));
  const [turned, flat] = [of({}), of(still)];
  turned.forEach(({ nominalMm }, i) => expect(Math.abs(nominalMm - flat[i]!.nominalMm)).toBeLessThan(0.02));
  const bare = rowsOf(
    planWith({
      allowances: { upperMm: 0, lowerMm: 0 },
      features: [],
      cut: { ...PLAN.cut, toleranceMm: 0.002 },
    }),
  );
  expect(bare[3]!.nominalMm / bare[0]!.nominalMm).toBeCloseTo(160 / 220, 3);
});

test('without skin the core is the contour', () => {
  const plan = planWith({ allowances: { upperMm: 0, lowerMm: 0 }, features: [] });
  const whole = rowsOf({ ...plan, inspection: { ...plan.inspection, measured: 'with-skin' } });
  rowsOf(plan).forEach(({ nominalMm }, i) =>
    expect(Math.abs(nominalMm - whole[i]!.nominalMm)).toBeLessThanOrEqual(2 * plan.cut.toleranceMm),
  );
});

test('a station behind the core’s end or in the stock is a warning with its field, and no row', () => {
  const plan = planWith({ inspection: { ...PLAN.inspection, stations: [0.3, 0.98] } });
  expect(codesOf(plan)).toEqual([
    ['warning', 'inspection-without-foam', 'inspection.stations.1', 'root'],
    ['warning', 'inspection-without-foam', 'inspection.stations.1', 'tip'],
  ]);
  expect(rowsOf(plan).map(({ station }) => station)).toEqual([0.3, 0.3]);
  const stock = planWith({
    stock: { leadingEdgeStation: 0.05, trailingEdgeStation: null },
    inspection: { ...PLAN.inspection, stations: [0.03] },
  });
  expect(codesOf(stock)).toHaveLength(2);
  expect(planCore(stock, IDENTITY).core!.inspection).toEqual([]);
});

test('a caliper that meets a slot is told so', () => {
  const plan = planWith({ inspection: { ...PLAN.inspection, stations: [0.3, 0.4] } });
  expect(codesOf(plan)).toEqual([
    ['note', 'inspection-at-feature', 'inspection.stations.1', 'root'],
    ['note', 'inspection-at-feature', 'inspection.stations.1', 'tip'],
  ]);
});

test.each([
  ['none', [], 'inspection.stations'],
  ['too many', Array.from({ length: 13 }, (_, i) => 0.1 + i / 100), 'inspection.stations'],
  ['one twice', [0.3, 0.3], 'inspection.stations'],
  ['one at the nose', [0.01], 'inspection.stations.0'],
  ['one behind', [0.3, 0.99], 'inspection.stations.1'],
])('stations, %s: refused with the field', (_, stations, path) => {
  const { findings } = planCore({ ...PLAN, inspection: { ...PLAN.inspection, stations } }, IDENTITY);
  expect(findings).toMatchObject([{ severity: 'error', code: 'bad-value', path }]);
});

test('a reading exactly at the tolerance is within, whatever binary rounding says; one beyond is out', () => {
  const row = { end: 'root', station: 0.3, nominalMm: 24, toleranceMm: 0.3 } as const;
  expect(compareReading(row, 24.3)).toEqual({ deviationMm: 0.3, within: true });
  expect(compareReading(row, 23.7)).toEqual({ deviationMm: -0.3, within: true });
  expect(compareReading(row, 24.301)).toEqual({ deviationMm: 0.301, within: false });
});
