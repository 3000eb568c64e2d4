import { type Point } from '../point.ts';
import { ImportRefusal } from './refusal.ts';

/** A point with the line of the file that it stands on. */
export interface SourcePoint extends Point {
  readonly line: number;
}

/** Points that follow each other in a file. */
export type Chain = readonly SourcePoint[];

/** Shares of the size of all points. */
const TOLERANCE = {
  /** Nearer neighbours are one point. */
  repeated: 1e-9,
  /** Both connections of two open chains together may be so long: nose and trailing edge of surfaces that stop short. */
  bridged: 0.3,
} as const;

/** The diagonal of the box around all points; 0 without any. */
export function sizeOf(chains: readonly Chain[]): number {
  let [minX, maxX, minY, maxY] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const chain of chains) {
    for (const { x, y } of chain) {
      if (x < minX) minX = x;
      if (x > maxX) maxX = x;
      if (y < minY) minY = y;
      if (y > maxY) maxY = y;
    }
  }
  return minX > maxX ? 0 : Math.hypot(maxX - minX, maxY - minY);
}

export function apart(a: Point | undefined, b: Point | undefined): number {
  return a && b ? Math.hypot(a.x - b.x, a.y - b.y) : Infinity;
}

/** A chain without neighbours that coincide. @returns the chain and how many points were left out */
export function withoutDuplicates(
  chain: Chain,
  size: number,
): { readonly chain: Chain; readonly removed: number } {
  const kept: SourcePoint[] = [];
  for (const point of chain) {
    if (apart(kept.at(-1), point) > TOLERANCE.repeated * size) kept.push(point);
  }
  return { chain: kept, removed: chain.length - kept.length };
}

/** Cosine of the angle by which the way turns at b: −1 straight back. */
function straightness(a: Point, b: Point, c: Point): number {
  const [px, py, qx, qy] = [b.x - a.x, b.y - a.y, c.x - b.x, c.y - b.y];
  return (px * qx + py * qy) / (Math.hypot(px, py) * Math.hypot(qx, qy));
}

/** The way turns back by more than 120° at both points of a reversed pair, and by less than 60° once they are exchanged. */
const BACK = -0.5;
const ONWARD = 0.5;

/** A chain in which two neighbours that stand in the wrong order are exchanged. @returns the chain and how many pairs there were */
export function withoutReversedPairs(chain: Chain): { readonly chain: Chain; readonly pairs: number } {
  const points = [...chain];
  let pairs = 0;
  for (let i = 1; i + 2 < points.length; i++) {
    const [a, b, c, d] = points.slice(i - 1, i + 3);
    if (!a || !b || !c || !d) continue;
    if (straightness(a, b, c) > BACK || straightness(b, c, d) > BACK) continue;
    if (straightness(a, c, b) < ONWARD || straightness(c, b, d) < ONWARD) continue;
    points[i] = c;
    points[i + 1] = b;
    pairs++;
  }
  return { chain: points, pairs };
}

/** A chain and how the file's chains came into it. */
interface Joined {
  readonly chain: Chain;
  readonly closed: boolean;
}

/**
 * Chains whose ends meet, joined to longer ones, each turned round where needed. An end that several others meet goes on with any of
 * them. Work in proportion to the number of chains: ends are found by the cell of a grid they lie in.
 * @param tolerance distance within which ends meet
 */
export function joinChains(chains: readonly Chain[], tolerance: number): Joined[] {
  const open = new EndGrid(chains, tolerance);
  const joined: Joined[] = [];
  chains.forEach((chain, i) => {
    if (!open.take(i)) return;
    if (isClosed(chain, tolerance)) {
      joined.push({ chain: chain.slice(0, -1), closed: true });
      return;
    }
    const forward = extended(chain, open);
    const both = extended(forward.toReversed(), open).toReversed();
    const closed = isClosed(both, tolerance);
    joined.push({ chain: closed ? both.slice(0, -1) : both, closed });
  });
  return joined;
}

const LEAST_LOOP = 4;

function isClosed(chain: Chain, tolerance: number): boolean {
  return chain.length >= LEAST_LOOP && apart(chain[0], chain.at(-1)) <= tolerance;
}

/** The chain with all that follows its last point. */
function extended(chain: Chain, open: EndGrid): Chain {
  const points = [...chain];
  for (;;) {
    const end = points.at(-1);
    const next = end && open.takeAt(end);
    if (!next) return points;
    for (const point of next.slice(1)) points.push(point);
  }
}

/** The ends of chains by place. */
class EndGrid {
  readonly #cells = new Map<string, number[]>();
  readonly #taken: Uint8Array;
  readonly #chains: readonly Chain[];
  readonly #tolerance: number;

