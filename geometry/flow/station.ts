import { type Closure } from './closure.ts';
import { LaminarClosure } from './laminar.ts';
import { TurbulentClosure } from './turbulent.ts';

/** The layer's state at a place: laminar, turbulent on the surface, or wake. */
export type Regime = 0 | 1 | 2;
export const LAMINAR = 0;
export const TURBULENT = 1;
export const WAKE = 2;

/** Largest thickness of the layer in momentum thicknesses that counts in the lag equation [own limit]. */
const THICKEST = 12;

/** A quantity with its slopes against θ, δ*, ue and c. */
export class Slopes {
  value = 0;
  t = 0;
  d = 0;
  u = 0;
  c = 0;
}

/**
 * One station of the boundary layer: what the integral equations need there, with slopes. Lengths in chords, speeds over free stream.
 */
export class Station {
  regime: Regime = LAMINAR;
  /** Arc length from the stagnation point. */
  s = 0;
  theta = 0;
  dstar = 0;
  ue = 0;
  /** √CT where the layer is turbulent. */
  c = 0;
  /** Dead air behind a blunt edge over θ. */
  gap = 0;
  h = 0;
  r = 0;
  /** H, ln H*, (cf/2)/θ, (cf/2 − 2CD/H*)/θ, √CTeq and the layer's thickness δ. */
  readonly shape = new Slopes();
  readonly energy = new Slopes();
  readonly friction = new Slopes();
  readonly balance = new Slopes();
  readonly equilibrium = new Slopes();
  readonly thickness = new Slopes();
  private readonly laminar = new LaminarClosure();
  private readonly turbulent = new TurbulentClosure();

  /** @param nu kinematic viscosity over speed and chord, 1/Re @param deadAir thickness of the dead air behind a blunt edge */
  set(
    regime: Regime,
    s: number,
    theta: number,
    dstar: number,
    ue: number,
    c: number,
    nu: number,
    deadAir: number,
  ): void {
    this.regime = regime;
    this.s = s;
    this.theta = theta;
    this.dstar = dstar;
    this.ue = ue;
    this.c = c;
    this.gap = deadAir / theta;
    const h = (this.h = dstar / theta);
    const r = (this.r = (ue * theta) / nu);
    const { shape } = this;
    shape.value = h;
    shape.t = -h / theta;
    shape.d = 1 / theta;
    if (regime === LAMINAR) this.derive(this.laminar.at(h, r));
    else {
      const closure = this.turbulent.at(h, r, c, regime === WAKE);
      this.derive(closure);
      this.chain(this.equilibrium, closure.ceq, closure.ceqH, closure.ceqR, 0);
      this.deriveThickness();
    }
  }

  private derive(k: Closure): void {
    const { theta } = this;
    this.chain(this.energy, Math.log(k.hs), k.hsH / k.hs, k.hsR / k.hs, 0);
    this.chain(this.friction, k.cf / theta, k.cfH / theta, k.cfR / theta, 0);
    this.friction.t -= this.friction.value / theta;
    this.chain(
      this.balance,
      (k.cf - k.di) / theta,
      (k.cfH - k.diH) / theta,
      (k.cfR - k.diR) / theta,
      -k.diC / theta,
    );
    this.balance.t -= this.balance.value / theta;
  }

  /** δ = θ (3.15 + 1.72/(H−1)) + δ* (Drela & Giles 1987), at most 12 θ. */
  private deriveThickness(): void {
    const { theta, dstar, h, thickness } = this;
    const e = 1 / (h - 1);
    const value = theta * (3.15 + 1.72 * e) + dstar;
    if (value < THICKEST * theta) {
      thickness.value = value;
      thickness.t = 3.15 + 1.72 * e + 1.72 * e * e * h;
      thickness.d = 1 - 1.72 * e * e;
    } else {
      thickness.value = THICKEST * theta;
      thickness.t = THICKEST;
      thickness.d = 0;
    }
  }

  private chain(to: Slopes, value: number, byH: number, byR: number, byC: number): void {
    to.value = value;
    to.t = (byR * this.r - byH * this.h) / this.theta;
    to.d = byH / this.theta;
    to.u = (byR * this.r) / this.ue;
    to.c = byC;
  }
}
