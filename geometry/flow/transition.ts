import { shapeError } from '../shapes/error.ts';

/** Half width in log₁₀ Rθ over which growth sets in round the critical value [own choice, keeps the rate smooth]. */
const RAMP = 0.08;
/** Below this shape factor the relations for l and m l are taken at it: l would turn negative. */
const LOWEST_H = 2.2;

/**
 * Growth of the most amplified waves along a laminar layer: the envelope method of Drela & Giles, AIAA J. 25 (1987), after Gleyzes,
 * Cousteix & Bonnet (coefficients from memory, tested on the flat plate). Slopes end in H, R and T (against θ).
 */
export class Amplification {
  /** dn/ds, growth of the exponent along the surface. */
  rate = 0;
  rateH = 0;
  rateR = 0;
  rateT = 0;

  /**
   * dn/ds = dn/dRθ · (m+1)/2 · l / θ once Rθ is above Rθ₀.
   * @param h shape factor @param r Rθ @param theta momentum thickness
   */
  at(h: number, r: number, theta: number): this {
    const onset = Math.log10(r) - criticalLogR(h);
    if (onset <= -RAMP) {
      this.rate = this.rateH = this.rateR = this.rateT = 0;
      return this;
    }
    const growth = this.growth(h, theta);
    if (onset >= RAMP) return this;
    const z = (onset + RAMP) / (2 * RAMP);
    const ramp = z * z * (3 - 2 * z);
    const rampZ = (6 * z * (1 - z)) / (2 * RAMP);
    this.rateH = this.rateH * ramp - growth * rampZ * criticalLogSlope(h);
    this.rateR = (growth * rampZ) / (r * Math.LN10);
    this.rateT *= ramp;
    this.rate *= ramp;
    return this;
  }

  /**
   * dn/dRθ = 0.01 {[2.4 H − 3.7 + 2.5 tanh(1.5 H − 4.65)]² + 0.25}^½,  l = (6.54 H − 14.07)/H²,  m l = 0.058 (H−4)²/(H−1) − 0.068.
   */
  private growth(h: number, theta: number): number {
    const t = Math.tanh(1.5 * h - 4.65);
    const inner = 2.4 * h - 3.7 + 2.5 * t;
    const root = Math.sqrt(inner * inner + 0.25);
    const perR = 0.01 * root;
    const perRH = (0.01 * inner * (2.4 + 3.75 * (1 - t * t))) / root;
    const hl = Math.max(h, LOWEST_H);
    const d = hl - 4;
    const l = (6.54 - 14.07 / hl) / hl;
    const ml = (0.058 * d * d) / (hl - 1) - 0.068;
    const lH = h < LOWEST_H ? 0 : (28.14 / hl - 6.54) / (hl * hl);
    const mlH = h < LOWEST_H ? 0 : (0.058 * d * (2 * (hl - 1) - d)) / ((hl - 1) * (hl - 1));
    const length = (ml + l) / 2;
    this.rate = (perR * length) / theta;
    this.rateH = (perRH * length + (perR * (mlH + lH)) / 2) / theta;
    this.rateR = 0;
    this.rateT = -this.rate / theta;
    return this.rate;
  }
}

/** log₁₀ Rθ₀ = (1.415/(H−1) − 0.489) tanh(20/(H−1) − 12.9) + 3.295/(H−1) + 0.44, where growth begins. @param h shape factor, above 1 */
export function criticalLogR(h: number): number {
  const k = 1 / (h - 1);
  return (1.415 * k - 0.489) * Math.tanh(20 * k - 12.9) + 3.295 * k + 0.44;
}

function criticalLogSlope(h: number): number {
  const k = 1 / (h - 1);
  const t = Math.tanh(20 * k - 12.9);
  return -k * k * (1.415 * t + (1.415 * k - 0.489) * 20 * (1 - t * t) + 3.295);
}

/**
 * Critical exponent for a stream's turbulence: N = −8.43 − 2.4 ln Tu (Mack, AIAA 77-0120 (1977), for 0.0007 … 0.0298; from memory).
 * @param turbulence ratio of the fluctuating to the mean speed, 0.0002 … 0.0298 (12 … 0.0)
 * @throws ShapeError when it is outside that range
 */
export function criticalExponent(turbulence: number): number {
  if (!(turbulence >= 0.0002 && turbulence <= 0.0298)) {
    throw shapeError('turbulence', 'turbulence must be between 0.02 % and 2.98 %');
  }
  return -8.43 - 2.4 * Math.log(turbulence);
}
