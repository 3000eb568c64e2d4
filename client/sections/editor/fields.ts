import { LENGTH_LIMITS } from '#geometry/formats/options.ts';
import {
  CST_LIMITS,
  type CstShape,
  type Surface,
  withBoatTailAngleDeg,
  withNoseRadius,
  withWeight,
} from '#geometry/shapes/cst.ts';
import {
  NACA4_LIMITS,
  type Naca4Shape,
  naca4NoseRadius,
  naca4ThicknessOfNose,
} from '#geometry/shapes/naca4.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type Edit, type Present } from './present.ts';
import { scaleOf } from '#client/drawing/section-points.ts';
import { RESTING_CAMBER_POSITION } from './handle-points.ts';
import { mirrored, SMALLEST_NOSE_RADIUS, withNoseRadiusInProportion } from './handle-moves.ts';
import { type HandleId, weightOf } from './handle-ids.ts';
import { checked } from './validity.ts';

/** Values that can be typed, on the sheet or in the list. Weights are named as their handles. */
export type FieldId =
  | 'chordMm'
  | 'maxCamber'
  | 'maxCamberPosition'
  | 'maxThickness'
  | 'noseRadius'
  | 'noseRadius-upper'
  | 'noseRadius-lower'
  | 'trailingEdgeGap'
  | 'boatTail-upper'
  | 'boatTail-lower'
  | 'n1'
  | 'n2'
  | `${Surface}-${number}`;

export interface FieldRange {
  readonly min: number;
  readonly max: number;
}

const LARGEST_WEIGHT = CST_LIMITS.upper.max;

/**
 * The range of a field: mm for the chord, degrees for angles, no unit for weights and exponents, else fractions of chord.
 */
export function fieldRange(shape: Shape, field: FieldId): FieldRange {
  if (field === 'chordMm') return LENGTH_LIMITS.chordMm;
  if (shape.kind === 'naca4') {
    if (field === 'noseRadius') {
      const { min, max } = NACA4_LIMITS.maxThickness;
      return { min: naca4NoseRadius(min), max: naca4NoseRadius(max) };
    }
    return field === 'maxCamber' || field === 'maxCamberPosition'
      ? NACA4_LIMITS[field]
      : NACA4_LIMITS.maxThickness;
  }
  const weight = weightOf(field as HandleId);
  if (weight) return CST_LIMITS[weight.surface];
  if (field === 'n1' || field === 'n2') return CST_LIMITS[field];
  if (field === 'trailingEdgeGap') return CST_LIMITS.trailingEdgeGap;
  if (field === 'boatTail-upper' || field === 'boatTail-lower') return boatTailRange(shape);
  return { min: SMALLEST_NOSE_RADIUS, max: LARGEST_WEIGHT ** 2 / 2 };
}

/** The angles whose weights lie within their limits, at the gap of the shape. */
function boatTailRange(shape: CstShape): FieldRange {
  const angle = (weight: number) => (Math.atan(weight - shape.trailingEdgeGap / 2) * 180) / Math.PI;
  return { min: angle(CST_LIMITS.upper.min), max: angle(CST_LIMITS.upper.max) };
}

/** Sets one typed value. Refused with a reason when it is out of range or the surfaces would cross. */
export function withField(present: Present, field: FieldId, value: number): Edit {
  const range = fieldRange(present.shape, field);
  if (!Number.isFinite(value)) return refused('Type a number.');
  if (value < range.min || value > range.max) return refused(outOfRange(range, field));
  if (field === 'chordMm') return { present: { ...present, chordMm: value }, notice: null };
  const result = checked(() =>
    present.shape.kind === 'naca4'
      ? digitsWith(present.shape, field, value)
      : freeFormWith(present, present.shape, field, value),
  );
  if (result.shape)
    return { present: { ...present, shape: result.shape }, notice: noseNotice(result.shape, field) };
  return refused(result.reason);
}

function digitsWith(shape: Naca4Shape, field: FieldId, value: number): Shape {
  switch (field) {
    case 'maxCamber': {
      const position = shape.maxCamberPosition;
      const maxCamberPosition =
        position >= NACA4_LIMITS.maxCamberPosition.min ? position : RESTING_CAMBER_POSITION;
      return { ...shape, maxCamber: value, maxCamberPosition };
    }
    case 'maxCamberPosition':
      return { ...shape, maxCamberPosition: value };
    case 'maxThickness':
      return { ...shape, maxThickness: value };
    case 'noseRadius':
      return { ...shape, maxThickness: naca4ThicknessOfNose(value) };
    default:
      return shape;
  }
}

function freeFormWith(present: Present, shape: CstShape, field: FieldId, value: number): Shape {
  const weight = weightOf(field as HandleId);
  if (weight) {
    const shapeWith = withWeight(shape, weight.surface, weight.index, value);
    return weight.index === 0
      ? mirrored({ ...present, shape: shapeWith }, field as HandleId).shape
      : shapeWith;
  }
  switch (field) {
    case 'noseRadius':
      return withNoseRadiusInProportion(shape, value / scaleOf(shape));
    case 'noseRadius-upper':
      return withNoseRadius(shape, present.equalNose ? 'both' : 'upper', value / scaleOf(shape));
    case 'noseRadius-lower':
      return withNoseRadius(shape, present.equalNose ? 'both' : 'lower', value / scaleOf(shape));
    case 'trailingEdgeGap':
      return { ...shape, trailingEdgeGap: value / scaleOf(shape) };
    case 'boatTail-upper':
      return withBoatTailAngleDeg(shape, 'upper', value);
    case 'boatTail-lower':
      return withBoatTailAngleDeg(shape, 'lower', value);
    case 'n1':
    case 'n2':
      return { ...shape, [field]: value };
    default:
      return shape;
  }
}

function noseNotice(shape: Shape, field: FieldId): Edit['notice'] {
  if (shape.kind !== 'naca4' || field !== 'noseRadius') return null;
  return { code: 'nose-follows-thickness', maxThickness: shape.maxThickness };
}

function refused(reason: string): Edit {
  return { present: null, notice: { code: 'refused', reason } };
}

function outOfRange({ min, max }: FieldRange, field: FieldId): string {
  const number = (value: number) => String(Number(value.toFixed(4)));
  if (field === 'chordMm') return `The chord must lie between ${min} mm and ${max} mm.`;
  if (field.startsWith('boatTail')) return `The angle must lie between ${number(min)}° and ${number(max)}°.`;
  if (field === 'n1' || field === 'n2' || /-\d+$/.test(field))
    return `The value must lie between ${number(min)} and ${number(max)}.`;
  return `The value must lie between ${number(min * 100)} % and ${number(max * 100)} % of chord.`;
}
