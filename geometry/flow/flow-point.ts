import { type OuterFlow } from './coupling.ts';
import { forcesOf } from './forces.ts';
import { type Layer, type Side } from './layer.ts';
import { LAMINAR, Station } from './station.ts';

/** What happens on one surface, as chord stations; null where it does not happen. */
export interface SurfaceEvents {
  /** Where the layer turns turbulent; null when it is laminar to the trailing edge. */
  readonly transition: number | null;
  /** Whether the forced station did it. */
  readonly forced: boolean;
  /** Where the laminar layer separates, and where the flow lies on again behind that bubble. */
  readonly laminarSeparation: number | null;
  readonly reattachment: number | null;
  /** Where the turbulent layer separates for good. */
  readonly turbulentSeparation: number | null;
}

/** A section at an angle that converged. All are estimates of two-dimensional theory. */
export interface SolvedPoint {
  readonly converged: true;
  readonly alphaDeg: number;
  /** Lift, from pressures. */
  readonly cl: number;
  /** Drag: Squire & Young at the end of the wake. */
  readonly cd: number;
  /** The part of it by wall friction; the rest is that of pressure. */
  readonly cdFriction: number;
  readonly cdPressure: number;
  /** Moment about the quarter-chord point, nose-up positive. */
  readonly cm: number;
  readonly lowestCp: number;
  readonly upper: SurfaceEvents;
  readonly lower: SurfaceEvents;
  readonly iterations: number;
}

/** A section at an angle that did not converge: nothing is known about it. */
export interface UnsolvedPoint {
  readonly converged: false;
  readonly alphaDeg: number;
  readonly iterations: number;
}

export type FlowPoint = SolvedPoint | UnsolvedPoint;

/** The speeds at the surface's nodes, positive above, negative below. */
export function surfaceSpeeds(layer: Layer): Float64Array {
  return layer.ue.slice(0, layer.panels.nodes).map((value, i) => layer.sign(i) * value);
}

/** Sums up a converged state; null when it is no flow: lift beyond ±3 or no drag. */
export function pointOf(
  layer: Layer,
  outer: OuterFlow,
  alphaDeg: number,
  mach: number,
  iterations: number,
): SolvedPoint | null {
  const { cl, cm, lowestCp } = forcesOf(layer.panels, surfaceSpeeds(layer), outer.alpha, mach);
  const cd = wakeDrag(layer);
  const friction = wallFriction(layer);
  const cdFriction = frictionDrag(layer, friction, outer.alpha);
  if (!(cd > 0 && Math.abs(cl) < 3) || !Number.isFinite(cm) || !Number.isFinite(cdFriction)) return null;
  const events = (side: Side) => eventsOf(layer, side, friction);
  return {
    converged: true,
    alphaDeg,
    cl,
    cd,
    cdFriction,
    cdPressure: cd - cdFriction,
    cm,
    lowestCp,
    upper: events(layer.upper),
    lower: events(layer.lower),
    iterations,
  };
}

/** 2 θ ue^((H+5)/2) at the last node of the wake: Squire & Young, ARC R&M 1838 (1937), eq. for the momentum far behind. */
function wakeDrag(layer: Layer): number {
  const last = layer.size - 1;
  const theta = layer.theta[last] ?? 0;
  const h = (layer.dstar[last] ?? 0) / theta;
  return 2 * theta * (layer.ue[last] ?? 1) ** ((h + 5) / 2);
}

/** Wall shear over the free stream's dynamic pressure at the surface's nodes, along the flow. */
export function wallFriction(layer: Layer): Float64Array {
  const station = new Station();
  const { theta, dstar, ue, c, s, nu } = layer;
  return Float64Array.from({ length: layer.panels.nodes }, (_, i) => {
    const regime = layer.regime[i] === LAMINAR ? LAMINAR : 1;
    station.set(regime, s[i] ?? 1, theta[i] ?? 1, dstar[i] ?? 1, ue[i] ?? 1, c[i] ?? 0, nu, 0);
    return 2 * station.friction.value * station.theta * station.ue * station.ue;
  });
}

