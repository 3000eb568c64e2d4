import { type Contour } from '../contour/contour.ts';
import { type Point } from '../point.ts';
import { ShapeError } from '../shapes/error.ts';
import { DenseMatrix } from './dense.ts';
import { type Forces, forcesOf } from './forces.ts';
import { PointView } from './panel-influence.ts';
import { type Panels, panelsOf } from './panels.ts';

/** The factored equations of a section's potential flow, and its two solutions from which every angle follows. */
export interface PanelSystem {
  readonly panels: Panels;
  readonly matrix: DenseMatrix;
  /** Stream function per unit source strength: nodes (and the edge's condition) × panels; null when not asked for. */
  readonly sources: Float64Array | null;
  /** Vortex strengths of the nodes at 0° and at 90°; on the surface they are the speed, positive above, negative below. */
  readonly at0: Float64Array;
  readonly at90: Float64Array;
  /** The point inside a sharp edge at which its condition is set. */
  readonly inside: Point;
}

/** How far inside a sharp edge the speed along its bisector is set to zero, in lengths of the last panels. */
const INSIDE_EDGE = 0.3;

/**
 * Sets up the stream-function equations (linear-vorticity panels: Drela, in Mueller (ed.), Low Reynolds Number Aerodynamics, 1989): at each
 * node the stream function of stream and panels equals one constant ψ₀, so that the air inside rests and the vortex strength is the speed
 * outside; Kutta: γ₁ + γ_N = 0. At a sharp edge nodes 1 and N coincide; there the speed along the bisector just inside is set to zero [own
 * choice].
 * @param withSources also prepares what source panels do, for the boundary layer
 * @throws ShapeError when the contour gives no solution, as one that crosses itself may
 */
export function panelSystem(panels: Panels, withSources: boolean): PanelSystem {
  const n = panels.nodes;
  const size = n + 1;
  const matrix = new DenseMatrix(size);
  const { values } = matrix;
  const sources = withSources ? new Float64Array(n * (n - 1)) : null;
  const view = new PointView(panels);
  const right = new Float64Array(size * 2);
  const last = n - 1;
  const inside = insideEdge(panels);
  for (let i = 0; i < n; i++) {
    if (panels.edge.sharp && i === last) continue;
    view.look(panels.x[i] ?? 0, panels.y[i] ?? 0);
    view.streamRow(values, i * size, sources, i * (n - 1));
    values[i * size + n] = -1;
    right[i * 2] = -(panels.y[i] ?? 0);
    right[i * 2 + 1] = panels.x[i] ?? 0;
  }
  if (panels.edge.sharp) {
    const { edge } = panels;
    view.look(inside.x, inside.y);
    view.speedRow(edge.bx, edge.by, values, last * size, sources, last * (n - 1));
    right[last * 2] = -edge.bx;
    right[last * 2 + 1] = -edge.by;
  }
  values[n * size] = 1;
  values[n * size + last] = 1;
  if (!matrix.factorise()) {
    throw new ShapeError([{ path: 'contour', message: 'the flow round this contour cannot be solved' }]);
  }
  matrix.solve(right, 2);
  const column = (k: number) => Float64Array.from({ length: n }, (_, i) => right[i * 2 + k] ?? 0);
  return { panels, matrix, sources, at0: column(0), at90: column(1), inside };
}

function insideEdge({ edge, length }: Panels): Point {
  const depth = (INSIDE_EDGE * ((length[0] ?? 0) + (length[length.length - 1] ?? 0))) / 2;
  return { x: edge.x - depth * edge.bx, y: edge.y - depth * edge.by };
}

/** The potential flow round a contour at one angle. */
export interface InviscidFlow extends Forces {
  readonly alphaDeg: number;
  /** Chord stations and ordinates of the nodes, from the upper trailing edge over the nose to the lower. */
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Speed over free stream at the nodes, positive in the direction from the lower to the upper trailing edge over the nose. */
  readonly speed: Float64Array;
  /** Pressure coefficient at the nodes, Kármán–Tsien corrected when a Mach number is given. */
  readonly cp: Float64Array;
}

/** Vortex strengths of the nodes at an angle, radians. */
export function strengthsAt(system: PanelSystem, alpha: number): Float64Array {
  const [cos, sin] = [Math.cos(alpha), Math.sin(alpha)];
  return system.at0.map((value, i) => cos * value + sin * (system.at90[i] ?? 0));
}

/**
 * The potential flow round any contour at several angles.
 * @param contour chord about 1, nose at x = 0: its points are the panels' ends (see panelOutline)
 * @param alphasDeg angles of attack in degrees
 * @param mach free-stream Mach number, 0 … 0.5 (see compressibility.ts for its limit)
 * @throws ShapeError for a contour that cannot be solved, or a Mach number out of range
 */
export function inviscidFlow(contour: Contour, alphasDeg: readonly number[], mach = 0): InviscidFlow[] {
  const panels = panelsOf(contour);
  const system = panelSystem(panels, false);
  return alphasDeg.map((alphaDeg) => {
    const alpha = (alphaDeg * Math.PI) / 180;
    const speed = strengthsAt(system, alpha);
    return { alphaDeg, x: panels.x, y: panels.y, speed, ...forcesOf(panels, speed, alpha, mach) };
  });
}
