import fc from 'fast-check';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { type Naca4Shape, parseDesignation } from '#geometry/shapes/naca4.ts';
import { type Shape, shapeSchema } from '#geometry/shapes/shape.ts';

/** A 4-digit shape by its digits. */
export function naca4(digits: string, trailingEdge: Naca4Shape['trailingEdge'] = 'closed'): Naca4Shape {
  const values = parseDesignation(digits);
  if (!values) throw new Error(`${digits} is no designation`);
  return { kind: 'naca4', ...values, trailingEdge };
}

/** A free-form section with different orders, a hollow tail, a gap and a placement. */
export const FREE_FORM: CstShape = {
  kind: 'cst',
  upper: [0.2, 0.25, 0.3, 0.2, 0.22, 0.2, 0.25],
  lower: [-0.15, -0.1, -0.1, -0.05, 0.02],
  n1: 0.5,
  n2: 1,
  trailingEdgeGap: 0.004,
  placement: { x: -0.001, y: 0.003, rotationDeg: -0.4, scale: 1.0005 },
};

/** The unit shape: every weight 1 above, −1 below. */
export const UNIT: CstShape = {
  kind: 'cst',
  upper: [1, 1, 1, 1],
  lower: [-1, -1, -1],
  n1: 0.5,
  n2: 1,
  trailingEdgeGap: 0,
};

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true, noDefaultInfinity: true });

/** Any accepted 4-digit shape. */
export const naca4Shapes: fc.Arbitrary<Naca4Shape> = fc
  .record({
    kind: fc.constant('naca4' as const),
    maxCamber: fc.oneof(fc.constant(0), between(0.001, 0.12)),
    maxCamberPosition: between(0.1, 0.9),
    maxThickness: between(0.01, 0.4),
    trailingEdge: fc.constantFrom('open' as const, 'closed' as const),
  })
  .filter((shape) => shapeSchema.safeParse(shape).success);

const weights = (min: number, max: number) => fc.array(between(min, max), { minLength: 3, maxLength: 13 });

/** Any accepted CST shape with the exponents of a round nose, and with any. */
export function cstShapes(exponents: 'round' | 'any' = 'round'): fc.Arbitrary<CstShape> {
  return fc
    .record({
      kind: fc.constant('cst' as const),
      upper: weights(0.02, 0.6),
      lower: weights(-0.5, 0.01),
      n1: exponents === 'round' ? fc.constant(0.5) : between(0.5, 1),
      n2: exponents === 'round' ? fc.constant(1) : between(0.5, 1.5),
      trailingEdgeGap: fc.oneof(fc.constant(0), between(0, 0.05)),
    })
    .filter((shape) => shapeSchema.safeParse(shape).success);
}

/** Any accepted shape of a round nose. */
export const shapes: fc.Arbitrary<Shape> = fc.oneof(naca4Shapes, cstShapes());

/** The value with everything in it frozen: a function that writes on it throws. */
export function deepFrozen<T>(value: T): T {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    for (const part of Object.values(value)) deepFrozen(part);
  }
  return value;
}
