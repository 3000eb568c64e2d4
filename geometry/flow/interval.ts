import { LAMINAR, WAKE, type Station } from './station.ts';
import { LAG } from './turbulent.ts';

/** How sharply the shape equation turns to its downstream end where the shape factor changes; both values as remembered. */
const UPWIND = 5;
const UPWIND_WAKE = 1;

/** Slopes of the three residuals against θ, δ*, ue, c and s of one end: five for each. */
export const PER_ROW = 5;

/**
 * The integral equations between two stations, in logarithmic differences (so that similar flows near stagnation and on a plate come out
 * nearly exactly; form of Drela & Giles, AIAA J. 25 (1987), from memory):
 *   momentum  ln(θ₂/θ₁) + (H + 2 + h) ln(u₂/u₁) − [(cf/2) s/θ] ln(s₂/s₁) = 0
 *   shape     ln(H*₂/H*₁) + (1 − H − h) ln(u₂/u₁) + [(cf/2 − 2CD/H*) s/θ] ln(s₂/s₁) = 0
 *   lag       2 ln(c₂/c₁) − K (c_eq − c)(s₂ − s₁)/δ = 0        (turbulent and wake)
 * The momentum equation takes plain means; the others weigh the downstream end by w = 1 − ½ exp(−C L²/H₂²), L = ln[(H₂−1)/(H₁−1)].
 */
export class Interval {
  readonly residual = new Float64Array(3);
  /** Slopes against the upstream and against the downstream end. */
  readonly up = new Float64Array(3 * PER_ROW);
  readonly down = new Float64Array(3 * PER_ROW);
  private w = 0.5;
  private w1 = 0;
  private w2 = 0;

  /** Sets up all that the two stations leave over. */
  between(a: Station, b: Station): void {
    const lu = Math.log(b.ue / a.ue);
    const ls = Math.log(b.s / a.s);
    this.weigh(a, b);
    this.momentum(a, b, lu, ls);
    this.shape(a, b, lu, ls);
    if (b.regime !== LAMINAR) this.lag(a, b);
  }

  private weigh(a: Station, b: Station): void {
    const [h1, h2] = [a.h, b.h];
    const l = Math.log((h2 - 1) / (h1 - 1));
    const k = (b.regime === WAKE ? UPWIND_WAKE : UPWIND) / (h2 * h2);
    const half = 0.5 * Math.exp(-k * l * l);
    this.w = 1 - half;
    this.w1 = (-2 * half * k * l) / (h1 - 1);
    this.w2 = 2 * half * k * l * (1 / (h2 - 1) - l / h2);
  }

  private momentum(a: Station, b: Station, lu: number, ls: number): void {
    const { residual, up, down } = this;
    const factor = 0.5 * (a.h + b.h + a.gap + b.gap) + 2;
    const [p1, p2] = [a.friction, b.friction];
    const [v1, v2] = [p1.value * a.s, p2.value * b.s];
    const [k1, k2] = [0.5 * ls * a.s, 0.5 * ls * b.s];
    residual[0] = Math.log(b.theta / a.theta) + factor * lu - 0.5 * (v1 + v2) * ls;
    const half = 0.5 * lu;
    up[0] = -1 / a.theta + half * (a.shape.t - a.gap / a.theta) - k1 * p1.t;
    up[1] = half * a.shape.d - k1 * p1.d;
    up[2] = -factor / a.ue - k1 * p1.u;
    up[3] = 0;
    up[4] = -0.5 * ls * p1.value + (0.5 * (v1 + v2)) / a.s;
    down[0] = 1 / b.theta + half * (b.shape.t - b.gap / b.theta) - k2 * p2.t;
    down[1] = half * b.shape.d - k2 * p2.d;
    down[2] = factor / b.ue - k2 * p2.u;
    down[3] = 0;
    down[4] = -0.5 * ls * p2.value - (0.5 * (v1 + v2)) / b.s;
  }

  private shape(a: Station, b: Station, lu: number, ls: number): void {
    const { residual, up, down, w } = this;
    const v = 1 - w;
    const [q1, q2] = [a.balance, b.balance];
    const [v1, v2] = [q1.value * a.s, q2.value * b.s];
    const factor = 1 - v * a.h - w * b.h - 0.5 * (a.gap + b.gap);
    const mean = v * v1 + w * v2;
    residual[1] = b.energy.value - a.energy.value + factor * lu + mean * ls;
    const byW = (a.h - b.h) * lu + (v2 - v1) * ls;
    const h1 = byW * this.w1 - v * lu;
    const h2 = byW * this.w2 - w * lu;
    const [k1, k2] = [v * ls * a.s, w * ls * b.s];
    up[5] = -a.energy.t + h1 * a.shape.t + (0.5 * lu * a.gap) / a.theta + k1 * q1.t;
    up[6] = -a.energy.d + h1 * a.shape.d + k1 * q1.d;
    up[7] = -a.energy.u - factor / a.ue + k1 * q1.u;
    up[8] = k1 * q1.c;
    up[9] = v * ls * q1.value - mean / a.s;
    down[5] = b.energy.t + h2 * b.shape.t + (0.5 * lu * b.gap) / b.theta + k2 * q2.t;
    down[6] = b.energy.d + h2 * b.shape.d + k2 * q2.d;
    down[7] = b.energy.u + factor / b.ue + k2 * q2.u;
    down[8] = k2 * q2.c;
    down[9] = w * ls * q2.value + mean / b.s;
  }

  private lag(a: Station, b: Station): void {
    const { residual, up, down, w } = this;
    const v = 1 - w;
    const [e1, e2] = [a.equilibrium, b.equilibrium];
    const [t1, t2] = [a.thickness, b.thickness];
    const [g1, g2] = [e1.value - a.c, e2.value - b.c];
    const thick = 0.5 * (t1.value + t2.value);
    const k = (LAG * (b.s - a.s)) / thick;
    const drive = v * g1 + w * g2;
    residual[2] = 2 * Math.log(b.c / a.c) - k * drive;
    const byW = -k * (g2 - g1);
    const byThick = (0.5 * k * drive) / thick;
    const [h1, h2] = [byW * this.w1, byW * this.w2];
    up[10] = h1 * a.shape.t - k * v * e1.t + byThick * t1.t;
    up[11] = h1 * a.shape.d - k * v * e1.d + byThick * t1.d;
    up[12] = -k * v * e1.u;
    up[13] = -2 / a.c + k * v;
    up[14] = (LAG / thick) * drive;
    down[10] = h2 * b.shape.t - k * w * e2.t + byThick * t2.t;
    down[11] = h2 * b.shape.d - k * w * e2.d + byThick * t2.d;
    down[12] = -k * w * e2.u;
    down[13] = 2 / b.c + k * w;
    down[14] = (-LAG / thick) * drive;
  }
}
