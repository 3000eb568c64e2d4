import { type Closure } from './closure.ts';

/** Rθ below which the turbulent fits are taken at this value: they were made for developed layers [own limit]. */
const LOWEST_R = 200;
/** Largest wall-layer speed Us on the surface and in the wake, so that 1 − Us stays away from 0 [own limits]. */
const HIGHEST_US = 0.95;
const HIGHEST_US_WAKE = 0.99995;

/**
 * Lag of the shear stress: K in (δ/CT) dCT/ds = K (√CTeq − √CT). 4.2 is the value of Drela & Giles 1987 as remembered; later publications
 * have 5.6.
 */
export const LAG = 4.2;
/** Shear stress at transition as a share of its equilibrium: 0.7 in Drela & Giles 1987 as remembered. */
export const START_SHARE = 0.7;

/**
 * Turbulent closure: Drela & Giles, AIAA J. 25 (1987), pp. 1347–1355, with the friction law of Swafford, AIAA J. 21 (1983) (coefficients
 * from memory, tested against the flat plate). In the wake there is no wall friction and the dissipation counts for both halves.
 */
export class TurbulentClosure implements Closure {
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
  /** √CT in equilibrium. */
  ceq = 0;
  ceqH = 0;
  ceqR = 0;

  /** @param h shape factor, above 1 @param r Rθ, above 0 @param c √CT @param wake no wall */
  at(h: number, r: number, c: number, wake: boolean): this {
    const low = r < LOWEST_R;
    const bounded = low ? LOWEST_R : r;
    const log = Math.log(bounded);
    this.energy(h, bounded, log);
    if (wake) this.cf = this.cfH = this.cfR = 0;
    else this.friction(h, bounded, log);
    this.stress(h, c, wake);
    if (low) this.hsR = this.cfR = this.diR = this.ceqR = 0;
    return this;
  }

  /**
   * H₀ = 4 (Rθ < 400), 3 + 400/Rθ above;
   * H* = 1.505 + 4/Rθ + (0.165 − 1.6/√Rθ)(H₀−H)^1.6/H                                     H < H₀
   *      1.505 + 4/Rθ + (H−H₀)² [0.04/H + 0.007 ln Rθ/(H − H₀ + 4/ln Rθ)²]                  H > H₀
   */
  private energy(h: number, r: number, log: number): void {
    const h0 = r < 400 ? 4 : 3 + 400 / r;
    const h0R = r < 400 ? 0 : -400 / (r * r);
    this.hs = 1.505 + 4 / r;
    this.hsR = -4 / (r * r);
    if (h < h0) {
      const root = Math.sqrt(r);
      const d = h0 - h;
      const power = d ** 0.6;
      const k = 0.165 - 1.6 / root;
      this.hs += (k * power * d) / h;
      this.hsH = (-k * power * (1.6 + d / h)) / h;
      this.hsR += ((0.8 / (r * root)) * power * d + k * 1.6 * power * h0R) / h;
      return;
    }
    const d = h - h0;
    const e = d + 4 / log;
    const bracket = 0.04 / h + (0.007 * log) / (e * e);
    const byD = 2 * d * bracket - (d * d * 0.014 * log) / (e * e * e);
    this.hs += d * d * bracket;
    this.hsH = byD - (0.04 * d * d) / (h * h);
    const byLog = d * d * (0.007 / (e * e) + 0.056 / (log * e * e * e));
    this.hsR += -byD * h0R + byLog / r;
  }

  /** cf = 0.3 exp(−1.33 H)(log₁₀ Rθ)^(−1.74−0.31 H) + 0.00011 [tanh(4 − H/0.875) − 1]; stored as cf/2. */
  private friction(h: number, r: number, log: number): void {
    const decades = log / Math.LN10;
    const logDecades = Math.log(decades);
    const exponent = -1.74 - 0.31 * h;
    const main = 0.15 * Math.exp(-1.33 * h + exponent * logDecades);
    const t = Math.tanh(4 - h / 0.875);
    this.cf = main + 0.000055 * (t - 1);
    this.cfH = main * (-1.33 - 0.31 * logDecades) - (0.000055 * (1 - t * t)) / 0.875;
    this.cfR = (main * exponent) / (r * log);
  }

  /**
   * Us = (H* / 2)[1 − (4/3)(H−1)/H];  CD = (cf/2) Us + CT (1 − Us), doubled in the wake for its two halves;
   * CTeq = H* 0.015/(1 − Us) (H−1)³/H³.
   */
  private stress(h: number, c: number, wake: boolean): void {
    const shape = 1 - (4 / 3) * (1 - 1 / h);
    const highest = wake ? HIGHEST_US_WAKE : HIGHEST_US;
    let us = (this.hs / 2) * shape;
    let usH = (this.hsH / 2) * shape - ((2 / 3) * this.hs) / (h * h);
    let usR = (this.hsR / 2) * shape;
    if (us > highest) [us, usH, usR] = [highest, 0, 0];
    const halves = wake ? 4 : 2;
    const ct = c * c;
    const cd = 2 * this.cf * us + halves * ct * (1 - us);
    const byUs = 2 * this.cf - halves * ct;
    this.di = cd / this.hs;
    this.diH = (2 * this.cfH * us + byUs * usH - this.di * this.hsH) / this.hs;
    this.diR = (2 * this.cfR * us + byUs * usR - this.di * this.hsR) / this.hs;
    this.diC = (2 * halves * c * (1 - us)) / this.hs;
    const base = 1 - 1 / h;
    const free = 1 - us;
    this.ceq = Math.sqrt(((this.hs * 0.015) / free) * base * base * base);
    this.ceqH = (this.ceq / 2) * (this.hsH / this.hs + usH / free + 3 / (h * h * base));
    this.ceqR = (this.ceq / 2) * (this.hsR / this.hs + usR / free);
  }
}
