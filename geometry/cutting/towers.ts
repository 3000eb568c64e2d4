import { type Polyline, between } from './arrays.ts';
import { type Finding, error, mm } from './findings.ts';
import { type WireSetup } from './plan.ts';

/** Where the faces stand between the towers, as distances from the left tower's plane, mm. */
export interface Bench {
  readonly leftFaceMm: number;
  readonly rightFaceMm: number;
  readonly towerDistanceMm: number;
}

/** Places of the panel's two faces on the machine: the block's left face, and the panel's span to the right of it. */
export function benchOf(plan: WireSetup): Bench {
  const leftFaceMm = plan.machine.blockFromLeftMm;
  return {
    leftFaceMm,
    rightFaceMm: leftFaceMm + plan.panel.spanMm,
    towerDistanceMm: plan.machine.towerDistanceMm,
  };
}

/**
 * Continues the straight wire through both faces to the tower planes:
 * P = P_left + (z − z_left) / (z_right − z_left) · (P_right − P_left), with z = 0 at the left and the tower distance at the right tower.
 */
export function toTowers(bench: Bench, left: Polyline, right: Polyline): { left: Polyline; right: Polyline } {
  const span = bench.rightFaceMm - bench.leftFaceMm;
  return {
    left: between(left, right, -bench.leftFaceMm / span),
    right: between(left, right, (bench.towerDistanceMm - bench.leftFaceMm) / span),
  };
}

/** The wire's points in the plane at a distance from the left tower, from its points on both towers. */
export function fromTowers(bench: Bench, towers: { left: Polyline; right: Polyline }, z: number): Polyline {
  return between(towers.left, towers.right, z / bench.towerDistanceMm);
}

/** Checks that the panel and its block stand between the towers. */
export function checkBench(plan: WireSetup): Finding[] {
  const { leftFaceMm, rightFaceMm, towerDistanceMm } = benchOf(plan);
  const span = plan.panel.spanMm;
  if (towerDistanceMm < span) {
    const message = `The towers stand ${mm(towerDistanceMm)} apart, closer than the foam’s span of ${mm(span)}.`;
    return [error('towers-too-close', 'machine.towerDistanceMm', message)];
  }
  if (leftFaceMm < 0 || rightFaceMm > towerDistanceMm) {
    const message = `The foam reaches from ${mm(leftFaceMm)} to ${mm(rightFaceMm)}, not between the towers at 0 mm and ${mm(towerDistanceMm)}.`;
    return [error('outside-towers', 'machine.blockFromLeftMm', message)];
  }
  return [];
}
