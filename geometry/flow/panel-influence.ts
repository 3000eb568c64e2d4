import { type Panels } from './panels.ts';

/**
 * What straight panels do at a point: linear vortex strength from node to node, constant source strength on each panel (Katz & Plotkin,
 * Low-Speed Aerodynamics, ch. 10, integrated here in panel axes). Vortices count clockwise; factors are per unit strength.
 *
 * With X, Y the point in the axes of a panel of length L (Y towards the inside), t = X − s, and r₁, r₂ the distances to its ends:
 *   ∫ ln r ds   = ½ (x₁ ln r₁² − x₂ ln r₂²) − L + Y A,    x₁ = X, x₂ = X − L, A = the angle under which the panel is seen
 *   ∫ s ln r ds = X ∫ ln r ds − ¼ [r₁² ln r₁² − r₂² ln r₂² − (r₁² − r₂²)]
 *   ∫ φ ds      = x₁ φ₁ − x₂ φ₂ − ½ Y ln(r₁²/r₂²),        φ = atan2(t, Y)
 * A source's angle is counted as π/2 − φ, so that its cut leaves on the outer side and crosses no node; the constant drops out.
 */
const PER_TURN = 1 / (2 * Math.PI);

/** A point as seen from each node of the panels, and what the panels do there. One view serves many points, one after the other. */
export class PointView {
  readonly panels: Panels;
  readonly dx: Float64Array;
  readonly dy: Float64Array;
  /** Squared distance, its logarithm, and the direction from the node to the point. */
  readonly square: Float64Array;
  readonly log: Float64Array;
  readonly angle: Float64Array;

  constructor(panels: Panels) {
    this.panels = panels;
    const array = () => new Float64Array(panels.nodes);
    [this.dx, this.dy, this.square, this.log, this.angle] = [array(), array(), array(), array(), array()];
  }

  /** Turns to a point; a node in the point itself gets zeros. */
  look(px: number, py: number): void {
    const { panels } = this;
    for (let j = 0; j < panels.nodes; j++) {
      const dx = px - (panels.x[j] ?? 0);
      const dy = py - (panels.y[j] ?? 0);
      const square = dx * dx + dy * dy;
      const apart = square > 1e-24;
      this.dx[j] = dx;
      this.dy[j] = dy;
      this.square[j] = square;
      this.log[j] = apart ? Math.log(square) : 0;
      this.angle[j] = apart ? Math.atan2(dy, dx) : 0;
    }
  }

  /**
   * Stream function at the point in sight per unit vortex strength of each node, and per unit source strength of each panel.
   * @param vortex gets `nodes` values from `at` on
   * @param source gets `nodes − 1` values from `sourceAt` on; null leaves the sources out
   */
  streamRow(vortex: Float64Array, at: number, source: Float64Array | null, sourceAt: number): void {
    const { panels } = this;
    const { length, tx, ty, turn } = panels;
    vortex[at] = 0;
    for (let j = 0; j < panels.nodes - 1; j++) {
      const l = length[j] ?? 1;
      const [dx, dy] = [this.dx[j] ?? 0, this.dy[j] ?? 0];
      const [cos, sin] = [tx[j] ?? 1, ty[j] ?? 0];
      const x1 = dx * cos + dy * sin;
      const y = dy * cos - dx * sin;
      const x2 = x1 - l;
      const [log1, log2] = [this.log[j] ?? 0, this.log[j + 1] ?? 0];
      const [square1, square2] = [this.square[j] ?? 0, this.square[j + 1] ?? 0];
      const [angle1, angle2] = [this.angle[j] ?? 0, this.angle[j + 1] ?? 0];
      const seen = wrap(angle2 - angle1);
      const whole = 0.5 * (x1 * log1 - x2 * log2) - l + y * seen;
      const moment = x1 * whole - 0.25 * (square1 * (log1 - 1) - square2 * (log2 - 1));
      vortex[at + j] = (vortex[at + j] ?? 0) + (whole - moment / l) * PER_TURN;
      vortex[at + j + 1] = (moment / l) * PER_TURN;
      if (source === null) continue;
      const quarter = Math.PI / 2 + (turn[j] ?? 0);
      const integral = x1 * wrap(quarter - angle1) - x2 * wrap(quarter - angle2) - 0.5 * y * (log1 - log2);
      source[sourceAt + j] = -integral * PER_TURN;
    }
    addFaceStream(panels, this, vortex, at);
  }

