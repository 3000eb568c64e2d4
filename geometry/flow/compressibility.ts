import { shapeError } from '../shapes/error.ts';

/** Highest free-stream Mach number accepted; the correction holds while the flow stays subsonic everywhere (see criticalPressure). */
export const HIGHEST_MACH = 0.5;
/** Ratio of specific heats of air (ISO 2533). */
const GAMMA = 1.4;

/**
 * Kármán–Tsien correction (Tsien, J. Aeronaut. Sci. 6, 1939; von Kármán, J. Aeronaut. Sci. 8, 1941):
 * cp = cp₀ / [β + M² cp₀ / (2 (1 + β))], β = √(1 − M²). It holds for slender sections while the flow is subsonic everywhere, that is while
 * cp stays above criticalPressure(M).
 * @param cp0 incompressible pressure coefficient @param mach 0 … 0.5
 * @throws ShapeError when the Mach number is out of range
 */
export function karmanTsien(cp0: number, mach: number): number {
  checkMach(mach);
  const beta = Math.sqrt(1 - mach * mach);
  return cp0 / (beta + (mach * mach * cp0) / (2 * (1 + beta)));
}

/**
 * The pressure coefficient at which air at rest far away at Mach M becomes sonic (isentropic flow; textbook):
 * cp* = 2/(γ M²) { [2/(γ+1) (1 + (γ−1)/2 M²)]^(γ/(γ−1)) − 1 }.
 * @param mach above 0 … 0.5
 * @throws ShapeError when the Mach number is out of range or 0
 */
export function criticalPressure(mach: number): number {
  checkMach(mach);
  if (mach === 0) throw shapeError('mach', 'mach must be above 0 for a critical pressure');
  const ratio = (2 / (GAMMA + 1)) * (1 + ((GAMMA - 1) / 2) * mach * mach);
  return (2 / (GAMMA * mach * mach)) * (ratio ** (GAMMA / (GAMMA - 1)) - 1);
}

function checkMach(mach: number): void {
  if (!(mach >= 0 && mach <= HIGHEST_MACH))
    throw shapeError('mach', `mach must be between 0 and ${HIGHEST_MACH}`);
}
