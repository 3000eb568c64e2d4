import { type Point } from '../point.ts';
import { crossingSides } from '../shapes/simple-polygon.ts';
import { type Chain, type SourcePoint, apart } from './chains.ts';
import { ImportRefusal } from './refusal.ts';

/** An outline in order: upper trailing edge → nose → lower trailing edge. A sharp trailing edge stands at both ends. */
export interface OrderedLoop {
  readonly points: Chain;
  readonly sharp: boolean;
  /** The nose pointed right. */
  readonly mirrored: boolean;
  /** The loop ran clockwise. */
  readonly reversed: boolean;
  /** Points between both ends of the trailing-edge face, left out. */
  readonly facePoints: number;
}

/** Thicker than this share of its length, an outline is no wing section. */
const THICKEST = 0.6;
/** Less area than this share of the squared length is none. */
const LEAST_AREA = 1e-5;

/**
 * Puts a closed way round a section in order: finds its trailing edge and which end is the nose, turns the way counter-clockwise and
 * begins it at the upper trailing edge.
 * @param loop each point once, the last joined to the first
 * @param list whether it begins where a list of points does: mostly at the trailing edge
 * @throws ImportRefusal when the outline encloses nothing, is too thick, or crosses itself
 */
export function orderLoop(loop: Chain, list = false): OrderedLoop {
  const area = areaOf(loop);
  const turned = area < 0 ? loop.toReversed() : loop;
  const ends = farthestEnds(turned);
  refuseFlat(turned, ends, Math.abs(area));
  const edge = trailingEnd(turned, ends, list ? loop[0] : undefined);
  const nose = edge === ends.a ? ends.b : ends.a;
  const [e, n] = [at(turned, edge), at(turned, nose)];
  const mirrored = e.x < n.x;
  const points = mirrored ? turned.map(({ x, y, line }) => ({ x: -x, y, line })).reverse() : turned;
  const start = mirrored ? points.length - 1 - edge : edge;
  const listed = list ? closingFace(points, start, loop) : null;
  const ordered = fromTrailingEdge(
    points,
    listed ?? faceAt(points, start, mirrored ? { x: -n.x, y: n.y } : n),
  );
  const crossing = crossingOf(ordered);
  if (crossing) throw crossing;
  return { ...ordered, mirrored, reversed: area < 0 };
}

function at(points: Chain, index: number): SourcePoint {
  const count = points.length;
  return points[((index % count) + count) % count] ?? { x: 0, y: 0, line: 0 };
}

function areaOf(loop: Chain): number {
  // About the first point: an outline far from the origin keeps its digits.
  const origin = at(loop, 0);
  let twice = 0;
  loop.forEach((point, i) => {
    const next = at(loop, i + 1);
    twice += (point.x - origin.x) * (next.y - origin.y) - (next.x - origin.x) * (point.y - origin.y);
  });
  return twice / 2;
}

interface Ends {
  readonly a: number;
  readonly b: number;
  readonly length: number;
}

const MOST_SWEEPS = 20;

/** The points farthest from each other: from the farthest to the farthest until that grows no more. */
function farthestEnds(loop: Chain): Ends {
  let [a, b, length] = [0, 0, -1];
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let [best, distance] = [a, -1];
    const from = at(loop, a);
    loop.forEach((point, i) => {
      const reach = apart(point, from);
      if (reach > distance) [best, distance] = [i, reach];
    });
    if (!(distance > length)) break;
    [a, b, length] = [best, a, distance];
  }
  return { a, b, length };
}

function refuseFlat(loop: Chain, { a, b, length }: Ends, area: number): void {
  if (!(length > 0) || !(area > LEAST_AREA * length * length)) {
    throw new ImportRefusal('not-a-section', 'The points lie on a line: they enclose no section.');
  }
  const [from, to] = [at(loop, a), at(loop, b)];
  let [low, high] = [Infinity, -Infinity];
  for (const { x, y } of loop) {
    const height = ((to.x - from.x) * (y - from.y) - (to.y - from.y) * (x - from.x)) / length;
    [low, high] = [Math.min(low, height), Math.max(high, height)];
  }
  if (high - low > THICKEST * length) {
    const share = Math.round((100 * (high - low)) / length);
    throw new ImportRefusal(
      'not-a-section',
      `The outline is ${share} % as thick as long; a section may have ${100 * THICKEST} %.`,
    );
  }
}

/** Distances from an end, in shares of the length, at which the outline is gauged. */
const GAUGES = [0.015, 0.04];
/** An end that is so much thinner than the other is the trailing edge, even when it is on the left. */
const THINNER = 0.5;

/** A list that begins so near to an end, in shares of the length, begins there. */
const BEGINS = 0.02;

/** Which end is the trailing edge: where the list begins, else the right one; but not when the other is far thinner and this no face. */
function trailingEnd(loop: Chain, { a, b, length }: Ends, begin: Point | undefined): number {
  const right = at(loop, a).x >= at(loop, b).x ? a : b;
  const likely = [a, b].find((end) => apart(at(loop, end), begin) < BEGINS * length) ?? right;
  const other = likely === a ? b : a;
  const thinner = GAUGES.every(
    (share) =>
      widthAt(loop, other, likely, share * length) < THINNER * widthAt(loop, likely, other, share * length),
  );
  return thinner && !hasFace(loop, likely, other) ? other : likely;
}

