import { HIGHEST_MACH, karmanTsien } from './compressibility.ts';
import { shapeError } from '../shapes/error.ts';
import { type Panels } from './panels.ts';

/** What the pressures add up to. */
export interface Forces {
  /** Pressure coefficient at the nodes. */
  readonly cp: Float64Array;
  /** Lift coefficient. */
  readonly cl: number;
  /** Moment coefficient about (0.25, 0), nose-up positive. */
  readonly cm: number;
  /** Lowest pressure coefficient at a node. */
  readonly lowestCp: number;
}

/**
 * Integrates the pressures: cp is averaged over each panel for a speed linear along it, (γ₁² + γ₁γ₂ + γ₂²)/3, which is exact for these
 * panels; the face of a blunt edge has the pressure of the speed with which the flow leaves.
 * @param speed at the nodes, over free stream @param alpha radians @param mach 0 … 0.5
 * @throws ShapeError when the Mach number is out of range
 */
export function forcesOf(panels: Panels, speed: Float64Array, alpha: number, mach: number): Forces {
  if (!(mach >= 0 && mach <= HIGHEST_MACH))
    throw shapeError('mach', `mach must be between 0 and ${HIGHEST_MACH}`);
  const correct = (square: number) => (mach === 0 ? 1 - square : karmanTsien(1 - square, mach));
  const cp = speed.map((value) => correct(value * value));
  const last = panels.nodes - 1;
  let [fx, fy, cm] = [0, 0, 0];
  const add = (pressure: number, dx: number, dy: number, x: number, y: number) => {
    // The outer normal times the length is (dy, −dx); pressure pushes against it.
    const [px, py] = [-pressure * dy, pressure * dx];
    fx += px;
    fy += py;
    cm -= (x - 0.25) * py - y * px;
  };
  for (let j = 0; j < last; j++) {
    const [u1, u2] = [speed[j] ?? 0, speed[j + 1] ?? 0];
    const l = panels.length[j] ?? 0;
    const [x, y] = [
      ((panels.x[j] ?? 0) + (panels.x[j + 1] ?? 0)) / 2,
      ((panels.y[j] ?? 0) + (panels.y[j + 1] ?? 0)) / 2,
    ];
    add(correct((u1 * u1 + u1 * u2 + u2 * u2) / 3), (panels.tx[j] ?? 0) * l, (panels.ty[j] ?? 0) * l, x, y);
  }
  const leaving = ((speed[0] ?? 0) - (speed[last] ?? 0)) / 2;
  const { edge } = panels;
  add(correct(leaving * leaving), edge.tx * edge.gap, edge.ty * edge.gap, edge.x, edge.y);
  return { cp, cl: fy * Math.cos(alpha) - fx * Math.sin(alpha), cm, lowestCp: Math.min(...cp) };
}
