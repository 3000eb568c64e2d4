import { Crossing } from './crossing.ts';
import { type Change, Growth, NO_CHANGE } from './growth.ts';
import { Interval } from './interval.ts';
import { SmallMatrix } from './inverse.ts';
import { STAGNATION_H, STAGNATION_LAMBDA } from './laminar.ts';
import { type Layer, type Side } from './layer.ts';
import { LAMINAR, type Regime, Station } from './station.ts';
import { type Closing, Trial } from './trial.ts';

/** Numbers kept for each node: how δθ, δc and δue follow from what lies upstream (seven each). */
export const PER_NODE = 21;
/** Order within the seven: constant, δθ₁, δc₁, δue₁, δm₁, δm₂, δξ. */
export const PER_UNKNOWN = 7;

/**
 * When the first station is this much nearer to stagnation than the second, both belong to the stagnation flow, until the ratio rises above
 * the higher value [own choice].
 */
const SAME_FLOW = { from: 0.2, until: 0.35 } as const;
/** Relative change with which a station counts as solved; what is left over goes into the next step of the whole. */
const ENOUGH = 1e-5;
const ITERATIONS = 12;

/**
 * Marches the layer downstream: at each station the integral equations are solved together with one closing relation. With the relation
 * `line`, an interaction law through the present state (Veldman, AIAA J. 19, 1981), a state that satisfies the equations is left as it is,
 * and any other is
 * brought onto them without meeting the singularity at separation.
 */
export class March {
  readonly layer: Layer;
  /** PER_NODE numbers for each node. */
  readonly answers: Float64Array;
  readonly growth: Growth;
  readonly upperChange: Change = { ...NO_CHANGE };
  readonly lowerChange: Change = { ...NO_CHANGE };
  /** Stations whose equations could not be met. */
  failures = 0;
  before = new Station();
  here = new Station();
  private readonly interval = new Interval();
  private readonly crossing = new Crossing();
  private readonly trial = new Trial();
  private readonly small = new SmallMatrix();
  private readonly step = new Float64Array(3);

