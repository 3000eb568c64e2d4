import { type ViscousConditions } from './conditions.ts';
import { type OuterFlow } from './coupling.ts';
import { type Panels } from './panels.ts';
import { LAMINAR, WAKE } from './station.ts';

/** Smallest shape factors on the surface and in the wake. */
export const LOWEST_H = 1.02;
export const LOWEST_H_WAKE = 1.000001;
/** Smallest speed on the surface: a node beside the stagnation point. */
export const LOWEST_SPEED = 1e-6;

/** One side of the stagnation point: its nodes in the direction of the flow. */
export interface Side {
  /** First node behind stagnation. */
  first: number;
  /** Last node, at the trailing edge. */
  readonly last: number;
  /** −1 on the upper side, whose node numbers fall downstream; +1 on the lower. */
  readonly step: 1 | -1;
  /** Arc length of the trip from the stagnation point; infinite without one. */
  tripS: number;
  /** Arc length at which the layer turns turbulent; infinite when it stays laminar. */
  transitionS: number;
  /** Whether the trip has set it. */
  tripped: boolean;
  /** Whether the second node belongs to the stagnation flow. */
  close: boolean;
}

const NEW_SIDE = { tripS: Infinity, transitionS: Infinity, tripped: false, close: false } as const;

/**
 * The boundary layer's and the wake's state at all nodes of the panels. Sides change with the stagnation point; the state stays with its
 * node.
 */
export class Layer {
  readonly panels: Panels;
  readonly conditions: ViscousConditions;
  readonly size: number;
  readonly nu: number;
  readonly theta: Float64Array;
  /** Displacement thickness without the dead air behind a blunt edge. */
  readonly dstar: Float64Array;
  /** Speed at the layer's edge, along the flow: above 0. */
  readonly ue: Float64Array;
  /** √CT where turbulent, n where laminar. */
  readonly c: Float64Array;
  readonly regime: Uint8Array;
  /** Arc length from the stagnation point; in the wake it goes on from the mean of both sides. */
  readonly s: Float64Array;
  /** Dead air behind a blunt edge. */
  readonly deadAir: Float64Array;
  readonly upper: Side;
  readonly lower: Side;
  /** Gradient of the speed at the stagnation point. */
  stagnationSlope = 1;
  /** Arc length of the nodes from the upper trailing edge. */
  private readonly arc: Float64Array;

  constructor(panels: Panels, size: number, conditions: ViscousConditions) {
    this.panels = panels;
    this.conditions = conditions;
    this.size = size;
    this.nu = 1 / conditions.reynolds;
    const array = () => new Float64Array(size);
    this.theta = array();
    this.dstar = array();
    this.ue = array();
    this.c = array();
    this.s = array();
    this.deadAir = array();
    this.regime = new Uint8Array(size).fill(LAMINAR);
    this.regime.fill(WAKE, panels.nodes);
    this.upper = { ...NEW_SIDE, first: 0, last: 0, step: -1 };
    this.lower = { ...NEW_SIDE, first: 0, last: panels.nodes - 1, step: 1 };
    this.arc = new Float64Array(panels.nodes);
    for (let i = 1; i < panels.nodes; i++) this.arc[i] = (this.arc[i - 1] ?? 0) + (panels.length[i - 1] ?? 0);
  }

  /** A copy to go on from. */
  copyFrom(other: Layer): void {
    for (const key of ['theta', 'dstar', 'ue', 'c', 'regime', 's', 'deadAir'] as const) {
      this[key].set(other[key]);
    }
    Object.assign(this.upper, other.upper);
    Object.assign(this.lower, other.lower);
    this.stagnationSlope = other.stagnationSlope;
  }

  /** +1 for nodes of the upper side and the wake, −1 for the lower side. */
  sign(node: number): 1 | -1 {
    return node > this.upper.first && node < this.panels.nodes ? -1 : 1;
  }

  /** ue δ* with the dead air. */
  massDefect(node: number): number {
    return (this.ue[node] ?? 0) * ((this.dstar[node] ?? 0) + (this.deadAir[node] ?? 0));
  }

