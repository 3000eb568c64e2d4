import { LOWEST_H, LOWEST_H_WAKE, type Layer } from './layer.ts';
import { LAMINAR, type Regime, WAKE } from './station.ts';

/** What closes the equations of one station besides its interval. */
export interface Closing {
  /** `speed`: ue is held; `shape`: H is held; `line`: ue = ue₀ + κ (m − m₀) round the present state. */
  readonly kind: 'speed' | 'shape' | 'line';
  /** H to hold, or κ. */
  readonly value: number;
}

/** Largest relative change of one step. */
const BOUND = 0.3;

/**
 * The state of one station on trial. Its unknowns are θ, √CT and a third, z, which is δ*, ue or the mass defect m = ue δ* by the closing
 * relation; a step in them moves δ* by shapeT δθ + shapeZ δz and ue by speedZ δz.
 */
export class Trial {
  theta = 0;
  dstar = 0;
  ue = 0;
  c = 0;
  shapeT = 0;
  shapeZ = 0;
  speedZ = 0;
  private regime: Regime = LAMINAR;
  private closing: Closing = { kind: 'speed', value: 0 };
  private air = 0;
  private ue0 = 0;
  private m0 = 0;

  /** Takes up node i from the layer. */
  begin(layer: Layer, i: number, regime: Regime, closing: Closing): void {
    this.regime = regime;
    this.closing = closing;
    this.air = layer.deadAir[i] ?? 0;
    this.theta = layer.theta[i] ?? 0;
    this.dstar = closing.kind === 'shape' ? closing.value * this.theta : (layer.dstar[i] ?? 0);
    this.ue = this.ue0 = layer.ue[i] ?? 0;
    this.c = layer.c[i] ?? 0;
    this.m0 = this.ue * (this.dstar + this.air);
    this.direct();
  }

  private direct(): void {
    const { kind, value } = this.closing;
    this.shapeT = kind === 'shape' ? value : 0;
    this.speedZ = kind === 'speed' ? 0 : kind === 'shape' ? 1 : value;
    if (kind === 'line') this.shapeZ = (1 - (this.dstar + this.air) * value) / this.ue;
    else this.shapeZ = kind === 'speed' ? 1 : 0;
  }

  /** The largest relative change that a step means. */
  size(theta: number, c: number, z: number): number {
    const dstar = this.shapeT * theta + this.shapeZ * z;
    const stress = this.regime === LAMINAR ? 0 : Math.abs(c / this.c);
    const speed = Math.abs((this.speedZ * z) / this.ue);
    return Math.max(Math.abs(theta / this.theta), Math.abs(dstar / this.dstar), speed, stress);
  }

  /** Takes as much of a step as keeps the changes within bounds. @param size from `size` */
  take(theta: number, c: number, z: number, size: number): void {
    const part = Math.min(1, BOUND / size);
    const { kind, value } = this.closing;
    this.theta += part * theta;
    if (this.regime !== LAMINAR) this.c += part * c;
    if (kind === 'speed') this.dstar += part * z;
    else if (kind === 'shape') {
      this.ue += part * z;
      this.dstar = value * this.theta;
    } else {
      // On the line exactly, whatever the step.
      const m = this.ue * (this.dstar + this.air) + part * z;
      this.ue = Math.max(0.05 * this.ue0, this.ue0 + value * (m - this.m0));
      this.dstar = m / this.ue - this.air;
    }
    this.dstar = Math.max(this.dstar, (this.regime === WAKE ? LOWEST_H_WAKE : LOWEST_H) * this.theta);
    this.direct();
  }
}
