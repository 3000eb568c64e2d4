import { EndType, JoinType, inflatePathsD } from 'clipper2-ts';
import { expect, test } from 'vitest';
import { type Polyline, areaOf, at, polylineOf } from '#geometry/cutting/arrays.ts';
import { buildCore } from '#geometry/cutting/core.ts';
import { buildPanel, ruledVolume } from '#geometry/cutting/panel.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type Shape, outlineOf } from '#geometry/shapes/shape.ts';
import { distanceTo, farthest, fine } from './measuring.ts';
import { PLAN, planWith, prismOf, section } from './plans.ts';

const coreOf = (plan: Plan) => {
  const { core, findings } = buildCore(plan, buildPanel(plan));
  return {
    core: core!,
    codes: findings.map(({ severity, code, at: place }) => [severity, code, place?.end]),
  };
};

test('constant chord, no kerf, no skin: the core is the section, at both ends, and the wire runs on it', () => {
  for (const shape of [section('0012'), section('4415', 'open')]) {
    const { core } = coreOf(prismOf(shape, 200));
    const exact = fine(outlineOf(shape), 200);
    for (const end of ['root', 'tip'] as const) {
      expect(core[end].path).toBe(core[end].core);
      // Each point is one of the section, and no part of the section is farther away than the tolerance.
      core[end].core.x.forEach((x, i) =>
        expect(distanceTo(exact, x, at(core[end].core.y, i))).toBeLessThan(2e-4),
      );
      expect(farthest(exact, core[end].core)).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
    }
  }
});

test('a linear taper: the core’s volume is that of the prismatoid formula, worked by hand for the 0012', () => {
  const shape: Shape = section('0012');
  const plan = planWith({
    ...prismOf(shape, 200),
    panel: {
      root: { shape, chordMm: 200 },
      tip: { shape, chordMm: 100 },
      spanMm: 600,
      washoutDeg: 0,
      sweepMm: 30,
      verticalOffsetMm: 5,
    },
    cut: { toleranceMm: 0.001 },
  });
  const { core } = coreOf(plan);
  // The closed 0012 has an area of 0.0817060 c²: 3268.24 mm² at 200, 817.06 mm² at 100 and 1838.385 mm² at 150 mm.
  // A polygon within 0.001 mm of a perimeter of 408 mm lacks at most 0.41 mm².
  expect(Math.abs(areaOf(core.root.core) - 3268.24)).toBeLessThan(0.41);
  // 600/6 (3268.24 + 4 · 1838.385 + 817.06) = 1 143 884 mm³.
  // It lacks at most 0.41 mm² at the root and 0.2 mm² at the tip: 183 mm³.
  expect(Math.abs(ruledVolume(core.root.core, core.tip.core, 600) - 1_143_884)).toBeLessThan(183);
});

test('the wire keeps half the kerf of its end outside the core', () => {
  const { core } = coreOf(planWith({ kerfMm: { root: 0.8, tip: 1.2 }, features: [] }));
  for (const [end, half] of [
    ['root', 0.4],
    ['tip', 0.6],
  ] as const) {
    expect(core[end].halfKerfMm).toBe(half);
    core[end].path.x.forEach((x, i) =>
      expect(distanceTo(core[end].core, x, at(core[end].path.y, i))).toBeGreaterThan(half - 0.005),
    );
  }
});

test('an independent polygon offset, shrunk by the skins and grown round by half the kerf, gives the same path', () => {
  const moved = (line: Polyline, by: number) => {
    const path = Array.from(line.x, (x, i) => ({ x, y: at(line.y, i) }));
    const pieces = inflatePathsD([path], by, JoinType.Round, EndType.Polygon, 2, 6, 0.002).map(polylineOf);
    return pieces.reduce((a, b) => (Math.abs(areaOf(a)) > Math.abs(areaOf(b)) ? a : b));
  };
  for (const [digits, skin, kerf] of [
    ['0012', 1, 0.8],
    ['4412', 0.5, 1.6],
    ['0006', 1.5, 1.2],
  ] as const) {
    const plan = planWith({
      ...prismOf(section(digits), 200),
      allowances: { upperMm: skin, lowerMm: skin },
      kerfMm: { root: kerf, tip: kerf },
      cut: { toleranceMm: 0.002 },
    });
    const { core } = coreOf(plan);
    const other = moved(moved(fine(outlineOf(section(digits)), 200, 450), -skin), kerf / 2);
    expect(farthest(other, core.root.path)).toBeLessThanOrEqual(0.01);
    expect(farthest(core.root.path, other)).toBeLessThanOrEqual(0.01);
  }
});

test('skins that meet far ahead of the trailing edge are a warning, near it a note', () => {
  expect(coreOf(PLAN).codes).toEqual([
    ['note', 'skins-meet', 'root'],
    ['note', 'skins-meet', 'tip'],
  ]);
  const thick = planWith({ allowances: { upperMm: 7, lowerMm: 7 }, features: [] });
  expect(coreOf(thick).codes).toEqual([
    ['warning', 'skins-meet', 'root'],
    ['warning', 'skins-meet', 'tip'],
  ]);
});

test('bare foam that runs out thin is a warning of a foam core alone', () => {
  const thin = planWith({ allowances: { upperMm: 0, lowerMm: 0 } });
  expect(coreOf(thin).codes.map(([, code]) => code)).toEqual(['thin-trailing-edge', 'thin-trailing-edge']);
  expect(coreOf({ ...thin, block: null }).codes).toEqual([]);
  expect(coreOf({ ...thin, limits: { ...thin.limits, minimumTrailingEdgeMm: 0.1 } }).codes).toEqual([]);
});

test('a surface that turns back along its chord is noted, since its rulings follow other stations', () => {
  const panel = buildPanel(PLAN);
  const folded = { ...panel, tip: { ...panel.tip, lower: { ...panel.tip.lower, monotone: false } } };
  const { findings } = buildCore(PLAN, folded);
  expect(findings.filter(({ code }) => code === 'stations-of-construction')).toMatchObject([
    { severity: 'note', path: 'panel.tip.shape', at: { end: 'tip' } },
  ]);
});