  constructor(chains: readonly Chain[], tolerance: number) {
    this.#chains = chains;
    this.#tolerance = tolerance;
    this.#taken = new Uint8Array(chains.length);
    chains.forEach((chain, i) => {
      for (const end of [chain[0], chain.at(-1)]) {
        if (!end) continue;
        const key = this.#key(end, 0, 0);
        const cell = this.#cells.get(key);
        if (cell) cell.push(i);
        else this.#cells.set(key, [i]);
      }
    });
  }

  /** Takes a chain out. @returns false when it is out already */
  take(index: number): boolean {
    if (this.#taken[index] === 1) return false;
    this.#taken[index] = 1;
    return true;
  }

  /** Takes a chain out that has an end at a point, turned so that it begins there. */
  takeAt(point: Point): Chain | undefined {
    for (let dx = -1; dx <= 1; dx++) {
      for (let dy = -1; dy <= 1; dy++) {
        const cell = this.#cells.get(this.#key(point, dx, dy)) ?? [];
        for (let k = cell.length - 1; k >= 0; k--) {
          const index = cell[k] ?? 0;
          const chain = this.#taken[index] === 1 ? undefined : this.#chains[index];
          if (!chain) {
            // Taken at its other end: it need not be met here again.
            cell.splice(k, 1);
            continue;
          }
          const starts = apart(chain[0], point) <= this.#tolerance;
          if (!starts && apart(chain.at(-1), point) > this.#tolerance) continue;
          this.take(index);
          return starts ? chain : chain.toReversed();
        }
      }
    }
    return undefined;
  }

  #key(point: Point, dx: number, dy: number): string {
    const width = 2 * this.#tolerance;
    return `${Math.floor(point.x / width) + dx},${Math.floor(point.y / width) + dy}`;
  }
}

/** One closed way round, its last point joined to the first. */
export interface Loop {
  readonly points: Chain;
  /** How it was put together, in words; empty when the file had it so. */
  readonly notes: readonly string[];
}

/**
 * The one outline that chains make up. Open ends of one chain, or of two (the surfaces), are joined.
 * @param extras whether open chains beside a closed one are passed over, as the chord line of a drawing
 * @throws ImportRefusal when there are several outlines, or none
 */
export function oneLoop(chains: readonly Joined[], size: number, extras: boolean): Loop {
  const closed = chains.filter((chain) => chain.closed);
  const open = chains.filter((chain) => !chain.closed);
  const [only, second] = closed;
  if (second) throw severalContours(`The file holds ${closed.length} closed outlines.`, second.chain);
  if (only && (open.length === 0 || extras)) {
    return { points: single(only.chain, size), notes: openNote(open.length) };
  }
  const [a, b, c] = [...closed, ...open];
  if (!a) throw new ImportRefusal('no-outline', 'The file holds no outline.');
  if (c) throw severalContours(`The file holds ${chains.length} lines that do not meet.`, c.chain);
  if (!b) return { points: single(a.chain, size), notes: [] };
  return { points: bridged(a.chain, b.chain, size), notes: [] };
}

function openNote(count: number): string[] {
  return count === 0
    ? []
    : [`passed over ${count} open ${count === 1 ? 'line' : 'lines'} beside the outline`];
}

function severalContours(what: string, chain: Chain): ImportRefusal {
  const line = chain[0]?.line ?? null;
  const place = line === null ? '' : ` One begins at line ${line}.`;
  return new ImportRefusal('several-contours', `${what}${place} One outline is read at a time.`, line);
}

const LEAST_PART = 5;

/** A chain that does not come back to its first point before its end. */
function single(chain: Chain, size: number): Chain {
  const tolerance = TOLERANCE.repeated * size;
  const back = chain.findIndex(
    (point, i) => i >= LEAST_PART && i < chain.length - LEAST_PART && apart(point, chain[0]) <= tolerance,
  );
  if (back < 0) return chain;
  throw severalContours('The points go round and begin again.', chain.slice(back));
}

/** Two chains as one loop, joined where that takes the shorter connections. */
function bridged(a: Chain, b: Chain, size: number): Chain {
  const onward = apart(a.at(-1), b[0]) + apart(b.at(-1), a[0]);
  const turned = apart(a.at(-1), b.at(-1)) + apart(b[0], a[0]);
  if (Math.min(onward, turned) > TOLERANCE.bridged * size) {
    throw severalContours('The file holds two lines that do not meet.', b);
  }
  return [...a, ...(turned < onward ? b.toReversed() : b)];
}
