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
 * Moves the contours of both ends in step, by several amounts at once: the core and the wire's path round it. Where two surfaces meet ahead of the
 * trailing edge they do so at different stations of root and tip. So that neither end of the wire stands, the last rulings join
 * points in proportion between the last equal station and the meeting points instead of equal stations; core and path share these rulings.
 * @param outwards mm, before the skin is taken off; each amount not below the one before it
 * @param keep stations that must stay equal, if the core reaches them
 */
export function offsetBoth(
  panel: Panel,
  outwards: readonly Both<number>[],
  keep: readonly number[],
): Both<OffsetLine | null>[] {
  const { chain } = panel;
  const raw = outwards.map((by) => ({
    root: offsetInStep(chain.root, by.root),
    tip: offsetInStep(chain.tip, by.tip),
  }));
  if (raw.every(({ root, tip }) => !root?.tail && !tip?.tail)) return raw;
  const last = Math.max(...chain.station);
  const knots = raw.map((of, k) => {
    const knot = (end: End): Knot => {
      const tail = of[end]?.tail;
      const meet = tail ? meeting(panel[end], chain, chain[end], tail, outwards[k]?.[end] ?? 0) : null;
      return { meet, stations: meet?.stations ?? { upper: last, lower: last } };
    };
    return { root: knot('root'), tip: knot('tip') };
  });
  const from = zoneStart(knots, keep);
  const shares = sharesOf(knots, from);
  return raw.map((of, k) => {
    const line = (end: End) => {
      if (!of[end]) return null;
      const path = [...knots.slice(0, k + 1)].map((knot) => knot[end]);
      return joined(panel, end, outwards[k]?.[end] ?? 0, path, shares, from) ?? of[end];
    };
    return { root: line('root'), tip: line('tip') };
  });
}

/** Where one offset ends: at its meeting point, or at the contour's own end. */
interface Knot {
  readonly meet: Meeting | null;
  readonly stations: Readonly<Record<Surface, number>>;
}

function zoneStart(knots: readonly Both<Knot>[], keep: readonly number[]): number {
  const stations = knots.flatMap(({ root, tip }) =>
    [root, tip].flatMap((of) => [of.stations.upper, of.stations.lower]),
  );
  const first = Math.min(...stations);
  const spread = Math.max(
    ...knots.flatMap(({ root, tip }) =>
      (['upper', 'lower'] as const).map((surface) =>
        Math.abs(root.stations[surface] - tip.stations[surface]),
      ),
    ),
  );
  const wanted = first - Math.max(LEAST_ZONE, ZONE * spread);
  return Math.max(first / 2, wanted, ...keep.filter((station) => station < first));
}

/** Which share of the zone's rulings ends at each knot: in proportion to the mean of its stations. */
function sharesOf(knots: readonly Both<Knot>[], from: number): number[] {
  const means = knots.map(
    ({ root, tip }) =>
      (root.stations.upper + root.stations.lower + tip.stations.upper + tip.stations.lower) / 4 - from,
  );
  const end = means.at(-1) ?? 1;
  return means.map((mean, k) => (k === means.length - 1 ? 1 : Math.min(1, Math.max(0.1, mean / end))));
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

/** The offset with the rulings behind `from` led over the knots to the last of them. */
function joined(
  panel: Panel,
  end: End,
  outwards: number,
  knots: readonly Knot[],
  shares: readonly number[],
  from: number,
): OffsetLine | null {
  const { station, part } = panel.chain;
  const face = panel.chain[end];
  const [x, y, nx, ny] = [face.x.slice(), face.y.slice(), face.nx.slice(), face.ny.slice()];
  const last = Math.max(...station);
  const meet = knots.at(-1)?.meet;
  const ends = shares[knots.length - 1] ?? 1;
  const pinned: number[] = [];
  for (let i = 0; i < station.length; i++) {
    if (part[i] === PART.nose) continue;
    const surface = part[i] === PART.upper ? 'upper' : part[i] === PART.lower ? 'lower' : null;
    const share = surface ? (at(station, i) - from) / (last - from) : 1;
    if (meet && share >= ends) pinned.push(i);
    else if (surface && share > 0) {
      const own = stationOn(knots, shares, surface, from, share);
      const point = surfacePoint(panel[end], surface, panel[end][surface].parameterAt(own));
      [x[i], y[i], nx[i], ny[i]] = [point.x, point.y, point.nx, point.ny];
    }
  }
  const moved = { ...face, x, y, nx, ny };
  return meet
    ? offsetInStep(moved, outwards, { points: pinned, x: meet.x, y: meet.y })
    : offsetInStep(moved, outwards);
}

/** The end's own station at a share of the zone: straight from knot to knot. */
function stationOn(
  knots: readonly Knot[],
  shares: readonly number[],
  surface: Surface,
  from: number,
  share: number,
): number {
  let [lowShare, low] = [0, from];
  for (let k = 0; k < knots.length; k++) {
    const [highShare, high] = [shares[k] ?? 1, knots[k]?.stations[surface] ?? 1];
    if (share <= highShare || k === knots.length - 1) {
      const part = highShare > lowShare ? (share - lowShare) / (highShare - lowShare) : 1;
      return low + Math.min(1, part) * (high - low);
    }
    [lowShare, low] = [highShare, high];
  }
  return low;
}
