import { at } from './arrays.ts';
import { type Chain, type Face, type Panel } from './panel.ts';
import { type OffsetLine, type Tail, offsetInStep } from './offset.ts';
import { type PlacedSection, type Surface, surfacePoint } from './placing.ts';
import { type End } from './plan.ts';
import { PART } from './row.ts';

type Both<T> = Readonly<Record<End, T>>;

/** Where the offset surfaces of a section meet, on the true curves. */
interface Meeting {
  readonly x: number;
  readonly y: number;
  readonly stations: Readonly<Record<Surface, number>>;
}

/** The zone in which stations pass over from equal ones to those of the meeting points is this many times their difference long. */
const ZONE = 4;
const LEAST_ZONE = 0.02;

/**
 * Moves the contours of both ends in step. Where two surfaces meet ahead of the trailing edge they do so at different stations of root and tip.
 * So that neither end of the wire stands, the last rulings join points in proportion between the last equal station and the
 * meeting points instead of equal stations.
 * @param outwards mm, before the skin is taken off
 * @param keep stations that must stay equal, if the moved contour reaches them
 */
export function offsetBoth(
  panel: Panel,
  outwards: Both<number>,
  keep: readonly number[],
): Both<OffsetLine | null> {
  const { chain } = panel;
  const raw = {
    root: offsetInStep(chain.root, outwards.root),
    tip: offsetInStep(chain.tip, outwards.tip),
  };
  if (!raw.root?.tail && !raw.tip?.tail) return raw;
  const last = Math.max(...chain.station);
  const knot = (end: End): Knot => {
    const tail = raw[end]?.tail;
    const meet = tail ? meeting(panel[end], chain, chain[end], tail, outwards[end]) : null;
    return { meet, stations: meet?.stations ?? { upper: last, lower: last } };
  };
  const knots = { root: knot('root'), tip: knot('tip') };
  const from = zoneStart(knots, keep);
  const line = (end: End) => raw[end] && (joined(panel, end, outwards[end], knots[end], from) ?? raw[end]);
  return { root: line('root'), tip: line('tip') };
}

/** Where an offset ends: at its meeting point, or at the contour's own end. */
interface Knot {
  readonly meet: Meeting | null;
  readonly stations: Readonly<Record<Surface, number>>;
}

function zoneStart({ root, tip }: Both<Knot>, keep: readonly number[]): number {
  const stations = [root, tip].flatMap((of) => [of.stations.upper, of.stations.lower]);
  const first = Math.min(...stations);
  const spread = Math.max(
    Math.abs(root.stations.upper - tip.stations.upper),
    Math.abs(root.stations.lower - tip.stations.lower),
  );
  const wanted = first - Math.max(LEAST_ZONE, ZONE * spread);
  return Math.max(first / 2, wanted, ...keep.filter((station) => station < first));
}

const STEP = 1e-4;
const MOST_STEPS = 12;
const CLOSE_MM = 1e-9;

/** Newton's method for the two curve parameters at which the moved surfaces have the same point. */
function meeting(
  section: PlacedSection,
  chain: Chain,
  face: Face,
  tail: Tail,
  outwards: number,
): Meeting | null {
  const moved = (surface: Surface, t: number) => {
    const index = surface === 'upper' ? tail.upper : tail.lower;
    const { x, y, nx, ny } = surfacePoint(section, surface, t);
    const by = outwards - at(face.skin, index);
    return { x: x + by * nx, y: y + by * ny };
  };
  let u = section.upper.parameterAt(at(chain.station, tail.upper));
  let l = section.lower.parameterAt(at(chain.station, tail.lower));
  for (let step = 0; step < MOST_STEPS; step++) {
    const [a, b] = [moved('upper', u), moved('lower', l)];
    const [ex, ey] = [b.x - a.x, b.y - a.y];
    if (Math.hypot(ex, ey) < CLOSE_MM) {
      return { ...a, stations: { upper: section.upper.stationAt(u), lower: section.lower.stationAt(l) } };
    }
    const [a1, b1] = [moved('upper', u - STEP), moved('lower', l - STEP)];
    const [ax, ay] = [(a.x - a1.x) / STEP, (a.y - a1.y) / STEP];
    const [bx, by] = [(b.x - b1.x) / STEP, (b.y - b1.y) / STEP];
    const det = ax * by - ay * bx;
    if (det === 0) return null;
    u = Math.min(1, Math.max(2 * STEP, u + (ex * by - ey * bx) / det));
    l = Math.min(1, Math.max(2 * STEP, l + (ex * ay - ey * ax) / det));
  }
  return null;
}

/** The offset with the rulings behind `from` led to the end's knot. */
function joined(
  panel: Panel,
  end: End,
  outwards: number,
  { meet, stations }: Knot,
  from: number,
): OffsetLine | null {
  const { station, part } = panel.chain;
  const face = panel.chain[end];
  const [x, y, nx, ny] = [face.x.slice(), face.y.slice(), face.nx.slice(), face.ny.slice()];
  const last = Math.max(...station);
  const pinned: number[] = [];
  for (let i = 0; i < station.length; i++) {
    if (part[i] === PART.nose) continue;
    const surface = part[i] === PART.upper ? 'upper' : part[i] === PART.lower ? 'lower' : null;
    const share = surface ? (at(station, i) - from) / (last - from) : 1;
    if (meet && share >= 1) pinned.push(i);
    if (!surface || share <= 0) continue;
    const own = from + share * (stations[surface] - from);
    const point = surfacePoint(panel[end], surface, panel[end][surface].parameterAt(own));
    [x[i], y[i], nx[i], ny[i]] = [point.x, point.y, point.nx, point.ny];
  }
  if (meet) turnSteadily(nx, ny, pinned);
  const moved = { ...face, x, y, nx, ny };
  return meet
    ? offsetInStep(moved, outwards, { points: pinned, x: meet.x, y: meet.y })
    : offsetInStep(moved, outwards);
}

/**
 * Makes the normals of the pinned points turn one way alone, from the lower surface's where it ends round the edge to the upper's, whatever turns
 * the contour makes behind.
 */
function turnSteadily(nx: Float64Array, ny: Float64Array, pinned: readonly number[]): void {
  // The chain begins in the middle of the tail: what stands before the largest gap between the indices comes after the rest.
  const gaps = pinned.map((i, k) => (pinned[k + 1] ?? i) - i);
  const cut = gaps.indexOf(Math.max(...gaps)) + 1;
  const order = [...pinned.slice(cut), ...pinned.slice(0, cut)];
  const [first, last] = [order[0], order.at(-1)];
  if (first === undefined || last === undefined) return;
  const start = Math.atan2(at(ny, first), at(nx, first));
  const turned = (i: number) => turnOf(Math.atan2(at(ny, i), at(nx, i)) - start);
  const most = turned(last);
  let reached = 0;
  for (const i of order) {
    reached = Math.min(most, Math.max(reached, turned(i)));
    [nx[i], ny[i]] = [Math.cos(start + reached), Math.sin(start + reached)];
  }
}

/** An angle as one from −90° to 270°: normals never turn back by a quarter. */
function turnOf(angle: number): number {
  return angle - 2 * Math.PI * Math.floor((angle + Math.PI / 2) / (2 * Math.PI));
}
