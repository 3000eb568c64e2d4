import { type ViscousInput } from './conditions.ts';
import { type Coupling } from './coupling.ts';
import { shapeError } from '../shapes/error.ts';
import { type FlowPoint, type SolvedPoint } from './flow-point.ts';
import { ANGLES_DEG, ViscousSection } from './viscous.ts';

/** A range of angles, degrees. */
export interface SweepRange {
  readonly fromDeg: number;
  readonly toDeg: number;
  readonly stepDeg: number;
}

/** Most angles in a sweep. */
export const MOST_ANGLES = 400;
/** The curve is followed this far beyond its highest (lowest) lift. */
const BEYOND_STALL_DEG = 3;
/** So many angles in a row that do not converge end a branch. */
const MOST_FAILURES = 3;

/**
 * A sweep in angle, one point at a time in the order of calculation: from the angle nearest 0 upwards and then from there downwards, each
 * from the one before. A branch ends three degrees beyond the stall or after three failures; what lies beyond is left out.
 * A caller that wants to report progress or stop takes the points from the generator; the return value is all points by angle.
 * @param section from prepareSection
 * @throws ShapeError naming the value out of range
 */
export function* sweep(
  section: Coupling,
  conditions: ViscousInput,
  range: SweepRange,
): Generator<FlowPoint, FlowPoint[], undefined> {
  const angles = anglesOf(range);
  const start = angles.reduce(
    (best, value, i) => (Math.abs(value) < Math.abs(angles[best] ?? Infinity) ? i : best),
    0,
  );
  const points: FlowPoint[] = [];
  yield* branch(new ViscousSection(section, conditions), angles.slice(start), 1, points);
  yield* branch(new ViscousSection(section, conditions), angles.slice(0, start).reverse(), -1, points);
  return points.sort((a, b) => a.alphaDeg - b.alphaDeg);
}

/** The whole sweep at once. @throws ShapeError naming the value out of range */
export function sweepAll(section: Coupling, conditions: ViscousInput, range: SweepRange): FlowPoint[] {
  const steps = sweep(section, conditions, range);
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}

function* branch(
  section: ViscousSection,
  angles: readonly number[],
  sign: 1 | -1,
  points: FlowPoint[],
): Generator<FlowPoint, void, undefined> {
  let highest: SolvedPoint | null = null;
  let failures = 0;
  for (const alphaDeg of angles) {
    const point = section.at(alphaDeg);
    points.push(point);
    yield point;
    failures = point.converged ? 0 : failures + 1;
    if (point.converged && (highest === null || sign * point.cl > sign * highest.cl)) highest = point;
    const beyond = highest === null ? 0 : sign * (alphaDeg - highest.alphaDeg);
    if (failures === MOST_FAILURES || beyond >= BEYOND_STALL_DEG) return;
  }
}

/** The angles of a range, ascending; multiples of the step from the lowest on. @throws ShapeError naming the value out of range */
export function anglesOf({ fromDeg, toDeg, stepDeg }: SweepRange): number[] {
  const { min, max } = ANGLES_DEG;
  if (!(fromDeg >= min && fromDeg <= max))
    throw shapeError('fromDeg', `fromDeg must be between ${min} and ${max}°`);
  if (!(toDeg >= fromDeg && toDeg <= max))
    throw shapeError('toDeg', `toDeg must be between fromDeg and ${max}°`);
  const count = Math.floor((toDeg - fromDeg) / stepDeg + 1e-9) + 1;
  if (!(stepDeg >= 0.05 && count <= MOST_ANGLES)) {
    throw shapeError('stepDeg', `stepDeg must be at least 0.05° and give at most ${MOST_ANGLES} angles`);
  }
  // Rounded so that 0 is met exactly and the same angle has the same name in every curve.
  return Array.from({ length: count }, (_, i) => Math.round((fromDeg + i * stepDeg) * 1e6) / 1e6);
}
