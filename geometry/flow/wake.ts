import { type Panels } from './panels.ts';
import { PointView } from './panel-influence.ts';

/** The wake as a chain of straight panels from the trailing edge downstream. */
export interface Wake {
  readonly nodes: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Distance from the trailing edge along the wake. */
  readonly s: Float64Array;
  readonly length: Float64Array;
  readonly tx: Float64Array;
  readonly ty: Float64Array;
  /** Unit direction of the flow at the nodes. */
  readonly ux: Float64Array;
  readonly uy: Float64Array;
}

/** Nodes of the wake and how far it is followed, in chords. */
export const WAKE_NODES = 20;
const WAKE_LENGTH = 1;

/**
 * Follows the potential flow's streamline from the trailing edge (mean of the directions at both ends of each step); the panels grow
 * geometrically from the length of the last panel on the surface.
 * @param strengths vortex strengths of the surface's nodes @param alpha radians
 */
export function traceWake(panels: Panels, strengths: Float64Array, alpha: number): Wake {
  const n = WAKE_NODES;
  const array = (length: number) => new Float64Array(length);
  const wake: Wake = {
    nodes: n,
    x: array(n),
    y: array(n),
    s: array(n),
    length: array(n - 1),
    tx: array(n - 1),
    ty: array(n - 1),
    ux: array(n),
    uy: array(n),
  };
  const { edge } = panels;
  const view = new PointView(panels);
  const row = new Float64Array(panels.nodes);
  const first = ((panels.length[0] ?? 0) + (panels.length[panels.nodes - 2] ?? 0)) / 2;
  const growth = growthFor(WAKE_LENGTH / first, n - 1);
  let [x, y, dx, dy, step] = [edge.x, edge.y, edge.bx, edge.by, first];
  [wake.x[0], wake.y[0]] = [x, y];
  for (let k = 0; k < n - 1; k++) {
    const [ahead, up] = directionAt(view, row, strengths, alpha, x + step * dx, y + step * dy);
    const size = Math.hypot(dx + ahead, dy + up);
    const [tx, ty] = [(dx + ahead) / size, (dy + up) / size];
    x += step * tx;
    y += step * ty;
    wake.x[k + 1] = x;
    wake.y[k + 1] = y;
    wake.s[k + 1] = (wake.s[k] ?? 0) + step;
    wake.length[k] = step;
    wake.tx[k] = tx;
    wake.ty[k] = ty;
    [dx, dy] = [ahead, up];
    step *= growth;
  }
  setNodeDirections(wake);
  return wake;
}

function setNodeDirections(wake: Wake): void {
  const last = wake.nodes - 1;
  for (let k = 0; k <= last; k++) {
    const [i, j] = [Math.max(0, k - 1), Math.min(last - 1, k)];
    const [x, y] = [(wake.tx[i] ?? 0) + (wake.tx[j] ?? 0), (wake.ty[i] ?? 0) + (wake.ty[j] ?? 0)];
    const size = Math.hypot(x, y);
    wake.ux[k] = x / size;
    wake.uy[k] = y / size;
  }
}

function directionAt(
  view: PointView,
  row: Float64Array,
  strengths: Float64Array,
  alpha: number,
  x: number,
  y: number,
): readonly [number, number] {
  view.look(x, y);
  view.speedRow(1, 0, row, 0, null, 0);
  const u = Math.cos(alpha) + dot(row, strengths);
  view.speedRow(0, 1, row, 0, null, 0);
  const v = Math.sin(alpha) + dot(row, strengths);
  const size = Math.hypot(u, v);
  return [u / size, v / size];
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += (a[i] ?? 0) * (b[i] ?? 0);
  return sum;
}

/** The ratio q of a geometric series 1 + q + … of `terms` terms with the given sum. */
function growthFor(sum: number, terms: number): number {
  let [low, high] = [1, 10];
  for (let i = 0; i < 60; i++) {
    const q = (low + high) / 2;
    if ((q ** terms - 1) / (q - 1) < sum) low = q;
    else high = q;
  }
  return (low + high) / 2;
}

const PER_TURN = 1 / (2 * Math.PI);

/**
 * Stream function of a wake panel's unit sources at a point beside or ahead of it; the cut of the sources runs downstream:
 * ∫ φ ds = t φ + ½ Y ln r² between the ends, φ = atan2(−Y, −t).
 */
export function wakeStream(wake: Wake, panel: number, px: number, py: number): number {
  const [tx, ty] = [wake.tx[panel] ?? 0, wake.ty[panel] ?? 0];
  const [dx, dy] = [px - (wake.x[panel] ?? 0), py - (wake.y[panel] ?? 0)];
  const y = dy * tx - dx * ty;
  const x1 = dx * tx + dy * ty;
  const x2 = x1 - (wake.length[panel] ?? 0);
  return (end(x1, y) - end(x2, y)) * PER_TURN;
}

function end(t: number, y: number): number {
  const square = t * t + y * y;
  return square < 1e-24 ? 0 : t * Math.atan2(-y, -t) + 0.5 * y * Math.log(square);
}

/** Speed in the direction (ux, uy) that a wake panel's unit sources cause at a point off it. */
export function wakeSpeed(wake: Wake, panel: number, px: number, py: number, ux: number, uy: number): number {
  const [tx, ty] = [wake.tx[panel] ?? 0, wake.ty[panel] ?? 0];
  const [dx, dy] = [px - (wake.x[panel] ?? 0), py - (wake.y[panel] ?? 0)];
  const l = wake.length[panel] ?? 0;
  const y = dy * tx - dx * ty;
  const x = dx * tx + dy * ty;
  const along = 0.5 * Math.log((x * x + y * y) / ((x - l) * (x - l) + y * y));
  const across = Math.atan2(y * l, x * (x - l) + y * y);
  return ((ux * tx + uy * ty) * along + (uy * tx - ux * ty) * across) * PER_TURN;
}

/**
 * Speed at wake node k from the sources of one of its own two panels: the mean between the middles of both panels, as a difference of
 * potential (the speed itself is infinite at the end of a panel) [own choice]. At the last node the mean runs from the middle of its panel
 * to the node.
 */
export function ownWakeSpeed(wake: Wake, node: number, panel: number): number {
  const other = panel === node ? node - 1 : node;
  const l = wake.length[panel] ?? 0;
  const sign = panel === node ? -1 : 1;
  if (other > wake.nodes - 2) return sign * 2 * Math.LN2 * PER_TURN;
  const half = (wake.length[other] ?? 0) / 2;
  const far = (half + l) * Math.log(half + l) - half * Math.log(half);
  return ((sign * (far - l * Math.log(l / 2))) / (half + l / 2)) * PER_TURN;
}
