import { type Point } from '#geometry/point.ts';
import { boatTailAngleDegOf, type CstShape } from '#geometry/shapes/cst.ts';
import { type Naca4Shape, thickestStation } from '#geometry/shapes/naca4.ts';
import { formatAngle, formatNumber, MM_PER_INCH, type Units } from '#client/app/units.ts';
import { type DimensionRoom, type DimensionSpec } from './dimension-layout.ts';
import { type SectionDrawing } from './section-drawing.ts';
import { edgePoints, noseCircle, surfacePoint } from './section-points.ts';
import { type Box, type SheetLayout } from './sheet-layout.ts';
import { type SheetTransform } from './sheet-view.ts';

export type DimensionId =
  | 'chordMm'
  | 'maxCamber'
  | 'maxCamberPosition'
  | 'maxThickness'
  | 'maxThicknessPosition'
  | 'noseRadius'
  | 'trailingEdgeGap'
  | 'boatTail-upper'
  | 'boatTail-lower';

interface Scene {
  readonly drawing: SectionDrawing;
  readonly transform: SheetTransform;
  readonly chordMm: number;
  readonly units: Units;
}

/** The dimensions of a section on the sheet; measured ones that follow from others stand in brackets (ISO 129-1). */
export function sectionDimensions(scene: Scene): DimensionSpec<DimensionId>[] {
  const { shape } = scene.drawing;
  return shape.kind === 'naca4' ? digitDimensions(scene, shape) : freeFormDimensions(scene, shape);
}

/** A length as it stands on a drawing: without its unit, which the sheet states once. */
function drawnLength(mm: number, units: Units, decimals: number): string {
  return units === 'mm' ? formatNumber(mm, decimals) : formatNumber(mm / MM_PER_INCH, decimals + 1);
}

function digitDimensions(scene: Scene, shape: Naca4Shape): DimensionSpec<DimensionId>[] {
  const { transform, chordMm, units } = scene;
  const text = (fraction: number, decimals: number) => drawnLength(fraction * chordMm, units, decimals);
  const upper = surfacePoint(shape, 'upper', thickestStation(shape));
  const lower = surfacePoint(shape, 'lower', thickestStation(shape));
  const crest = { x: shape.maxCamber > 0 ? shape.maxCamberPosition : 0.4, y: shape.maxCamber };
  const thickest = (upper.x + lower.x) / 2;
  const specs: DimensionSpec<DimensionId>[] = [
    along(scene, 'maxThicknessPosition', `(${text(thickest, 1)})`, { x: 0, y: 0 }, upper, 'above'),
    across(transform, 'maxThickness', text(shape.maxThickness, 2), upper, lower),
    camberLeader(scene, text(shape.maxCamber, 2), crest),
    ...commonDimensions(scene),
  ];
  if (shape.maxCamber > 0) {
    specs.push(
      along(scene, 'maxCamberPosition', text(shape.maxCamberPosition, 1), { x: 0, y: 0 }, crest, 'above'),
    );
  }
  return specs;
}

function freeFormDimensions(scene: Scene, shape: CstShape): DimensionSpec<DimensionId>[] {
  const { transform, chordMm, units, drawing } = scene;
  const { measures } = drawing;
  const text = (fraction: number, decimals: number) =>
    `(${drawnLength(fraction * chordMm, units, decimals)})`;
  const upper = surfacePoint(shape, 'upper', measures.maxThicknessPosition);
  const lower = surfacePoint(shape, 'lower', measures.maxThicknessPosition);
  const specs: DimensionSpec<DimensionId>[] = [
    along(
      scene,
      'maxThicknessPosition',
      text(measures.maxThicknessPosition, 1),
      { x: 0, y: 0 },
      upper,
      'above',
    ),
    across(transform, 'maxThickness', text(measures.maxThickness, 2), upper, lower),
    ...commonDimensions(scene),
    boatTail(scene, shape, 'upper'),
    boatTail(scene, shape, 'lower'),
  ];
  if (Math.abs(measures.maxCamber) > 1e-6) {
    const crest = drawing.outline.meanLine(measures.maxCamberPosition);
    specs.push(camberLeader(scene, text(measures.maxCamber, 2), crest));
    specs.push(
      along(scene, 'maxCamberPosition', text(measures.maxCamberPosition, 1), { x: 0, y: 0 }, crest, 'above'),
    );
  }
  return specs;
}

function commonDimensions({ drawing, transform, chordMm, units }: Scene): DimensionSpec<DimensionId>[] {
  const { shape, measures } = drawing;
  const text = (fraction: number, decimals: number) => drawnLength(fraction * chordMm, units, decimals);
  const circle = noseCircle(shape);
  const centre = pixel(transform, {
    x: circle.nose.x + circle.radius * circle.axis.x,
    y: circle.nose.y + circle.radius * circle.axis.y,
  });
  const onCircle = {
    x: centre.x - Math.SQRT1_2 * circle.radius * transform.chordPixels,
    y: centre.y + Math.SQRT1_2 * circle.radius * transform.crossPixels,
  };
  const [upperEnd, lowerEnd] = edgePoints(shape);
  const edge = pixel(transform, { x: (upperEnd.x + lowerEnd.x) / 2, y: (upperEnd.y + lowerEnd.y) / 2 });
  const gap = text(measures.trailingEdgeGap, 2);
  return [
    {
      id: 'chordMm',
      kind: 'horizontal',
      text: drawnLength(chordMm, units, 1),
      from: pixel(transform, { x: 0, y: 0 }),
      to: pixel(transform, { x: 1, y: 0 }),
      side: 'below',
    },
    {
      id: 'noseRadius',
      kind: 'leader',
      text: `R ${text(circle.radius, 2)}`,
      at: onCircle,
      offsets: NOSE_OFFSETS,
    },
    {
      id: 'trailingEdgeGap',
      kind: 'leader',
      text: shape.kind === 'naca4' ? `(${gap})` : gap,
      at: edge,
      offsets: EDGE_OFFSETS,
    },
  ];
}