function frictionDrag(layer: Layer, friction: Float64Array, alpha: number): number {
  const { panels } = layer;
  const [cos, sin] = [Math.cos(alpha), Math.sin(alpha)];
  let sum = 0;
  for (let j = 0; j < panels.nodes - 1; j++) {
    // Along the panel the upper side's flow runs backwards.
    const mean = (-layer.sign(j) * (friction[j] ?? 0) + -layer.sign(j + 1) * (friction[j + 1] ?? 0)) / 2;
    sum += mean * (panels.length[j] ?? 0) * ((panels.tx[j] ?? 0) * cos + (panels.ty[j] ?? 0) * sin);
  }
  return sum;
}

function eventsOf(layer: Layer, side: Side, friction: Float64Array): SurfaceEvents {
  const { s, panels } = layer;
  let transition: number | null = null;
  let laminarSeparation: number | null = null;
  let reattachment: number | null = null;
  let turbulentSeparation: number | null = null;
  for (let i = side.first; i !== side.last; i += side.step) {
    const k = i + side.step;
    const [s1, s2] = [s[i] ?? 0, s[k] ?? 1];
    const [x1, x2] = [panels.x[i] ?? 0, panels.x[k] ?? 0];
    if (side.transitionS > s1 && side.transitionS <= s2) {
      transition = x1 + ((side.transitionS - s1) / (s2 - s1)) * (x2 - x1);
    }
    const [f1, f2] = [friction[i] ?? 0, friction[k] ?? 0];
    if (f1 < 0 === f2 < 0) continue;
    const x = x1 + (f1 / (f1 - f2)) * (x2 - x1);
    if (f2 >= 0) [reattachment, turbulentSeparation] = [laminarSeparation === null ? null : x, null];
    else if (layer.regime[k] === LAMINAR) laminarSeparation ??= x;
    else turbulentSeparation = x;
  }
  return { transition, forced: side.tripped, laminarSeparation, reattachment, turbulentSeparation };
}

/** Pressures and boundary layer along the section, for drawing. Lengths in fractions of chord, in the section's own axes. */
export interface Distribution {
  /** Nodes from the upper trailing edge over the nose to the lower trailing edge. */
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Index of the last node of the upper side of the stagnation point. */
  readonly stagnation: number;
  readonly cp: Float64Array;
  /** Speed at the layer's edge over free stream. */
  readonly speed: Float64Array;
  readonly displacementThickness: Float64Array;
  readonly momentumThickness: Float64Array;
  /** H = δ* over θ. */
  readonly shapeFactor: Float64Array;
  /** Wall shear over the free stream's dynamic pressure; negative in separated flow. */
  readonly friction: Float64Array;
  readonly turbulent: readonly boolean[];
  /** The wake from the trailing edge downstream: its middle line and its displacement thickness, dead air behind a blunt edge included. */
  readonly wake: {
    readonly x: Float64Array;
    readonly y: Float64Array;
    readonly displacementThickness: Float64Array;
  };
}

/** Reads a converged state for drawing. @param mach 0 … 0.5 */
export function distributionOf(layer: Layer, outer: OuterFlow, mach: number): Distribution {
  const { panels } = layer;
  const n = panels.nodes;
  const { cp } = forcesOf(panels, surfaceSpeeds(layer), outer.alpha, mach);
  const displacementThickness = layer.dstar.slice(0, n);
  const momentumThickness = layer.theta.slice(0, n);
  return {
    x: panels.x.slice(),
    y: panels.y.slice(),
    stagnation: layer.upper.first,
    cp,
    speed: layer.ue.slice(0, n),
    displacementThickness,
    momentumThickness,
    shapeFactor: displacementThickness.map((value, i) => value / (momentumThickness[i] ?? 1)),
    friction: wallFriction(layer),
    turbulent: Array.from({ length: n }, (_, i) => layer.regime[i] !== 0),
    wake: {
      x: outer.wake.x.slice(),
      y: outer.wake.y.slice(),
      displacementThickness: layer.dstar.slice(n).map((value, k) => value + (layer.deadAir[n + k] ?? 0)),
    },
  };
}
