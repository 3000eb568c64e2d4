import { type Polyline, areaOf, at, polylineOf } from './arrays.ts';
import { type Crossing, crossingsOf } from './crossings.ts';
import { type Face } from './panel.ts';

/** A contour moved in step: point k belongs to point k of the contour it was made from. */
export interface OffsetLine extends Polyline {
  /** Distance from the contour that each point was given, positive outwards, mm. */
  readonly distance: Float64Array;
  /** The unit normal along which each point was moved. */
  readonly nx: Float64Array;
  readonly ny: Float64Array;
  /** 1 where a point lay in a loop and now stands at the loop's crossing. */
  readonly collapsed: Uint8Array;
  /** Where both surfaces cross at the trailing edge and the offset contour ends; null when it reaches its own corners. */
  readonly tail: Tail | null;
}

/** The crossing of both surfaces at the trailing edge. */
export interface Tail {
  readonly x: number;
  readonly y: number;
  /** The points next to the crossing that stay. */
  readonly upper: number;
  readonly lower: number;
}

/** Share of a loop that may run against the contour before it counts as turned inside out. */
const TURNED = 0.01;

/**
 * Moves a contour in step: each point along its normal by `outwards` less its skin allowance, loops collapsed into their crossing, so that
 * the number of points stays. Outward corners are round.
 * @param outwards mm: half the kerf for the wire's path, 0 for the core
 * @param pinned points that take a known place instead
 * @returns null when nothing is left between the skins
 */
export function offsetInStep(face: Face, outwards: number, pinned?: Pinned): OffsetLine | null {
  const distance = face.skin.map((skin) => outwards - skin);
  const x = face.x.map((value, i) => value + at(distance, i) * at(face.nx, i));
  const y = face.y.map((value, i) => value + at(distance, i) * at(face.ny, i));
  for (const i of pinned?.points ?? []) {
    x[i] = pinned?.x ?? NaN;
    y[i] = pinned?.y ?? NaN;
  }
  const loopless = withoutLoops({ x, y }, face);
  if (!loopless) return null;
  const cleared = { ...loopless, distance, nx: face.nx, ny: face.ny };
  if (!pinned) return cleared;
  const { collapsed } = cleared;
  for (const i of pinned.points) collapsed[i] = 1;
  const [upper, lower] = [collapsed.indexOf(0), collapsed.lastIndexOf(0)];
  return { ...cleared, tail: { x: pinned.x, y: pinned.y, upper, lower } };
}

/**
 * A line round one that was moved already, each point farther along the same normal: the wire's path round the core. Where the core's points
 * have been collapsed into a sharp edge their normals still turn, so that the path goes round the edge in an arc and touches
 * it all the way.
 * @returns null when nothing is left, as in a gap of the core narrower than the kerf
 */
export function roundOffset(line: OffsetLine, by: number): OffsetLine | null {
  if (by === 0) return line;
  const { nx, ny } = line;
  const x = line.x.map((value, i) => value + by * at(nx, i));
  const y = line.y.map((value, i) => value + by * at(ny, i));
  const cleared = withoutLoops({ x, y }, line);
  return cleared && { ...cleared, distance: line.distance.map((value) => value + by), nx, ny };
}

/** Points that are to stand at a known place: the tail, once it is known where the surfaces meet. */
export interface Pinned {
  readonly points: readonly number[];
  readonly x: number;
  readonly y: number;
}

interface Cleared extends Polyline {
  readonly collapsed: Uint8Array;
  readonly tail: Tail | null;
}

/**
 * A closed polyline without its loops, in the same number of points: taken apart at its crossings into simple loops, of which the largest stays that
 * runs the way of the contour; the others collapse into their crossings.
 * @param contour what the line was moved from: the direction in which it must run
 * @returns null when no such loop is left
 */
