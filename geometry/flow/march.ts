import { Crossing } from './crossing.ts';
import { Interval } from './interval.ts';
import { STAGNATION_H, STAGNATION_LAMBDA } from './laminar.ts';
import { LOWEST_H, LOWEST_H_WAKE, type Layer, type Side } from './layer.ts';
import { LAMINAR, type Regime, Station, WAKE } from './station.ts';
import { Amplification } from './transition.ts';

/** What closes the equations of one station besides its interval. */
export interface Closing {
  /** `speed`: ue is held; `shape`: H is held; `line`: ue = ue₀ + κ (m − m₀) round the present state. */
  readonly kind: 'speed' | 'shape' | 'line';
  /** H to hold, or κ. */
  readonly value: number;
}

/** Numbers kept for each node: how δθ, δc and δue follow from what lies upstream (seven each). */
export const PER_NODE = 21;
/** Order within the seven: constant, δθ₁, δc₁, δue₁, δm₁, δm₂, δξ. */
export const PER_UNKNOWN = 7;

/** Where a side turns turbulent, and how the place answers to n and its growth rates at the two stations before. */
export interface Change {
  /** First turbulent node; −1 when the side stays laminar. */
  node: number;
  xi: number;
  byN: number;
  byRate: number;
  byRateBefore: number;
}

/** When the first station is this much nearer to stagnation than the second, both belong to the stagnation flow, until the ratio rises above the higher value [own choice]. */
const SAME_FLOW = { from: 0.2, until: 0.35 } as const;
const ENOUGH = 1e-5;
const ITERATIONS = 12;

/**
 * Marches the layer downstream: at each station the integral equations are solved together with one closing relation. With the relation `line`, an interaction law through
 * the present state (Veldman, AIAA J. 19, 1981), a state that satisfies the equations is left as it is, and any other is brought onto them without meeting the singularity at separation.
 */
export class March {
  readonly layer: Layer;
  /** PER_NODE numbers for each node. */
  readonly answers: Float64Array;
  /** Growth rate dn/ds of each laminar node with its slopes against θ, δ*, ue: four each. */
  readonly rates: Float64Array;
  /** ∂n₂/∂(dn/ds) at the station before and at the one before that: two for each node. */
  readonly growth: Float64Array;
  readonly upperChange: Change = { node: -1, xi: 0, byN: 0, byRate: 0, byRateBefore: 0 };
  readonly lowerChange: Change = { node: -1, xi: 0, byN: 0, byRate: 0, byRateBefore: 0 };
  /** Stations whose equations could not be met. */
  failures = 0;
  before = new Station();
  here = new Station();
  private readonly interval = new Interval();
  private readonly crossing = new Crossing();
  private readonly amplification = new Amplification();
  private readonly step = new Float64Array(3);

  constructor(layer: Layer) {
    this.layer = layer;
    this.answers = new Float64Array(layer.size * PER_NODE);
    this.rates = new Float64Array(layer.size * 4);
    this.growth = new Float64Array(layer.size * 2);
  }

  /** The first station: stagnation-point flow, and the second with it when it lies close. Returns the last node so set. */
  stagnate(side: Side): number {
    const { layer } = this;
    const theta = Math.sqrt((STAGNATION_LAMBDA * layer.nu) / layer.stagnationSlope);
    const second = side.first + side.step;
    const ratio = (layer.s[side.first] ?? 0) / (layer.s[second] ?? 1);
    side.close = ratio < (side.close ? SAME_FLOW.until : SAME_FLOW.from);
    for (let i = side.first; ; i += side.step) {
      layer.theta[i] = theta;
      layer.dstar[i] = STAGNATION_H * theta;
      layer.c[i] = 0;
      layer.regime[i] = LAMINAR;
      this.answers.fill(0, i * PER_NODE, (i + 1) * PER_NODE);
      this.answers[i * PER_NODE + 2 * PER_UNKNOWN + 5] = 1 / (STAGNATION_H * theta);
      this.load(this.here, i, LAMINAR);
      this.rate(i, this.here);
      this.growth.fill(0, i * 2, i * 2 + 2);
      if (i === second || !side.close) return i;
      [this.before, this.here] = [this.here, this.before];
    }
  }

