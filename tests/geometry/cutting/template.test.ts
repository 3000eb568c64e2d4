import { expect, test } from 'vitest';
import { areaOf, at, boxOf } from '#geometry/cutting/arrays.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { crossingsByHand, distanceTo, fine } from './measuring.ts';
import { TEMPLATE, planWith, prismOf, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'templates' };
const templatesOf = (plan: Plan) => planCore(plan, IDENTITY).core!.templates;

test('the edge stands half the kerf less the wire’s radius outside the bare section', () => {
  const plan = planWith({
    ...prismOf(section('2412'), 200),
    kerfMm: { root: 1, tip: 1.2 },
    template: TEMPLATE,
  });
  const exact = fine(outlineOf(section('2412')), 200);
  const [root, tip] = templatesOf(plan);
  for (const [template, wanted] of [
    [root!, 0.3],
    [tip!, 0.4],
  ] as const) {
    const { outline, rampMm } = template;
    expect(rampMm).toBeCloseTo(30, 12);
    outline.x.forEach((x, i) => {
      if (x > 199) return;
      expect(Math.abs(distanceTo(exact, x, at(outline.y, i)) - wanted)).toBeLessThanOrEqual(0.005);
    });
    expect(boxOf(outline).maxX).toBeCloseTo(230, 0);
    expect(areaOf(outline)).toBeGreaterThan(0);
    expect(crossingsByHand(outline)).toBe(0);
  }
});

test('ticks carry the same numbers at the same stations at both ends, in the order of the cut', () => {
  const [root, tip] = templatesOf(planWith({ template: TEMPLATE }));
  expect(root!.ticks.map(({ number }) => number)).toEqual(Array.from({ length: 41 }, (_, i) => i + 1));
  expect(root!.ticks.map(({ station }) => station)).toEqual(tip!.ticks.map(({ station }) => station));
  expect(root!.ticks.slice(0, 3).map(({ station }) => station)).toEqual([1, 0.95, 0.9]);
  expect(root!.ticks[20]).toMatchObject({ station: 0 });
  expect(root!.ticks[40]).toMatchObject({ station: 1, surface: 'lower' });
  for (const template of [root!, tip!]) {
    for (const { at: place, inwards } of template.ticks) {
      expect(distanceTo(template.outline, place.x, place.y)).toBeLessThan(0.01);
      expect(Math.hypot(inwards.x, inwards.y)).toBeCloseTo(1, 12);
    }
  }
});

test('ramps are in proportion to the chords; the reference is level at both ends; pins have room', () => {
  const [root, tip] = templatesOf(planWith({ template: TEMPLATE }));
  expect(root!.rampMm / tip!.rampMm).toBeCloseTo(220 / 160, 12);
  for (const { reference, pins, outline, pinDiameterMm } of [root!, tip!]) {
    expect(reference.y[0]).toBe(reference.y[1]);
    expect(pins).toHaveLength(2);
    for (const pin of pins) expect(distanceTo(outline, pin.x, pin.y)).toBeGreaterThan(pinDiameterMm / 2);
  }
});

test('a pin without room is a finding', () => {
  const plan = planWith({ template: { ...TEMPLATE, pinStations: [0.25, 0.98] } });
  expect(planCore(plan, IDENTITY).findings).toContainEqual(
    expect.objectContaining({
      severity: 'error',
      code: 'pin-outside-template',
      path: 'template.pinStations.1',
    }),
  );
});