export function withoutLoops(line: Polyline, contour: Polyline): Cleared | null {
  const crossings = crossingsOf(line);
  const loops = crossings.length === 0 ? [wholeLine(line)] : loopsOf(line, crossings);
  let body: Loop | null = null;
  for (const loop of loops) {
    if (!body || loop.area > body.area) if (loop.area > 0 && runsForward(line, contour, loop)) body = loop;
  }
  return body && collapsedTo(line, body);
}

/** A place on the line: a point of it (`crossing` −1) or a crossing, at a parameter that counts points and shares of segments. */
interface Stop {
  readonly parameter: number;
  readonly crossing: number;
  readonly x: number;
  readonly y: number;
}

interface Loop {
  readonly stops: readonly Stop[];
  /** Signed, mm². */
  readonly area: number;
}

function wholeLine(line: Polyline): Loop {
  const stops = Array.from(line.x, (x, i) => ({ parameter: i, crossing: -1, x, y: at(line.y, i) }));
  return { stops, area: areaOf(line) };
}

/** Walks the line once; whenever it comes to a crossing again, what lies between is a loop. */
function loopsOf(line: Polyline, crossings: readonly Crossing[]): Loop[] {
  const passes = crossings.flatMap(({ first, second, firstShare, secondShare, x, y }, crossing) => [
    { parameter: first + firstShare, crossing, x, y },
    { parameter: second + secondShare, crossing, x, y },
  ]);
  const stops = [...wholeLine(line).stops, ...passes].sort((a, b) => a.parameter - b.parameter);
  const loops: Loop[] = [];
  const open: Stop[] = [];
  for (const stop of stops) {
    const before = stop.crossing < 0 ? -1 : open.findLastIndex(({ crossing }) => crossing === stop.crossing);
    if (before >= 0) loops.push(loopOf([stop, ...open.splice(before).slice(1)]));
    open.push(stop);
  }
  return [...loops, loopOf(open)];
}

function loopOf(stops: readonly Stop[]): Loop {
  return { stops, area: areaOf(polylineOf(stops)) };
}

/** True when the loop runs along the contour: an offset deeper than the section turns it round. */
function runsForward(line: Polyline, contour: Polyline, { stops }: Loop): boolean {
  let [forward, backward] = [0, 0];
  stops.forEach((stop, k) => {
    const next = stops[(k + 1) % stops.length];
    if (!next || stop.crossing >= 0 || next.crossing >= 0 || next.parameter !== stop.parameter + 1) return;
    const [i, j] = [stop.parameter, next.parameter];
    const [dx, dy] = [at(line.x, j) - at(line.x, i), at(line.y, j) - at(line.y, i)];
    const along = dx * (at(contour.x, j) - at(contour.x, i)) + dy * (at(contour.y, j) - at(contour.y, i));
    if (along >= 0) forward += Math.hypot(dx, dy);
    else backward += Math.hypot(dx, dy);
  });
  return forward > 0 && backward <= TURNED * (forward + backward);
}

/** The line with the points outside the body moved to the crossing at which the body leaves them out. */
function collapsedTo(line: Polyline, { stops }: Loop): Cleared {
  const count = line.x.length;
  const [x, y] = [line.x.slice(), line.y.slice()];
  const collapsed = new Uint8Array(count);
  const start = stops.findIndex(({ crossing }) => crossing < 0);
  const ordered = [...stops.slice(start), ...stops.slice(0, start)];
  let tail: Tail | null = null;
  let [last, from] = [at([ordered[0]?.parameter ?? 0], 0), null as Stop | null];
  for (const stop of [...ordered.slice(1), ...ordered.slice(0, 1)]) {
    if (stop.crossing >= 0) {
      // Between two crossings without a point of the body, the points go to the first of them.
      from ??= stop;
      continue;
    }
    for (let i = (last + 1) % count; from && i !== stop.parameter; i = (i + 1) % count) {
      [x[i], y[i], collapsed[i]] = [from.x, from.y, 1];
    }
    if (from && last >= stop.parameter) tail = { x: from.x, y: from.y, upper: stop.parameter, lower: last };
    [last, from] = [stop.parameter, null];
  }
  return { x, y, collapsed, tail };
}