  constructor(layer: Layer) {
    this.layer = layer;
    this.answers = new Float64Array(layer.size * PER_NODE);
    this.growth = new Growth(layer);
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
      this.growth.rate(i, this.here);
      this.growth.answers.fill(0, i * 2, i * 2 + 2);
      if (i === second || !side.close) return i;
      this.advance();
    }
  }

  /** Makes the solved station the one behind which the next is solved. */
  advance(): void {
    [this.before, this.here] = [this.here, this.before];
  }

  /** Reads a node's state into a station. */
  load(station: Station, i: number, regime: Regime): void {
    const { theta, dstar, ue, c, s, deadAir, nu } = this.layer;
    station.set(regime, s[i] ?? 0, theta[i] ?? 0, dstar[i] ?? 0, ue[i] ?? 0, c[i] ?? 0, nu, deadAir[i] ?? 0);
  }

  /**
   * Solves node i behind `before` by Newton's method from its present state, and keeps what Newton's method for the whole needs.
   * @param xi share of the interval at which the layer turns turbulent, or null
   * @returns false when the equations could not be met; the node then keeps the state it had
   */
  solve(i: number, regime: Regime, xi: number | null, closing: Closing): boolean {
    const { layer, here, trial, step } = this;
    const [s, air] = [layer.s[i] ?? 0, layer.deadAir[i] ?? 0];
    trial.begin(layer, i, regime, closing);
    for (let iteration = 0; iteration < ITERATIONS; iteration++) {
      here.set(regime, s, trial.theta, trial.dstar, trial.ue, trial.c, layer.nu, air);
      const equations = this.equations(xi);
      if (!this.findStep(equations, regime)) break;
      const [theta, c, z] = [step[0] ?? 0, step[1] ?? 0, step[2] ?? 0];
      const size = trial.size(theta, c, z);
      if (!Number.isFinite(size)) break;
      if (size < ENOUGH) {
        this.keep(i, equations);
        return true;
      }
      trial.take(theta, c, z, size);
    }
    this.load(here, i, regime);
    this.keep(i, this.equations(xi));
    this.failures++;
    return false;
  }

  private equations(xi: number | null): Interval | Crossing {
    if (xi === null) {
      this.interval.between(this.before, this.here);
      return this.interval;
    }
    this.crossing.between(this.before, this.here, xi, this.layer.nu);
    return this.crossing;
  }

  /** One step of the trial in (θ, √CT, z). */
  private findStep({ down, residual }: Interval | Crossing, regime: Regime): boolean {
    const { small, step, trial } = this;
    const { values: m, inverse } = small;
    for (let q = 0; q < 3; q++) {
      const byShape = down[q * 5 + 1] ?? 0;
      m[q * 3] = (down[q * 5] ?? 0) + trial.shapeT * byShape;
      m[q * 3 + 1] = down[q * 5 + 3] ?? 0;
      m[q * 3 + 2] = trial.shapeZ * byShape + trial.speedZ * (down[q * 5 + 2] ?? 0);
    }
    const laminar = regime === LAMINAR;
    if (laminar) [m[6], m[7], m[8]] = [0, 1, 0];
    if (!small.invert()) return false;
    const [r0, r1, r2] = [residual[0] ?? 0, residual[1] ?? 0, laminar ? 0 : (residual[2] ?? 0)];
    for (let k = 0; k < 9; k += 3) {
      step[k / 3] = -((inverse[k] ?? 0) * r0 + (inverse[k + 1] ?? 0) * r1 + (inverse[k + 2] ?? 0) * r2);
    }
    return true;
  }

  /** Writes the station back to its node, and resolves its equations for (δθ, δc, δue) with δδ* = (δm − δ* δue)/ue. */
  private keep(i: number, equations: Interval | Crossing): void {
    const { layer, here: b, small } = this;
    layer.theta[i] = b.theta;
    layer.dstar[i] = b.dstar;
    layer.ue[i] = b.ue;
    layer.regime[i] = b.regime;
    const laminar = b.regime === LAMINAR;
    if (laminar) this.growth.rate(i, b);
    else layer.c[i] = b.c;
    const { values: m } = small;
    const { down } = equations;
    const total = b.dstar + b.gap * b.theta;
    for (let q = 0; q < 3; q++) {
      m[q * 3] = down[q * 5] ?? 0;
      m[q * 3 + 1] = down[q * 5 + 3] ?? 0;
      m[q * 3 + 2] = (down[q * 5 + 2] ?? 0) - ((down[q * 5 + 1] ?? 0) * total) / b.ue;
    }
    if (laminar) [m[6], m[7], m[8]] = [0, 1, 0];
    this.answers.fill(0, i * PER_NODE, (i + 1) * PER_NODE);
    if (small.invert()) this.resolve(i, equations, laminar ? 2 : 3);
  }

  private resolve(i: number, equations: Interval | Crossing, rows: number): void {
    const { answers, before: a, here: b, small } = this;
    const { up, down, residual } = equations;
    const shares = equations instanceof Crossing ? equations.share : null;
    const total = a.dstar + a.gap * a.theta;
    for (let k = 0; k < 3; k++) {
      const base = i * PER_NODE + k * PER_UNKNOWN;
      for (let q = 0; q < rows; q++) {
        const at = q * 5;
        const w = -(small.inverse[k * 3 + q] ?? 0);
        const upD = (up[at + 1] ?? 0) / a.ue;
        answers[base] = (answers[base] ?? 0) + w * (residual[q] ?? 0);
        answers[base + 1] = (answers[base + 1] ?? 0) + w * (up[at] ?? 0);
        answers[base + 2] = (answers[base + 2] ?? 0) + w * (up[at + 3] ?? 0);
        answers[base + 3] = (answers[base + 3] ?? 0) + w * ((up[at + 2] ?? 0) - upD * total);
        answers[base + 4] = (answers[base + 4] ?? 0) + w * upD;
        answers[base + 5] = (answers[base + 5] ?? 0) + (w * (down[at + 1] ?? 0)) / b.ue;
        if (shares) answers[base + 6] = (answers[base + 6] ?? 0) + w * (shares[q] ?? 0);
      }
    }
  }
}