  /** Takes the stagnation point where the vortex strength changes sign, given the flow without a layer. */
  startFrom(strengths: Float64Array): void {
    const last = this.panels.nodes - 1;
    this.regime.fill(LAMINAR, 0, last + 1);
    this.upper.close = this.lower.close = false;
    let first = 1;
    // From the upper edge on, the first change of sign: the speed is positive all over the upper side.
    while (first < last - 1 && (strengths[first + 1] ?? 0) > 0) first++;
    this.upper.first = first;
    this.lower.first = first + 1;
    for (let i = 0; i <= last; i++) this.ue[i] = Math.max(LOWEST_SPEED, this.sign(i) * (strengths[i] ?? 0));
    this.measure();
  }

  /**
   * Lays arc lengths from the stagnation point, a linear zero of the speed, and sets the trips.
   * The point stays at least 1 % of its panel away from both nodes.
   */
  measure(): void {
    const { panels, arc, s, upper, lower } = this;
    const [i, j] = [upper.first, lower.first];
    const [ui, uj] = [this.ue[i] ?? 0, this.ue[j] ?? 0];
    const l = panels.length[i] ?? 0;
    const share = Math.min(0.99, Math.max(0.01, ui / (ui + uj)));
    const zero = (arc[i] ?? 0) + share * l;
    this.stagnationSlope = Math.max(1e-3, (ui + uj) / l);
    for (let k = 0; k < panels.nodes; k++) s[k] = Math.abs((arc[k] ?? 0) - zero);
    const { tripUpper, tripLower } = this.conditions;
    upper.tripS = this.tripOf(upper, tripUpper, zero);
    lower.tripS = this.tripOf(lower, tripLower, zero);
  }

  /** Arc lengths along the wake and the dead air that closes in it: h z² (3 − 2z), z = 1 − s/(2.5 h) [own form]. */
  measureWake({ wake }: OuterFlow): void {
    const { panels, s, upper, lower } = this;
    const start = ((s[upper.last] ?? 0) + (s[lower.last] ?? 0)) / 2;
    const { gap } = panels.edge;
    for (let k = 0; k < wake.nodes; k++) {
      const along = wake.s[k] ?? 0;
      const z = gap > 0 ? Math.max(0, 1 - along / (2.5 * gap)) : 0;
      s[panels.nodes + k] = start + along;
      this.deadAir[panels.nodes + k] = gap * z * z * (3 - 2 * z);
    }
  }

  private tripOf(side: Side, station: number, zero: number): number {
    if (station >= 1) return Infinity;
    const { panels, arc } = this;
    for (let i = side.first; i !== side.last; i += side.step) {
      const [x1, x2] = [panels.x[i] ?? 0, panels.x[i + side.step] ?? 0];
      if (x2 <= station || x2 <= x1) continue;
      const share = Math.max(0, (station - x1) / (x2 - x1));
      const [a1, a2] = [arc[i] ?? 0, arc[i + side.step] ?? 0];
      return Math.abs(a1 + share * (a2 - a1) - zero);
    }
    return Infinity;
  }

  /**
   * Takes new speeds, given along the flow of the side a node was on; the stagnation point moves to where they turn negative, once it lies
   * more than a hundredth of the next speed beyond a node.
   * @param signed speeds at all nodes; overwritten
   */
  takeSpeeds(signed: Float64Array): void {
    const { upper, lower, ue } = this;
    const last = this.panels.nodes - 1;
    while (upper.first > 2 && beyond(signed, upper.first, -1)) {
      signed[upper.first] = -(signed[upper.first] ?? 0);
      upper.first--;
      lower.first--;
    }
    while (lower.first < last - 2 && beyond(signed, lower.first, 1)) {
      signed[lower.first] = -(signed[lower.first] ?? 0);
      lower.first++;
      upper.first++;
    }
    for (let i = 0; i <= last; i++) ue[i] = Math.max(LOWEST_SPEED, signed[i] ?? 0);
    for (let i = last + 1; i < this.size; i++) ue[i] = Math.max(0.01, signed[i] ?? 0);
  }

  /** Keeps δ* above the smallest that the equations take. */
  keepShape(): void {
    for (let i = 0; i < this.size; i++) {
      const lowest = (i < this.panels.nodes ? LOWEST_H : LOWEST_H_WAKE) * (this.theta[i] ?? 0);
      if ((this.dstar[i] ?? 0) < lowest) this.dstar[i] = lowest;
    }
  }
}

function beyond(signed: Float64Array, first: number, step: 1 | -1): boolean {
  return (signed[first] ?? 0) < -0.01 * Math.abs(signed[first + step] ?? 0);
}
