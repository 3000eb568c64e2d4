import { type Point } from '../point.ts';
import { splineThrough } from '../shapes/spline.ts';
import { type NurbsCurve, arcPoints, bulgeArc, nurbsPoints } from './dxf-curves.ts';
import { type DxfEntity } from './dxf-entities.ts';
import { type DxfGroup, dxfNumber } from './dxf-groups.ts';
import { IMPORT_LIMITS, ImportRefusal } from './refusal.ts';

/** Shares of the size of the drawing. */
const SHARE = {
  /** How far chords may lie from an arc or a spline; the curve through the points is closer still. */
  chord: 2e-6,
  /** Straight lines longer than this are lines, not steps between points of a curve, and are divided into pieces. */
  line: 0.1,
  piece: 0.02,
  flat: 1e-6,
} as const;

/** Every number of a code, in order. */
function all(groups: readonly DxfGroup[], code: number): number[] {
  return groups.filter((group) => group.code === code).map(dxfNumber);
}

function one(groups: readonly DxfGroup[], code: number, otherwise: number): number {
  const group = groups.find((candidate) => candidate.code === code);
  return group ? dxfNumber(group) : otherwise;
}

function broken({ type, line }: DxfEntity, what: string): ImportRefusal {
  return new ImportRefusal('broken-drawing', `The ${type} at line ${line} ${what}.`, line);
}

/** The points of two codes, x and y. */
function pointsBy(entity: DxfEntity, groups: readonly DxfGroup[], codeX: number): Point[] {
  const [xs, ys] = [all(groups, codeX), all(groups, codeX + 10)];
  if (xs.length !== ys.length) throw broken(entity, 'has not as many y as x ordinates');
  return xs.map((x, i) => ({ x, y: ys[i] ?? 0 }));
}

/**
 * What an entity is drawn by: ends, vertices, control points; an arc by the box around its circle.
 * @throws ImportRefusal when it lacks them, or does not lie in the XY plane
 */
export function definingPoints(entity: DxfEntity): Point[] {
  const { type, groups } = entity;
  refuseTilted(entity);
  if (type === 'ARC') {
    const [[centre], radius] = [pointsBy(entity, groups, 10), one(groups, 40, 0)];
    if (!centre || !(radius > 0)) throw broken(entity, 'has no centre or radius');
    return [
      { x: centre.x - radius, y: centre.y - radius },
      { x: centre.x + radius, y: centre.y + radius },
    ];
  }
  if (type === 'POLYLINE') return polylineVertices(entity).map(({ point }) => point);
  return [...pointsBy(entity, groups, 10), ...(type === 'LWPOLYLINE' ? [] : pointsBy(entity, groups, 11))];
}

/** An outline is drawn in the XY plane, or in one parallel to it. */
function refuseTilted(entity: DxfEntity): void {
  const groups = [...entity.groups, ...entity.vertices.flat()];
  const [nx, ny] = [one(groups, 210, 0), one(groups, 220, 0)];
  const heights = entity.type === 'LWPOLYLINE' ? [] : [...all(groups, 30), ...all(groups, 31)];
  // The head of a POLYLINE holds its elevation, its vertices their own heights: those of a flat one are equal.
  const [low, high] = heights.reduce(([a, b], z) => [Math.min(a, z), Math.max(b, z)], [Infinity, -Infinity]);
  const tilted = Math.hypot(nx, ny) > SHARE.flat;
  const widths = [...all(groups, 10), ...all(groups, 11)].map(Math.abs);
  const size = widths.reduce((a, b) => Math.max(a, b), 0);
  if (!tilted && !(high - low > SHARE.flat * size && entity.type !== 'POLYLINE')) return;
  const message = `The ${entity.type} at line ${entity.line} does not lie in the XY plane.`;
  throw new ImportRefusal('not-a-section', message, entity.line);
}

interface Drawn {
  readonly points: readonly Point[];
  /** Whether a long straight line was divided into pieces. */
  readonly divided: boolean;
}

