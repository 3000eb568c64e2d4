/** The free-form section: its schema, its outline and what can be done with its weights. */
export { CST_LIMITS, type CstShape, type Placement, type Surface, cstSchema } from './cst-schema.ts';
export { cstOutline } from './cst-outline.ts';
export { lowerOrder, raiseOrder } from './cst-order.ts';
export {
  type Surfaces,
  boatTailAngleDegOf,
  noseRadiusOf,
  weightStation,
  weightThrough,
  withBoatTailAngleDeg,
  withEqualNoseRadius,
  withNoseRadius,
  withWeight,
} from './cst-weights.ts';
