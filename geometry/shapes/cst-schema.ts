import { z } from 'zod';
import { fractionWithin, numberWithin } from './fields.ts';

/** The accepted ranges. Lengths in fractions of chord; weights and exponents without unit. */
export const CST_LIMITS = {
  order: { min: 2, max: 12 },
  upper: { min: -1, max: 2 },
  lower: { min: -2, max: 1 },
  n1: { min: 0.5, max: 1 },
  n2: { min: 0.5, max: 1.5 },
  trailingEdgeGap: { min: 0, max: 0.05 },
  placement: {
    offset: { min: -1, max: 1 },
    rotationDeg: { min: -45, max: 45 },
    scale: { min: 0.5, max: 2 },
  },
} as const;

type Weights = z.ZodType<readonly number[], readonly number[]>;

function weights(surface: 'upper' | 'lower'): Weights {
  const { min, max } = CST_LIMITS[surface];
  const count = `${surface} must have ${CST_LIMITS.order.min + 1} to ${CST_LIMITS.order.max + 1} weights`;
  return z
    .array(
      numberWithin({ min, max }, `each weight of the ${surface} surface must be between ${min} and ${max}`),
      {
        error: count,
      },
    )
    .min(CST_LIMITS.order.min + 1, { error: count })
    .max(CST_LIMITS.order.max + 1, { error: count });
}

function plain(name: string, range: { readonly min: number; readonly max: number }): z.ZodNumber {
  return numberWithin(range, `${name} must be between ${range.min} and ${range.max}`);
}

const { offset, rotationDeg, scale } = CST_LIMITS.placement;

/** Where the chord of a shape lies on the sheet: its nose at (x, y), turned counter-clockwise, lengthened by `scale`. */
export const placementSchema = z.strictObject({
  x: plain('x', offset),
  y: plain('y', offset),
  rotationDeg: plain('rotationDeg', rotationDeg),
  scale: plain('scale', scale),
});

/**
 * A free-form section by the class–shape transformation: Kulfan & Bussoletti, AIAA 2006-6948; Kulfan, J. Aircraft 45(1), 2008.
 * Each surface is ζ(x) = x^n1 (1−x)^n2 S(x) ± x·gap/2, S in Bernstein form with its own weights. The lower surface's weights are
 * negative where it lies below the chord. Without a placement the chord runs from (0, 0) to (1, 0).
 */
export const cstSchema = z.strictObject({
  kind: z.literal('cst'),
  upper: weights('upper'),
  lower: weights('lower'),
  n1: plain('n1', CST_LIMITS.n1),
  n2: plain('n2', CST_LIMITS.n2),
  trailingEdgeGap: fractionWithin('trailingEdgeGap', CST_LIMITS.trailingEdgeGap),
  placement: placementSchema.optional(),
});

export type CstShape = Readonly<z.infer<typeof cstSchema>>;
export type Placement = Readonly<z.infer<typeof placementSchema>>;
export type Surface = 'upper' | 'lower';