/**
 * Points along an entity; a closed one comes back to its first.
 * @param size of the drawing, in its unit: curves are followed to a share of it
 * @throws ImportRefusal when the entity breaks the rules of the format
 */
export function drawnPoints(entity: DxfEntity, size: number): Drawn {
  const { groups } = entity;
  const mirrored = one(groups, 230, 1) < 0;
  const drawn = drawnUnturned(entity, size);
  // Seen from below, with the normal pointing down, x runs the other way (arbitrary axis algorithm of the DXF reference).
  const turns = mirrored && entity.type !== 'LINE' && entity.type !== 'SPLINE';
  return turns ? { ...drawn, points: drawn.points.map(({ x, y }) => ({ x: -x, y })) } : drawn;
}

function drawnUnturned(entity: DxfEntity, size: number): Drawn {
  const { type, groups } = entity;
  if (type === 'LINE') {
    const [a] = pointsBy(entity, groups, 10);
    const [b] = pointsBy(entity, groups, 11);
    if (!a || !b) throw broken(entity, 'has no two ends');
    return straight(a, b, size);
  }
  if (type === 'ARC') return { points: arcOf(entity, size), divided: false };
  if (type === 'SPLINE') return { points: splineOf(entity, size), divided: false };
  return polylineOf(type === 'POLYLINE' ? polylineVertices(entity) : lightVertices(entity), entity, size);
}

function straight(a: Point, b: Point, size: number): Drawn {
  const length = Math.hypot(b.x - a.x, b.y - a.y);
  if (length <= SHARE.line * size) return { points: [a, b], divided: false };
  const pieces = Math.ceil(length / (SHARE.piece * size));
  const points = Array.from({ length: pieces + 1 }, (_, i) => {
    const share = i / pieces;
    return { x: (1 - share) * a.x + share * b.x, y: (1 - share) * a.y + share * b.y };
  });
  return { points, divided: true };
}

function arcOf(entity: DxfEntity, size: number): Point[] {
  const { groups } = entity;
  const [centre = { x: 0, y: 0 }] = pointsBy(entity, groups, 10);
  const radians = (code: number) => (one(groups, code, 0) * Math.PI) / 180;
  const start = radians(50);
  const turn = (radians(51) - start) % (2 * Math.PI);
  const sweep = turn <= 0 ? turn + 2 * Math.PI : turn;
  return arcPoints({ centre, radius: one(groups, 40, 1), start, sweep }, SHARE.chord * size);
}

interface Vertex {
  readonly point: Point;
  readonly bulge: number;
}

/** Vertices of a curve fitted to a polyline are flagged 8 or 1, those of its frame 16, faces of a mesh 64 and 128. */
const FRAME = 16;
const MESH = 64 | 128;

function polylineVertices(entity: DxfEntity): Vertex[] {
  return entity.vertices.flatMap((groups): Vertex[] => {
    const flags = one(groups, 70, 0);
    if ((flags & (FRAME | MESH)) !== 0 && (flags & MESH) !== MESH) return [];
    return [{ point: { x: one(groups, 10, 0), y: one(groups, 20, 0) }, bulge: one(groups, 42, 0) }];
  });
}

function lightVertices(entity: DxfEntity): Vertex[] {
  const vertices: { x: number; y: number; bulge: number }[] = [];
  for (const group of entity.groups) {
    const last = vertices.at(-1);
    if (group.code === 10) vertices.push({ x: dxfNumber(group), y: 0, bulge: 0 });
    else if (group.code === 20 && last) last.y = dxfNumber(group);
    else if (group.code === 42 && last) last.bulge = dxfNumber(group);
  }
  return vertices.map(({ x, y, bulge }) => ({ point: { x, y }, bulge }));
}