const NOSE_OFFSETS: readonly Point[] = [
  { x: -26, y: 44 },
  { x: -18, y: 58 },
  { x: -26, y: -52 },
  { x: 22, y: 62 },
  { x: 60, y: 80 },
  { x: 40, y: -90 },
];
const EDGE_OFFSETS: readonly Point[] = [
  { x: 20, y: -46 },
  { x: 20, y: 46 },
  { x: 14, y: -72 },
  { x: -24, y: -56 },
  { x: -24, y: 56 },
  { x: -60, y: -80 },
  { x: -60, y: 80 },
];

function camberLeader({ transform, drawing }: Scene, text: string, crest: Point): DimensionSpec<DimensionId> {
  const at = pixel(transform, crest);
  const rise = transform.toY(drawing.measures.extents.maxY) - at.y - 20;
  const fall = transform.toY(drawing.measures.extents.minY) - at.y + 26;
  return {
    id: 'maxCamber',
    kind: 'leader',
    text,
    at,
    offsets: [
      { x: Math.max(36, -0.8 * rise), y: rise },
      { x: Math.max(72, -1.3 * rise), y: rise },
      { x: Math.max(120, -2 * rise), y: rise },
      { x: 60, y: fall },
      { x: -60, y: fall },
      { x: -60, y: rise },
    ],
  };
}

function boatTail(
  { transform }: Scene,
  shape: CstShape,
  surface: 'upper' | 'lower',
): DimensionSpec<DimensionId> {
  const at = pixel(transform, surfacePoint(shape, surface, 0.94));
  const away = surface === 'upper' ? -1 : 1;
  return {
    id: `boatTail-${surface}`,
    kind: 'leader',
    text: formatAngle(boatTailAngleDegOf(shape, surface), 1),
    at,
    offsets: [
      { x: -34, y: away * 56 },
      { x: -60, y: away * 48 },
      { x: -24, y: away * 84 },
      { x: -90, y: away * 64 },
      { x: 20, y: away * 96 },
    ],
  };
}

function along(
  scene: Scene,
  id: DimensionId,
  text: string,
  from: Point,
  to: Point,
  side: 'above' | 'below',
): DimensionSpec<DimensionId> {
  return {
    id,
    kind: 'horizontal',
    text,
    from: pixel(scene.transform, from),
    to: pixel(scene.transform, to),
    side,
  };
}

function across(
  transform: SheetTransform,
  id: DimensionId,
  text: string,
  upper: Point,
  lower: Point,
): DimensionSpec<DimensionId> {
  return { id, kind: 'across', text, upper: pixel(transform, upper), lower: pixel(transform, lower) };
}

function pixel(transform: SheetTransform, point: Point): Point {
  return { x: transform.toX(point.x), y: transform.toY(point.y) };
}

/** Half the size of a handle's mark, with a little air. */
const HANDLE_ROOM = 9;
const STRIPS = 28;

/** The room for the dimensions of a drawing: the first view, its section as a row of strips, and the handles. */
export function dimensionRoom(
  layout: SheetLayout,
  drawing: SectionDrawing,
  transform: SheetTransform,
  handles: readonly Point[],
): DimensionRoom {
  const { section } = layout;
  const pad = 6;
  const { extents } = drawing.measures;
  return {
    area: {
      x: section.x + pad,
      y: section.y + pad,
      width: section.width - 2 * pad,
      height: section.height - 2 * pad,
    },
    top: transform.toY(extents.maxY),
    bottom: transform.toY(extents.minY),
    section: outlineStrips(drawing, transform),
    keepClear: handles.map((point) => {
      const { x, y } = pixel(transform, point);
      return { x: x - HANDLE_ROOM, y: y - HANDLE_ROOM, width: 2 * HANDLE_ROOM, height: 2 * HANDLE_ROOM };
    }),
    levels: layout.compact ? { first: 22, step: 21 } : { first: 27, step: 25 },
  };
}

/** Boxes that together cover the section, for texts to stay clear of. */
function outlineStrips({ contour, measures }: SectionDrawing, transform: SheetTransform): Box[] {
  const { minX, maxX } = measures.extents;
  const width = (maxX - minX) / STRIPS;
  const strips = Array.from({ length: STRIPS }, () => ({ top: Infinity, bottom: -Infinity }));
  for (let i = 0; i < contour.x.length; i++) {
    const at = ((contour.x[i] ?? 0) - minX) / width;
    const y = transform.toY(contour.y[i] ?? 0);
    for (const index of [Math.floor(at - 0.5), Math.floor(at + 0.5)]) {
      const strip = strips[Math.min(STRIPS - 1, Math.max(0, index))];
      if (!strip) continue;
      strip.top = Math.min(strip.top, y);
      strip.bottom = Math.max(strip.bottom, y);
    }
  }
  return strips.flatMap(({ top, bottom }, i) =>
    top <= bottom
      ? [
          {
            x: transform.toX(minX + i * width),
            y: top,
            width: width * transform.chordPixels,
            height: bottom - top,
          },
        ]
      : [],
  );
}