  /**
   * Speed in a direction at the point in sight, outside the surface or inside but not on it, per unit vortex strength of each node and per
   * unit source strength of each panel.
   * @param ux component of the unit direction along x @param uy along y
   */
  speedRow(
    ux: number,
    uy: number,
    vortex: Float64Array,
    at: number,
    source: Float64Array | null,
    sourceAt: number,
  ): void {
    const { panels } = this;
    const { length, tx, ty } = panels;
    vortex[at] = 0;
    for (let j = 0; j < panels.nodes - 1; j++) {
      const l = length[j] ?? 1;
      const [dx, dy] = [this.dx[j] ?? 0, this.dy[j] ?? 0];
      const [cos, sin] = [tx[j] ?? 1, ty[j] ?? 0];
      const x = dx * cos + dy * sin;
      const y = dy * cos - dx * sin;
      const along = (ux * cos + uy * sin) * PER_TURN;
      const across = (uy * cos - ux * sin) * PER_TURN;
      const ratio = 0.5 * ((this.log[j] ?? 0) - (this.log[j + 1] ?? 0));
      const seen = wrap((this.angle[j + 1] ?? 0) - (this.angle[j] ?? 0));
      const constant = along * seen - across * ratio;
      const linear = (along * (x * seen - y * ratio) - across * (x * ratio - l + y * seen)) / l;
      vortex[at + j] = (vortex[at + j] ?? 0) + constant - linear;
      vortex[at + j + 1] = linear;
      if (source !== null) source[sourceAt + j] = along * ratio + across * seen;
    }
    addFaceSpeed(panels, this, ux, uy, vortex, at);
  }
}

function wrap(angle: number): number {
  if (angle > Math.PI) return angle - 2 * Math.PI;
  return angle <= -Math.PI ? angle + 2 * Math.PI : angle;
}

/**
 * The face of a blunt trailing edge carries what the flow leaving along the bisector b with the speed q = (γ₁ − γ_N)/2 leaves on a wall at
 * rest inside: sources q (b·n) and vortices −q (b·t) [own derivation: jumps of the normal and of the tangential speed].
 */
function faceStrengths({ edge }: Panels): { source: number; vortex: number } {
  return {
    source: (edge.bx * edge.ty - edge.by * edge.tx) / 2,
    vortex: -(edge.bx * edge.tx + edge.by * edge.ty) / 2,
  };
}

function addFaceStream(panels: Panels, sight: PointView, vortex: Float64Array, at: number): void {
  const { edge } = panels;
  if (edge.sharp) return;
  const last = panels.nodes - 1;
  const { source, vortex: swirl } = faceStrengths(panels);
  const [dx, dy] = [sight.dx[last] ?? 0, sight.dy[last] ?? 0];
  const x1 = dx * edge.tx + dy * edge.ty;
  const x2 = x1 - edge.gap;
  const y = dy * edge.tx - dx * edge.ty;
  const [log1, log2] = [sight.log[last] ?? 0, sight.log[0] ?? 0];
  const seen = wrap((sight.angle[0] ?? 0) - (sight.angle[last] ?? 0));
  const whole = 0.5 * (x1 * log1 - x2 * log2) - edge.gap + y * seen;
  const angles = x1 * Math.atan2(x1, y) - x2 * Math.atan2(x2, y) - 0.5 * y * (log1 - log2);
  const value = (swirl * whole - source * angles) * PER_TURN;
  vortex[at] = (vortex[at] ?? 0) + value;
  vortex[at + last] = (vortex[at + last] ?? 0) - value;
}

function addFaceSpeed(
  panels: Panels,
  sight: PointView,
  ux: number,
  uy: number,
  vortex: Float64Array,
  at: number,
): void {
  const { edge } = panels;
  if (edge.sharp) return;
  const last = panels.nodes - 1;
  const { source, vortex: swirl } = faceStrengths(panels);
  const along = (ux * edge.tx + uy * edge.ty) * PER_TURN;
  const across = (uy * edge.tx - ux * edge.ty) * PER_TURN;
  const ratio = 0.5 * ((sight.log[last] ?? 0) - (sight.log[0] ?? 0));
  const seen = wrap((sight.angle[0] ?? 0) - (sight.angle[last] ?? 0));
  const value = swirl * (along * seen - across * ratio) + source * (along * ratio + across * seen);
  vortex[at] = (vortex[at] ?? 0) + value;
  vortex[at + last] = (vortex[at + last] ?? 0) - value;
}