  /** Reads a node's state into a station. */
  load(station: Station, i: number, regime: Regime): void {
    const { layer } = this;
    const { theta, dstar, ue, c, s, deadAir, nu } = layer;
    station.set(regime, s[i] ?? 0, theta[i] ?? 0, dstar[i] ?? 0, ue[i] ?? 0, c[i] ?? 0, nu, deadAir[i] ?? 0);
  }

  private rate(i: number, station: Station): void {
    const { h, r, theta, ue } = station;
    const a = this.amplification.at(h, r, theta);
    this.rates[i * 4] = a.rate;
    this.rates[i * 4 + 1] = a.rateT + (a.rateR * r - a.rateH * h) / theta;
    this.rates[i * 4 + 2] = a.rateH / theta;
    this.rates[i * 4 + 3] = (a.rateR * r) / ue;
  }

  /**
   * Decides, from what lies upstream alone, whether the layer turns turbulent before node i: n₂ = n₁ + f₁ d + ½ g d², f = dn/ds, g its slope over the interval before, 0 ≤ g d ≤ 2 f₁ [own choice:
   * explicit, so that the decision does not depend on the state it changes]. Sets n of node i otherwise.
   */
  turns(side: Side, change: Change, i: number): boolean {
    const { layer, rates, growth } = this;
    const p = i - side.step;
    const pp = p - side.step;
    const d = (layer.s[i] ?? 0) - (layer.s[p] ?? 0);
    const n = layer.c[p] ?? 0;
    const f1 = rates[p * 4] ?? 0;
    let [g, byF1, byF0] = [0, 0, 0];
    if (p !== side.first) {
      const h = (layer.s[p] ?? 0) - (layer.s[pp] ?? 0);
      g = (f1 - (rates[pp * 4] ?? 0)) / h;
      [byF1, byF0] = [1 / h, -1 / h];
      if (g <= 0) [g, byF1, byF0] = [0, 0, 0];
      else if (g * d > 2 * f1) [g, byF1, byF0] = [(2 * f1) / d, 2 / d, 0];
    }
    const { criticalN } = layer.conditions;
    const end = n + d * (f1 + 0.5 * g * d);
    const missing = criticalN - n;
    const x = end >= criticalN ? (2 * missing) / (f1 + Math.sqrt(f1 * f1 + 2 * g * missing)) : Infinity;
    const trip = side.tripS - (layer.s[p] ?? 0);
    if (Math.min(x, trip) <= d) {
      side.tripped = trip < x;
      const at = Math.max(0, Math.min(x, trip));
      side.transitionS = (layer.s[p] ?? 0) + at;
      const slope = side.tripped ? 0 : -1 / ((f1 + g * at) * d);
      Object.assign(change, { node: i, xi: at / d, byN: slope, byRate: slope * (at + 0.5 * at * at * byF1), byRateBefore: slope * 0.5 * at * at * byF0 }); // prettier-ignore
      return true;
    }
    layer.c[i] = end;
    growth[i * 2] = d + 0.5 * d * d * byF1;
    growth[i * 2 + 1] = 0.5 * d * d * byF0;
    return false;
  }

