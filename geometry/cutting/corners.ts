import { type End, ENDS } from './plan.ts';
import { type Part, type Row, type RowEnd, PART } from './row.ts';

/** How finely an arc round a corner is divided: the largest radius that the offset will have, and the tolerance, in mm. */
export interface Fineness {
  readonly radius: number;
  readonly tolerance: number;
}

type Direction = readonly [x: number, y: number];
type Both<T> = Readonly<Record<End, T>>;

/** Faces narrower than this are edges, in mm. */
const EDGE = 1e-6;
/** Corners that turn by less than this are smooth, in radians. */
const SMOOTH = 0.01;

function both<T>(of: (end: End) => T): Both<T> {
  return { root: of('root'), tip: of('tip') };
}

/** The trailing edge: from the middle of its face to the upper surface (before the contour) and from the lower back to the middle (after it). */
export function tailRows(
  upper: Row,
  lower: Row,
  fineness: Fineness,
): { readonly before: readonly Row[]; readonly after: readonly Row[] } {
  const { rows, middle } = cornerRows(lower, upper, PART.tail, fineness);
  return { before: rows.slice(middle, -1), after: rows.slice(1, middle + 1) };
}

/**
 * A face between the ends of two surfaces, from `from` over the middle of the face to `to`, both included. A face carries no skin and its corners
 * are those of the foam, even where unequal skins overlap on it: the offset then takes the loop out. An edge, or a face filled by equal
 * skins, carries the mean of both.
 */
export function cornerRows(
  from: Row,
  to: Row,
  part: Part,
  fineness: Fineness,
): { readonly rows: readonly Row[]; readonly middle: number } {
  const faces = both((end) => faceBetween(from[end], to[end]));
  const row = (of: keyof FaceRows): Row => ({
    station: from.station,
    part,
    fixed: true,
    ...both((end) => faces[end][of]),
  });
  const [first, middle, second] = [row('from'), row('middle'), row('to')];
  const start = [{ ...from, fixed: true }, ...cornerFan(from, first, fineness), first];
  const rest = [second, ...cornerFan(to, second, fineness).reverse(), { ...to, fixed: true }];
  return isEdge(from, to)
    ? { rows: [...start, ...rest.slice(1)], middle: start.length - 1 }
    : { rows: [...start, middle, ...rest], middle: start.length };
}

function isEdge(from: Row, to: Row): boolean {
  return ENDS.every((end) => gap(from[end], to[end]) <= EDGE);
}

function gap(from: RowEnd, to: RowEnd): number {
  return Math.hypot(to.x - from.x, to.y - from.y);
}

interface FaceRows {
  readonly from: RowEnd;
  readonly middle: RowEnd;
  readonly to: RowEnd;
}

function faceBetween(from: RowEnd, to: RowEnd): FaceRows {
  const width = gap(from, to);
  const [nx, ny] = width > EDGE ? [(to.y - from.y) / width, (from.x - to.x) / width] : edgeNormal(from, to);
  const overlap = width <= from.skin + to.skin && Math.abs(from.skin - to.skin) < EDGE;
  if (width <= EDGE || overlap) {
    const skin = (from.skin + to.skin) / 2;
    const edge = (x: number, y: number): RowEnd => ({ x, y, nx, ny, skin });
    const middle = edge((from.x + to.x) / 2, (from.y + to.y) / 2);
    return { from: edge(from.x, from.y), middle, to: edge(to.x, to.y) };
  }
  const along: Direction = [-ny, nx];
  const corner = (of: RowEnd): RowEnd => {
    // The skin's inner side meets the face this far along it.
    const depth = of.skin / (of.nx * along[0] + of.ny * along[1]);
    return { x: of.x - depth * along[0], y: of.y - depth * along[1], nx, ny, skin: 0 };
  };
  const [first, last] = [corner(from), corner(to)];
  const middle = { ...first, x: (first.x + last.x) / 2, y: (first.y + last.y) / 2 };
  return { from: first, middle, to: last };
}

/** The direction in which an edge points: half way between the tangents that run into it. */
function edgeNormal(from: RowEnd, to: RowEnd): Direction {
  // The contour runs counter-clockwise: its tangent is the outward normal turned by +90°.
  const x = -from.ny + to.ny;
  const y = from.nx - to.nx;
  const size = Math.hypot(x, y);
  return [x / size, y / size];
}

/** The nose between both surfaces: one point where they pass into one another smoothly, else a fan round the corner. */
export function noseRows(upper: Row, lower: Row, fineness: Fineness): Row[] {
  const turn = Math.max(...ENDS.map((end) => Math.abs(angleBetween(upper[end], lower[end]))));
  const [before, after]: Row[] = [
    { ...upper, part: PART.nose, fixed: true },
    { ...lower, part: PART.nose, fixed: true },
  ];
  if (!before || !after) return [];
  if (turn > SMOOTH) return [before, ...fan(before, after, PART.nose, fineness), after];
  return [{ ...before, ...both((end) => turned(upper[end], lower[end], 0.5)) }];
}

function angleBetween(from: RowEnd, to: RowEnd): number {
  return Math.atan2(from.nx * to.ny - from.ny * to.nx, from.nx * to.nx + from.ny * to.ny);
}

/** Even steps of the larger turn between two rows, such that an arc of the largest radius holds the tolerance. */
function stepsBetween(from: Row, to: Row, { radius, tolerance }: Fineness): number {
  const angle = Math.max(...ENDS.map((end) => Math.abs(angleBetween(from[end], to[end]))));
  const step = radius > tolerance ? 2 * Math.acos(1 - tolerance / (2 * radius)) : Math.PI / 2;
  return Math.max(1, Math.ceil(angle / step));
}

/** The rows between two surfaces that meet in a corner, with normals turned in even steps. */
function fan(from: Row, to: Row, part: Part, fineness: Fineness): Row[] {
  const steps = stepsBetween(from, to, fineness);
  return Array.from({ length: steps - 1 }, (_, i) => ({
    station: from.station,
    part,
    fixed: true,
    ...both((end) => turned(from[end], to[end], (i + 1) / steps)),
  }));
}

/** The rows between the end of a surface and the corner of a face: at the foam's corner where there is one, else passing over from skin to skin. */
function cornerFan(surface: Row, corner: Row, fineness: Fineness): Row[] {
  const steps = stepsBetween(surface, corner, fineness);
  return Array.from({ length: steps }, (_, i) => ({
    ...corner,
    ...both((end) => {
      const row = turned(surface[end], corner[end], i / steps);
      return corner[end].skin === 0 ? { ...corner[end], nx: row.nx, ny: row.ny } : row;
    }),
  }));
}

function turned(from: RowEnd, to: RowEnd, share: number): RowEnd {
  const angle = Math.atan2(from.ny, from.nx) + share * angleBetween(from, to);
  return {
    x: from.x + share * (to.x - from.x),
    y: from.y + share * (to.y - from.y),
    nx: Math.cos(angle),
    ny: Math.sin(angle),
    skin: from.skin + share * (to.skin - from.skin),
  };
}
