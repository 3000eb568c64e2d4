import fc from 'fast-check';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { type Naca4Shape } from '#geometry/shapes/naca4.ts';
import { shapeSchema } from '#geometry/shapes/shape.ts';

/** Ordinary 4-digit sections with camber. */
export const digits: fc.Arbitrary<Naca4Shape> = fc
  .record({
    kind: fc.constant('naca4' as const),
    maxCamber: fc.double({ min: 0.001, max: 0.09, noNaN: true }),
    maxCamberPosition: fc.double({ min: 0.2, max: 0.8, noNaN: true }),
    maxThickness: fc.double({ min: 0.03, max: 0.25, noNaN: true }),
    trailingEdge: fc.constantFrom('open' as const, 'closed' as const),
  })
  .filter((shape) => shapeSchema.safeParse(shape).success);

const weights = (sign: 1 | -1) =>
  fc
    .array(fc.double({ min: 0.08, max: 0.4, noNaN: true }), { minLength: 3, maxLength: 13 })
    .map((list) => list.map((weight) => sign * weight));

/** Ordinary free-form sections, half of them placed as a converted one is. */
export const freeForms: fc.Arbitrary<CstShape> = fc
  .record({
    kind: fc.constant('cst' as const),
    upper: weights(1),
    lower: weights(-1),
    n1: fc.constant(0.5),
    n2: fc.constant(1),
    trailingEdgeGap: fc.double({ min: 0.0005, max: 0.02, noNaN: true }),
    placement: fc.option(
      fc.record({
        x: fc.double({ min: -0.001, max: 0.001, noNaN: true }),
        y: fc.double({ min: -0.01, max: 0.01, noNaN: true }),
        rotationDeg: fc.double({ min: -3, max: 3, noNaN: true }),
        scale: fc.double({ min: 0.99, max: 1.01, noNaN: true }),
      }),
      { nil: undefined },
    ),
  })
  .map(({ placement, ...shape }) => (placement ? { ...shape, placement } : shape))
  .filter((shape) => shapeSchema.safeParse(shape).success);
