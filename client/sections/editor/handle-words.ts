import { boatTailAngleDegOf, CST_LIMITS } from '#geometry/shapes/cst.ts';
import { NACA4_LIMITS } from '#geometry/shapes/naca4.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type Point } from '#geometry/point.ts';
import { formatLength, formatPercent, type Units } from '#client/app/units.ts';
import { type DimensionId } from '#client/drawing/section-dimensions.ts';
import { noseCircle, scaleOf } from '#client/drawing/section-points.ts';
import { fieldRange } from './fields.ts';
import { type HandleId, weightOf } from './handle-ids.ts';

/** What a handle says of itself: its name, its main value for a slider, and its value in words. */
interface HandleWords {
  readonly name: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  /** Spoken: "thickness 12.4 % of chord, 27.3 mm, at 30 % chord". */
  readonly spoken: string;
  /** Beside the pointer while it is dragged. */
  readonly tag: string;
}

export function handleWords(
  shape: Shape,
  handle: HandleId,
  at: Point,
  chordMm: number,
  units: Units,
): HandleWords {
  const mm = (fraction: number, decimals = 2) => formatLength(fraction * chordMm, units, decimals);
  const weight = weightOf(handle);
  if (weight && shape.kind === 'cst') return weightWords(shape, weight, at, mm);
  if (handle === 'nose') return noseWords(shape, mm);
  if (handle === 'edge') return edgeWords(shape, mm);
  if (shape.kind === 'naca4' && handle === 'camber') {
    const { maxCamber, maxCamberPosition } = shape;
    const camber = formatPercent(maxCamber, 2);
    const position = formatPercent(maxCamber > 0 ? maxCamberPosition : at.x, 1);
    return {
      name: 'Camber and its position',
      value: 100 * maxCamber,
      ...percentRange(NACA4_LIMITS.maxCamber),
      spoken: `camber ${camber} of chord, ${mm(maxCamber)}, at ${position} chord`,
      tag: `${mm(maxCamber)} = ${camber} at ${position}`,
    };
  }
  const thickness = shape.kind === 'naca4' ? shape.maxThickness : 0;
  return {
    name:
      handle === 'thickness-lower' ? 'Thickness, at the lower surface' : 'Thickness, at the upper surface',
    value: 100 * thickness,
    ...percentRange(NACA4_LIMITS.maxThickness),
    spoken: `thickness ${formatPercent(thickness, 2)} of chord, ${mm(thickness)}, at 30 % chord`,
    tag: `${mm(thickness)} = ${formatPercent(thickness, 2)}`,
  };
}

type Millimetres = (fraction: number, decimals?: number) => string;

function weightWords(
  shape: Extract<Shape, { kind: 'cst' }>,
  { surface, index }: { surface: 'upper' | 'lower'; index: number },
  at: Point,
  mm: Millimetres,
): HandleWords {
  const weight = shape[surface][index] ?? 0;
  const { min, max } = CST_LIMITS[surface];
  const ordinate = `${mm(at.y)} at ${formatPercent(at.x, 1)}`;
  return {
    name: `Weight ${index} of the ${surface} surface`,
    value: weight,
    min,
    max,
    spoken: `weight ${weight.toFixed(4)}, ${surface} surface ${ordinate} chord`,
    tag: `${ordinate}, A${index} = ${weight.toFixed(4)}`,
  };
}

function noseWords(shape: Shape, mm: Millimetres): HandleWords {
  const { radius } = noseCircle(shape);
  const follows = shape.kind === 'naca4' ? `, thickness ${formatPercent(shape.maxThickness, 2)}` : '';
  const range =
    shape.kind === 'naca4' ? fieldRange(shape, 'noseRadius') : { min: 0, max: CST_LIMITS.upper.max ** 2 / 2 };
  return {
    name: 'Nose radius',
    value: Number((100 * radius).toFixed(4)),
    min: Number((100 * range.min).toFixed(4)),
    max: Number((100 * range.max).toFixed(4)),
    spoken: `nose radius ${formatPercent(radius, 2)} of chord, ${mm(radius)}${follows}`,
    tag: `R ${mm(radius)} = ${formatPercent(radius, 2)}${follows}`,
  };
}

function edgeWords(shape: Shape, mm: Millimetres): HandleWords {
  const open = shape.kind === 'naca4' ? shape.trailingEdge === 'open' : shape.trailingEdgeGap > 0;
  if (shape.kind === 'naca4') {
    const words = `trailing edge ${open ? 'open' : 'closed'}`;
    return { name: 'Open trailing edge', value: open ? 1 : 0, min: 0, max: 1, spoken: words, tag: words };
  }
  const gap = shape.trailingEdgeGap * scaleOf(shape);
  const angles = (['upper', 'lower'] as const).map(
    (surface) => `${boatTailAngleDegOf(shape, surface).toFixed(1)}°`,
  );
  return {
    name: 'Trailing-edge gap',
    value: 100 * gap,
    ...percentRange(CST_LIMITS.trailingEdgeGap),
    spoken: `trailing-edge gap ${formatPercent(gap, 2)} of chord, ${mm(gap)}, boat-tail angles ${angles.join(' and ')}`,
    tag: `gap ${mm(gap)} = ${formatPercent(gap, 2)}`,
  };
}

function percentRange({ min, max }: { readonly min: number; readonly max: number }): {
  min: number;
  max: number;
} {
  return { min: 100 * min, max: 100 * max };
}

/** The dimensions that a handle moves: they are drawn in the accent while it is in hand. */
export function dimensionsOf(handle: HandleId | null, shape: Shape): readonly DimensionId[] {
  if (handle === null) return [];
  switch (handle) {
    case 'camber':
      return ['maxCamber', 'maxCamberPosition'];
    case 'thickness-upper':
    case 'thickness-lower':
      return ['maxThickness', 'noseRadius'];
    case 'nose':
      return shape.kind === 'naca4' ? ['noseRadius', 'maxThickness'] : ['noseRadius'];
    case 'edge':
      return ['trailingEdgeGap'];
    default: {
      const weight = weightOf(handle);
      if (!weight || shape.kind !== 'cst') return [];
      if (weight.index === 0) return ['noseRadius'];
      return weight.index === shape[weight.surface].length - 1 ? [`boatTail-${weight.surface}`] : [];
    }
  }
}
