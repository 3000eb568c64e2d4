import { type Contour, contourAt } from '../contour/contour.ts';
import { type Outline, type SurfaceCurve } from '../shapes/outline.ts';
import { shapeError } from '../shapes/error.ts';

/**
 * The surface as straight panels between nodes: node 0 at the upper trailing edge, over the nose to the lower trailing edge at the last
 * node, so that the inside lies to the left. Lengths in fractions of chord.
 */
export interface Panels {
  /** Number of nodes; there is one panel less. */
  readonly nodes: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Panel j runs from node j to node j + 1 in the direction (tx, ty), which is turned by `turn` from the x axis. */
  readonly length: Float64Array;
  readonly tx: Float64Array;
  readonly ty: Float64Array;
  readonly turn: Float64Array;
  readonly edge: TrailingEdge;
}

/** The trailing edge: the face between the last node and the first, and the direction in which the flow leaves it. */
export interface TrailingEdge {
  readonly sharp: boolean;
  readonly gap: number;
  /** Middle of the face, or the edge itself. */
  readonly x: number;
  readonly y: number;
  /** Unit bisector of both surfaces, pointing downstream. */
  readonly bx: number;
  readonly by: number;
  /** Unit direction of the face from the last node to the first; (0, 1) when sharp. */
  readonly tx: number;
  readonly ty: number;
}

/** A gap below this fraction of chord is treated as sharp: the face's panel would be lost in rounding. */
const SMALLEST_GAP = 1e-5;
/** Fewest and most panels on the whole contour. */
export const PANEL_COUNT = { min: 20, max: 600 } as const;

/**
 * The points of a contour as nodes of panels.
 * @param contour counter-clockwise, chord about 1; its points are the nodes
 * @throws ShapeError when it has fewer than 20 or more than 600 segments, or two equal points in a row
 */
export function panelsOf(contour: Contour): Panels {
  const close = contour.sharp ? 1 : 0;
  const nodes = contour.x.length + close;
  if (nodes - 1 < PANEL_COUNT.min || nodes - 1 > PANEL_COUNT.max) {
    throw shapeError('panels', `panels must be between ${PANEL_COUNT.min} and ${PANEL_COUNT.max}`);
  }
  const x = Float64Array.from({ length: nodes }, (_, i) => contour.x[i % contour.x.length] ?? 0);
  const y = Float64Array.from({ length: nodes }, (_, i) => contour.y[i % contour.y.length] ?? 0);
  const [length, tx, ty, turn] = [0, 1, 2, 3].map(() => new Float64Array(nodes - 1)) as [
    Float64Array,
    Float64Array,
    Float64Array,
    Float64Array,
  ];
  for (let j = 0; j < nodes - 1; j++) {
    const dx = (x[j + 1] ?? 0) - (x[j] ?? 0);
    const dy = (y[j + 1] ?? 0) - (y[j] ?? 0);
    const l = Math.hypot(dx, dy);
    if (!(l > 1e-9)) throw shapeError('contour', 'the contour has two equal points in a row');
    length[j] = l;
    tx[j] = dx / l;
    ty[j] = dy / l;
    turn[j] = Math.atan2(dy, dx);
  }
  return { nodes, x, y, length, tx, ty, turn, edge: trailingEdgeOf(x, y, tx, ty) };
}

function trailingEdgeOf(x: Float64Array, y: Float64Array, tx: Float64Array, ty: Float64Array): TrailingEdge {
  const last = x.length - 1;
  const dx = (x[0] ?? 0) - (x[last] ?? 0);
  const dy = (y[0] ?? 0) - (y[last] ?? 0);
  const gap = Math.hypot(dx, dy);
  const sharp = gap < SMALLEST_GAP;
  const bx = (tx[last - 1] ?? 0) - (tx[0] ?? 0);
  const by = (ty[last - 1] ?? 0) - (ty[0] ?? 0);
  const size = Math.hypot(bx, by);
  return {
    sharp,
    gap: sharp ? 0 : gap,
    x: ((x[0] ?? 0) + (x[last] ?? 0)) / 2,
    y: ((y[0] ?? 0) + (y[last] ?? 0)) / 2,
    bx: bx / size,
    by: by / size,
    tx: sharp ? 0 : dx / gap,
    ty: sharp ? 1 : dy / gap,
  };
}

/** How far the cosine spacing runs towards the trailing edge; 1 would make the last panel as short as its square. */
const SPREAD = 0.96;
/** Share of the panels that is spread by the turning of the surface rather than by the cosine spacing. */
const TURNING_SHARE = 0.15;
/** Intervals in which the spacing is integrated. */
const FINE = 400;

/**
 * The outline as a contour for panels: nodes lie close where the surface turns and near both ends. The spacing along the chord is
 * x = (1 − cos(B π u)) / (1 − cos(B π)) with B = 0.96 for 85 % of the nodes; the others are shared out by the angle through which the
 * surface turns.
 * @param panels even number of panels on the whole contour, the face of a blunt trailing edge not counted; 20 … 600
 * @throws ShapeError when the count is odd or out of range
 */
export function panelOutline(outline: Outline, panels: number): Contour {
  const { min, max } = PANEL_COUNT;
  if (!Number.isInteger(panels / 2) || panels < min || panels > max) {
    throw shapeError('panels', `panels must be an even number between ${min} and ${max}`);
  }
  return contourAt(outline, spacing(outline.upper, panels / 2), spacing(outline.lower, panels / 2));
}

/** Parameters t of the nodes of one surface, 0 … 1. */
function spacing(surface: SurfaceCurve, panels: number): Float64Array {
  const full = 1 - Math.cos(SPREAD * Math.PI);
  const share = new Float64Array(FINE + 1);
  const turned = new Float64Array(FINE + 1);
  let before = 0;
  for (let i = 0; i <= FINE; i++) {
    const { dx, dy } = surface.derivatives(Math.min(1 - 1e-6, Math.max(1e-6, i / FINE)));
    const angle = Math.atan2(dy, dx);
    turned[i] =
      i === 0
        ? 0
        : (turned[i - 1] ?? 0) + Math.abs(Math.atan2(Math.sin(angle - before), Math.cos(angle - before)));
    before = angle;
  }
  const total = turned[FINE] ?? 0;
  for (let i = 0; i <= FINE; i++) {
    const station = (1 - Math.cos((Math.PI * i) / FINE)) / 2;
    const u = Math.acos(Math.max(-1, 1 - station * full)) / (SPREAD * Math.PI);
    share[i] = (1 - TURNING_SHARE) * u + TURNING_SHARE * (total > 0 ? (turned[i] ?? 0) / total : u);
  }
  const t = new Float64Array(panels + 1);
  for (let k = 1, i = 1; k < panels; k++) {
    const wanted = k / panels;
    while ((share[i] ?? 1) < wanted) i++;
    const low = share[i - 1] ?? 0;
    t[k] = (i - 1 + (wanted - low) / ((share[i] ?? 1) - low)) / FINE;
  }
  t[panels] = 1;
  return t;
}