  /**
   * Solves node i behind `before` by Newton's method from its present state, and keeps what Newton's method for the whole needs.
   * @param xi share of the interval at which the layer turns turbulent, or null
   * @returns false when the equations could not be met; the node then keeps the state it had
   */
  solve(i: number, regime: Regime, xi: number | null, closing: Closing): boolean {
    const { layer, here, before } = this;
    const air = layer.deadAir[i] ?? 0;
    const start = {
      theta: layer.theta[i] ?? 0,
      dstar: layer.dstar[i] ?? 0,
      ue: layer.ue[i] ?? 0,
      c: layer.c[i] ?? 0,
    };
    const { kind, value } = closing;
    const lowest = regime === WAKE ? LOWEST_H_WAKE : LOWEST_H;
    let { theta, dstar, ue, c } = start;
    if (kind === 'shape') dstar = value * theta;
    const m0 = ue * (dstar + air);
    const ue0 = ue;
    for (let iteration = 0; iteration < ITERATIONS; iteration++) {
      here.set(regime, layer.s[i] ?? 0, theta, dstar, ue, c, layer.nu, air);
      const equations = this.equations(before, here, xi);
      const total = dstar + air;
      const dsZ = kind === 'speed' ? 1 : kind === 'shape' ? 0 : (1 - total * value) / ue;
      const ueZ = kind === 'speed' ? 0 : kind === 'shape' ? 1 : value;
      if (!this.localStep(equations, regime, kind === 'shape' ? value : 0, dsZ, ueZ)) break;
      const [dt, dc, dz] = [this.step[0] ?? 0, this.step[1] ?? 0, this.step[2] ?? 0];
      const dd = dsZ * dz + (kind === 'shape' ? value * dt : 0);
      const du = ueZ * dz;
      const largest = Math.max(Math.abs(dt / theta), Math.abs(dd / dstar), Math.abs(du / ue), regime === LAMINAR ? 0 : Math.abs(dc / c)); // prettier-ignore
      if (!Number.isFinite(largest)) break;
      if (largest < ENOUGH) return this.keep(i, equations);
      const r = Math.min(1, 0.3 / largest);
      theta += r * dt;
      if (regime !== LAMINAR) c += r * dc;
      if (kind === 'speed') dstar += r * dd;
      else if (kind === 'shape') {
        ue += r * du;
        dstar = value * theta;
      } else {
        // On the line exactly, whatever the step: m is the unknown.
        const m = ue * total + r * dz;
        ue = Math.max(0.05 * ue0, ue0 + value * (m - m0));
        dstar = m / ue - air;
      }
      dstar = Math.max(dstar, lowest * theta);
    }
    here.set(regime, layer.s[i] ?? 0, start.theta, start.dstar, start.ue, start.c, layer.nu, air);
    this.keep(i, this.equations(before, here, xi));
    this.failures++;
    return false;
  }

  private equations(a: Station, b: Station, xi: number | null): Interval | Crossing {
    if (xi === null) {
      this.interval.between(a, b);
      return this.interval;
    }
    this.crossing.between(a, b, xi, this.layer.nu);
    return this.crossing;
  }

  /** One step in (θ, c, z), where z moves δ* by dsZ and ue by ueZ and θ moves δ* by dsT. */
  private localStep(e: Interval | Crossing, regime: Regime, dsT: number, dsZ: number, ueZ: number): boolean {
    const { down, residual } = e;
    const m = matrix;
    for (let q = 0; q < 3; q++) {
      const at = q * 5;
      m[q * 3] = (down[at] ?? 0) + dsT * (down[at + 1] ?? 0);
      m[q * 3 + 1] = down[at + 3] ?? 0;
      m[q * 3 + 2] = dsZ * (down[at + 1] ?? 0) + ueZ * (down[at + 2] ?? 0);
    }
    if (regime === LAMINAR) [m[6], m[7], m[8]] = [0, 1, 0];
    if (!invert(m, inverse)) return false;
    const [r0, r1, r2] = [residual[0] ?? 0, residual[1] ?? 0, regime === LAMINAR ? 0 : (residual[2] ?? 0)];
    for (let k = 0; k < 3; k++) {
      this.step[k] = -(
        (inverse[k * 3] ?? 0) * r0 +
        (inverse[k * 3 + 1] ?? 0) * r1 +
        (inverse[k * 3 + 2] ?? 0) * r2
      );
    }
    return true;
  }

