import { type Closure } from './closure.ts';

/** Shape factor of the stagnation-point flow by these closures: both equations with θ and H constant. */
export const STAGNATION_H = 2.2401;
/** θ² (due/ds)/ν of the same flow. */
export const STAGNATION_LAMBDA = 0.084305;

/**
 * Laminar closure: fits to the Falkner–Skan profiles, Drela & Giles, AIAA J. 25 (1987), pp. 1347–1355 (coefficients from memory, tested
 * against the similarity solutions).
 */
export class LaminarClosure implements Closure {
  hs = 0;
  hsH = 0;
  hsR = 0;
  cf = 0;
  cfH = 0;
  cfR = 0;
  di = 0;
  diH = 0;
  diR = 0;
  diC = 0;

  /** @param h shape factor, above 1 @param r Rθ, above 0 */
  at(h: number, r: number): this {
    this.energy(h);
    this.friction(h, r);
    this.dissipation(h, r);
    return this;
  }

  /** H* = 1.515 + 0.076 (4−H)²/H below H = 4, 1.515 + 0.040 (H−4)²/H above. */
  private energy(h: number): void {
    const k = h < 4 ? 0.076 : 0.04;
    const d = h - 4;
    this.hs = 1.515 + (k * d * d) / h;
    this.hsH = k * (1 - 16 / (h * h));
    this.hsR = 0;
  }

  /** Rθ cf/2 = −0.067 + 0.01977 (7.4−H)²/(H−1) below H = 7.4, −0.067 + 0.022 [1 − 1.4/(H−6)]² above. */
  private friction(h: number, r: number): void {
    let [value, slope] = [0, 0];
    if (h < 7.4) {
      const d = 7.4 - h;
      value = -0.067 + (0.01977 * d * d) / (h - 1);
      slope = (-0.01977 * d * (2 * (h - 1) + d)) / ((h - 1) * (h - 1));
    } else {
      const d = 1 - 1.4 / (h - 6);
      value = -0.067 + 0.022 * d * d;
      slope = (0.0616 * d) / ((h - 6) * (h - 6));
    }
    this.cf = value / r;
    this.cfH = slope / r;
    this.cfR = -value / (r * r);
  }

  /** Rθ 2CD/H* = 0.207 + 0.00205 (4−H)^5.5 below H = 4, 0.207 − 0.003 (H−4)²/(1 + 0.02 (H−4)²) above. */
  private dissipation(h: number, r: number): void {
    let [value, slope] = [0, 0];
    if (h < 4) {
      const d = 4 - h;
      const power = d * d * d * d * Math.sqrt(d);
      value = 0.207 + 0.00205 * power * d;
      slope = -5.5 * 0.00205 * power;
    } else {
      const d = h - 4;
      const below = 1 + 0.02 * d * d;
      value = 0.207 - (0.003 * d * d) / below;
      slope = (-0.006 * d) / (below * below);
    }
    this.di = value / r;
    this.diH = slope / r;
    this.diR = -value / (r * r);
  }
}
