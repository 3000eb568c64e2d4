import { expect, test, vi } from 'vitest';
import { type FlowPoint } from '#geometry/flow/flow-point.ts';
import { panelOutline } from '#geometry/flow/panels.ts';
import { sweepAll } from '#geometry/flow/sweep.ts';
import { prepareSection } from '#geometry/flow/viscous.ts';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { outlineOf, shapeSchema } from '#geometry/shapes/shape.ts';
import { prepared } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

/** Angles up to the highest lift found: converged and all. */
function beforeStall(points: readonly FlowPoint[]): { readonly good: number; readonly all: number } {
  let top = points[0];
  for (const point of points) if (point.converged && (!top?.converged || point.cl > top.cl)) top = point;
  const counted = points.filter(({ alphaDeg }) => alphaDeg <= (top?.alphaDeg ?? 0));
  return { good: counted.filter(({ converged }) => converged).length, all: counted.length };
}

/** A part of the grid (camber 0 … 6 %, thickness 8 … 18 %, Re 1e5 … 3e6, −6 … 14°) on which the whole is measured by hand. */
test.each([
  ['0008', 1e5],
  ['0012', 3e6],
  ['2412', 2e5],
  ['4415', 5e5],
  ['6418', 1e6],
] as const)('%s at Re %d: every angle from −6° to the stall in steps of 2° converges', (digits, reynolds) => {
  const { good, all } = beforeStall(
    sweepAll(prepared(digits), { reynolds }, { fromDeg: -6, toDeg: 14, stepDeg: 2 }),
  );
  expect(all).toBeGreaterThan(6);
  expect(good).toBe(all);
});

/** Numbers that follow each other without order, the same at every run (linear congruence, Numerical Recipes). */
function* numbers(seed: number): Generator<number, never> {
  for (let state = seed; ;) {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    yield state / 2 ** 32;
  }
}

/** Free-form sections of orders 2 … 8 with round noses, sharp and blunt. */
function freeForms(count: number): CstShape[] {
  const source = numbers(20261201);
  const next = (min: number, max: number) => min + (max - min) * source.next().value;
  const shapes: CstShape[] = [];
  while (shapes.length < count) {
    const weights = (min: number, max: number) => Array.from({ length: 3 + Math.floor(next(0, 7)) }, () => next(min, max)); // prettier-ignore
    const shape = {
      kind: 'cst' as const,
      upper: weights(0.1, 0.35),
      lower: [next(-0.22, -0.06), ...weights(-0.22, 0.02)],
      n1: 0.5,
      n2: 1,
      trailingEdgeGap: next(0, 1) < 0.5 ? 0 : next(0, 0.01),
    };
    if (shapeSchema.safeParse(shape).success) shapes.push(shape);
  }
  return shapes;
}

test('free-form sections: at least 97 per cent of the points before the stall converge', () => {
  const counts = freeForms(10).map((shape) => {
    const section = prepareSection(panelOutline(outlineOf(shape), 160));
    return beforeStall(sweepAll(section, { reynolds: 5e5 }, { fromDeg: 0, toDeg: 8, stepDeg: 2 }));
  });
  const [good, all] = [
    counts.reduce((sum, one) => sum + one.good, 0),
    counts.reduce((sum, one) => sum + one.all, 0),
  ];
  expect(all).toBeGreaterThan(30);
  expect(good / all).toBeGreaterThanOrEqual(0.97);
});