/** The extent of the outline square to the line from one end to the other, at a distance from the first. */
function widthAt(loop: Chain, from: number, to: number, distance: number): number {
  const [e, o] = [at(loop, from), at(loop, to)];
  const length = apart(e, o);
  const [ux, uy] = [(o.x - e.x) / length, (o.y - e.y) / length];
  let [low, high] = [Infinity, -Infinity];
  loop.forEach((p, i) => {
    const q = at(loop, i + 1);
    const [sp, sq] = [along(p) - distance, along(q) - distance];
    if (sp * sq > 0 || sp === sq) return;
    const share = sp / (sp - sq);
    const height = (1 - share) * across(p) + share * across(q);
    [low, high] = [Math.min(low, height), Math.max(high, height)];
  });
  return high > low ? high - low : 0;

  function along({ x, y }: Point): number {
    return (x - e.x) * ux + (y - e.y) * uy;
  }
  function across({ x, y }: Point): number {
    return (y - e.y) * ux - (x - e.x) * uy;
  }
}

/** Shares of the length. */
const FACE = { longest: 0.12, flat: 1e-3, leastForNose: 0.01 } as const;
/** A side steeper than 60° against the chord belongs to the trailing-edge face. */
const STEEP = 0.5;
/** A face ends in two corners of more than 45°: a coarsely drawn nose is no face. */
const CORNER = Math.PI / 4;

interface Face {
  readonly upper: number;
  readonly lower: number;
}

/** The trailing-edge face about an end: how far the steep sides reach on either side of it, if they are straight. */
function faceAt(loop: Chain, end: number, nose: Point): Face {
  const e = at(loop, end);
  const length = apart(e, nose);
  const [ux, uy] = [(e.x - nose.x) / length, (e.y - nose.y) / length];
  const reach = (step: 1 | -1): number => {
    let [index, way] = [end, 0];
    for (let k = 0; k < loop.length; k++) {
      const [p, q] = [at(loop, index), at(loop, index + step)];
      const side = apart(p, q);
      way += side;
      const steep = Math.abs((q.x - p.x) * ux + (q.y - p.y) * uy) < STEEP * side;
      if (!steep || way > FACE.longest * length) return index;
      index += step;
    }
    return index;
  };
  const [upper, lower] = [reach(1), reach(-1)];
  const [u, l] = [at(loop, upper), at(loop, lower)];
  const width = apart(u, l);
  for (let i = lower + 1; i < upper; i++) {
    const p = at(loop, i);
    const height = Math.abs((u.x - l.x) * (p.y - l.y) - (u.y - l.y) * (p.x - l.x)) / width;
    if (height > FACE.flat * length) return { upper: end, lower: end };
  }
  const corners = [upper, lower].every((index) => turnAt(loop, index) > CORNER);
  return corners ? { upper, lower } : { upper: end, lower: end };
}

/** The side from the last point of a list to its first, when it is the trailing-edge face, however oblique. */
function closingFace(points: Chain, end: number, list: Chain): Face | null {
  const count = points.length;
  const [begin, finish] = [list[0], list.at(-1)].map((one) =>
    points.findIndex(({ line }) => line === one?.line),
  );
  if (begin === undefined || finish === undefined) return null;
  const ordered = (finish + 1) % count === begin ? [begin, finish] : [finish, begin];
  const [upper = 0, lower = 0] = ordered;
  const nearEnd = [upper, lower].some((index) => index === end);
  const width = apart(at(points, upper), at(points, lower));
  const short = width < FACE.longest * apart(at(points, end), at(points, end + Math.floor(count / 2)));
  if (!nearEnd || !short || [upper, lower].some((index) => turnAt(points, index) < CORNER)) return null;
  return { upper: upper < lower ? upper + count : upper, lower };
}

/** The angle by which the way turns at a point, radians. */
function turnAt(loop: Chain, index: number): number {
  const [a, b, c] = [at(loop, index - 1), at(loop, index), at(loop, index + 1)];
  const [px, py, qx, qy] = [b.x - a.x, b.y - a.y, c.x - b.x, c.y - b.y];
  return Math.abs(Math.atan2(px * qy - py * qx, px * qx + py * qy));
}

function hasFace(loop: Chain, end: number, other: number): boolean {
  const face = faceAt(loop, end, at(loop, other));
  const length = apart(at(loop, end), at(loop, other));
  return apart(at(loop, face.upper), at(loop, face.lower)) > FACE.leastForNose * length;
}

type EdgeLoop = Pick<OrderedLoop, 'points' | 'sharp' | 'facePoints'>;

/** The points from the upper trailing edge round the nose to the lower. */
function fromTrailingEdge(loop: Chain, { upper, lower }: Face): EdgeLoop {
  const inside = Math.max(0, upper - lower - 1);
  const count = loop.length - inside;
  const points = Array.from({ length: count }, (_, i) => at(loop, upper + i));
  const sharp = upper === lower;
  return { points: sharp ? [...points, at(loop, upper)] : points, sharp, facePoints: inside };
}

function crossingOf({ points, sharp }: EdgeLoop): ImportRefusal | null {
  const loop = sharp ? points.slice(0, -1) : points;
  const found = crossingSides(
    loop.map(({ x }) => x),
    loop.map(({ y }) => y),
  );
  if (!found) return null;
  const [first, second] = [at(loop, found[0]).line, at(loop, found[1]).line];
  const [low, high] = [Math.min(first, second), Math.max(first, second)];
  const message = `The outline crosses or touches itself: behind line ${low} and behind line ${high}.`;
  return new ImportRefusal('crossing', message, low);
}