  /** Writes the station back to its node, and resolves its equations for (δθ, δc, δue) with δδ* = (δm − δ* δue)/ue. */
  private keep(i: number, e: Interval | Crossing): boolean {
    const { layer, here: b, before: a, answers } = this;
    layer.theta[i] = b.theta;
    layer.dstar[i] = b.dstar;
    layer.ue[i] = b.ue;
    layer.regime[i] = b.regime;
    const laminar = b.regime === LAMINAR;
    if (laminar) this.rate(i, b);
    else layer.c[i] = b.c;
    const { up, down, residual } = e;
    const [total1, total2] = [a.dstar + a.gap * a.theta, b.dstar + b.gap * b.theta];
    const m = matrix;
    for (let q = 0; q < 3; q++) {
      const at = q * 5;
      m[q * 3] = down[at] ?? 0;
      m[q * 3 + 1] = down[at + 3] ?? 0;
      m[q * 3 + 2] = (down[at + 2] ?? 0) - ((down[at + 1] ?? 0) * total2) / b.ue;
    }
    if (laminar) [m[6], m[7], m[8]] = [0, 1, 0];
    const solved = invert(m, inverse);
    const shares = e instanceof Crossing ? e.share : null;
    for (let k = 0; k < 3; k++) {
      const base = i * PER_NODE + k * PER_UNKNOWN;
      answers.fill(0, base, base + PER_UNKNOWN);
      for (let q = 0; solved && q < (laminar ? 2 : 3); q++) {
        const at = q * 5;
        const w = -(inverse[k * 3 + q] ?? 0);
        const upD = (up[at + 1] ?? 0) / a.ue;
        answers[base] = (answers[base] ?? 0) + w * (residual[q] ?? 0);
        answers[base + 1] = (answers[base + 1] ?? 0) + w * (up[at] ?? 0);
        answers[base + 2] = (answers[base + 2] ?? 0) + w * (up[at + 3] ?? 0);
        answers[base + 3] = (answers[base + 3] ?? 0) + w * ((up[at + 2] ?? 0) - upD * total1);
        answers[base + 4] = (answers[base + 4] ?? 0) + w * upD;
        answers[base + 5] = (answers[base + 5] ?? 0) + (w * (down[at + 1] ?? 0)) / b.ue;
        if (shares) answers[base + 6] = (answers[base + 6] ?? 0) + w * (shares[q] ?? 0);
      }
    }
    return true;
  }

  /** Makes the solved station the one behind which the next is solved. */
  advance(): void {
    [this.before, this.here] = [this.here, this.before];
  }
}

const matrix = new Float64Array(9);
const inverse = new Float64Array(9);

/** Inverse of a 3 × 3 matrix by cofactors; false when it is singular. */
function invert(m: Float64Array, out: Float64Array): boolean {
  const [a, b, c] = [m[0] ?? 0, m[1] ?? 0, m[2] ?? 0];
  const [d, e, f] = [m[3] ?? 0, m[4] ?? 0, m[5] ?? 0];
  const [g, h, k] = [m[6] ?? 0, m[7] ?? 0, m[8] ?? 0];
  const [p, q, r] = [e * k - f * h, f * g - d * k, d * h - e * g];
  const determinant = a * p + b * q + c * r;
  const scale = 1 / determinant;
  if (!Number.isFinite(scale)) return false;
  out[0] = p * scale;
  out[1] = (c * h - b * k) * scale;
  out[2] = (b * f - c * e) * scale;
  out[3] = q * scale;
  out[4] = (a * k - c * g) * scale;
  out[5] = (c * d - a * f) * scale;
  out[6] = r * scale;
  out[7] = (b * g - a * h) * scale;
  out[8] = (a * e - b * d) * scale;
  return true;
}
