import { Interval, PER_ROW } from './interval.ts';
import { LAMINAR, Station, TURBULENT } from './station.ts';
import { START_SHARE } from './turbulent.ts';

const START = Math.sqrt(START_SHARE);

/**
 * The interval in which the layer turns turbulent, at a share ξ of its length (Drela & Giles, AIAA J. 25, 1987): the state there is
 * interpolated linearly; the laminar equations hold up to it and the turbulent ones behind it, and their residuals are added. Shear stress
 * starts with CT = 0.7 CTeq.
 */
export class Crossing {
  readonly residual = new Float64Array(3);
  readonly up = new Float64Array(3 * PER_ROW);
  readonly down = new Float64Array(3 * PER_ROW);
  /** Slopes of the residuals against ξ. */
  readonly share = new Float64Array(3);
  private readonly laminarEnd = new Station();
  private readonly turbulentStart = new Station();
  private readonly ahead = new Interval();
  private readonly behind = new Interval();

  /** @param a laminar @param b turbulent @param xi 0 … 1 @param nu 1/Re */
  between(a: Station, b: Station, xi: number, nu: number): void {
    const s = a.s + xi * (b.s - a.s);
    const theta = a.theta + xi * (b.theta - a.theta);
    const dstar = a.dstar + xi * (b.dstar - a.dstar);
    const ue = a.ue + xi * (b.ue - a.ue);
    const { laminarEnd, turbulentStart: start, ahead, behind } = this;
    laminarEnd.set(LAMINAR, s, theta, dstar, ue, 0, nu, 0);
    start.set(TURBULENT, s, theta, dstar, ue, 0.03, nu, 0);
    start.set(TURBULENT, s, theta, dstar, ue, START * start.equilibrium.value, nu, 0);
    ahead.between(a, laminarEnd);
    behind.between(start, b);
    for (let row = 0; row < 3; row++) this.join(row, a, b, xi);
  }

  private join(row: number, a: Station, b: Station, xi: number): void {
    const { ahead, behind, turbulentStart: start, up, down } = this;
    const at = row * PER_ROW;
    const laminar = row < 2;
    this.residual[row] = (laminar ? (ahead.residual[row] ?? 0) : 0) + (behind.residual[row] ?? 0);
    const byC = START * (behind.up[at + 3] ?? 0);
    const e = start.equilibrium;
    const chain = [byC * e.t, byC * e.d, byC * e.u, 0, 0];
    const apart = [b.theta - a.theta, b.dstar - a.dstar, b.ue - a.ue, 0, b.s - a.s];
    let share = 0;
    for (let k = 0; k < PER_ROW; k++) {
      const own = k === 3 ? 0 : (behind.up[at + k] ?? 0) + (laminar ? (ahead.down[at + k] ?? 0) : 0);
      const middle = own + (chain[k] ?? 0);
      share += middle * (apart[k] ?? 0);
      up[at + k] = (1 - xi) * middle + (laminar ? (ahead.up[at + k] ?? 0) : 0);
      down[at + k] = xi * middle + (behind.down[at + k] ?? 0);
    }
    this.share[row] = share;
  }
}