function polylineOf(vertices: readonly Vertex[], entity: DxfEntity, size: number): Drawn {
  const closed = (one(entity.groups, 70, 0) & 1) === 1;
  const way = closed ? [...vertices, ...vertices.slice(0, 1)] : vertices;
  // Only where some sides are arcs, the straight ones are meant as lines; else all are steps between points of a curve.
  const exact = vertices.some(({ bulge }) => bulge !== 0);
  const points: Point[] = way.slice(0, 1).map(({ point }) => point);
  let divided = false;
  for (let i = 1; i < way.length; i++) {
    const [from, to] = [way[i - 1], way[i]];
    if (!from || !to) continue;
    const side = sideOf(from, to, exact, size);
    divided ||= side.divided;
    for (const point of side.points.slice(1)) points.push(point);
    if (points.length > IMPORT_LIMITS.points.max) break;
  }
  return { points, divided };
}

/** Tangents of a quarter of an angle beyond which a side is no arc that anyone drew, or as good as straight. */
const BULGE = { least: 1e-9, most: 1e3 } as const;

function sideOf(from: Vertex, to: Vertex, exact: boolean, size: number): Drawn {
  const [a, b] = [from.point, to.point];
  const bulge = Math.abs(from.bulge);
  if (bulge > BULGE.least && bulge < BULGE.most && (a.x !== b.x || a.y !== b.y)) {
    const points = arcPoints(bulgeArc(a, b, from.bulge), SHARE.chord * size);
    return { points: [a, ...points.slice(1, -1), b], divided: false };
  }
  return exact ? straight(a, b, size) : { points: [a, b], divided: false };
}

const HIGHEST_DEGREE = 11;
const PIECES_BETWEEN_FIT_POINTS = 8;

function splineOf(entity: DxfEntity, size: number): Point[] {
  const { groups } = entity;
  const control = pointsBy(entity, groups, 10);
  if (control.length === 0) return throughFitPoints(entity);
  const degree = one(groups, 71, 3);
  const knots = all(groups, 40);
  const weights = all(groups, 41);
  if (!Number.isInteger(degree) || degree < 1 || degree > HIGHEST_DEGREE) {
    throw broken(entity, `is of degree ${degree}; 1 to ${HIGHEST_DEGREE} are read`);
  }
  if (control.length <= degree || knots.length !== control.length + degree + 1) {
    throw broken(entity, 'has numbers of knots and control points that do not belong together');
  }
  if (knots.some((knot, i) => i > 0 && knot < (knots[i - 1] ?? knot)))
    throw broken(entity, 'has falling knots');
  if (weights.length !== 0 && (weights.length !== control.length || !weights.every((weight) => weight > 0))) {
    throw broken(entity, 'has weights that are missing or not above 0');
  }
  const curve: NurbsCurve = {
    degree,
    knots,
    control,
    weights: weights.length > 0 ? weights : control.map(() => 1),
  };
  return nurbsPoints(curve, SHARE.chord * size, IMPORT_LIMITS.points.max);
}

/** The smooth curve through fit points when a drawing gives no control points. */
function throughFitPoints(entity: DxfEntity): Point[] {
  const points = pointsBy(entity, entity.groups, 11).filter(
    ({ x, y }, i, list) => i === 0 || x !== list[i - 1]?.x || y !== list[i - 1]?.y,
  );
  if (points.length < 3) throw broken(entity, 'has too few points');
  const spline = splineThrough(
    points.map(({ x }) => x),
    points.map(({ y }) => y),
  );
  return points.slice(1).reduce<Point[]>(
    (drawn, _, i) => {
      const [from, to] = [spline.knots[i] ?? 0, spline.knots[i + 1] ?? 0];
      for (let k = 1; k <= PIECES_BETWEEN_FIT_POINTS; k++) {
        const { x, y } = spline.at(from + ((to - from) * k) / PIECES_BETWEEN_FIT_POINTS);
        drawn.push({ x, y });
      }
      return drawn;
    },
    points.slice(0, 1),
  );
}
