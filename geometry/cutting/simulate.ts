import { type Polyline, at, polylineOf } from './arrays.ts';
import { type ExpectedCore } from './expected-core.ts';
import { type Finding, error, mm, warning } from './findings.ts';
import { limitBreaches } from './limits.ts';
import { type WireSetup } from './plan.ts';
import { type ReadMove, readProgram } from './read-program.ts';
import { type PlaneDeviation, deviationAt } from './swept-core.ts';
import { benchOf, fromTowers } from './towers.ts';

/** The cut may differ from the plan by this much, mm. */
export const SIMULATION_TOLERANCE_MM = 0.02;
/** Between the faces a difference up to this is a warning: what a straight wire can't do, small beside the scatter of a kerf. Our choice, mm. */
const BETWEEN_MM = 0.1;
/** Planes across the span: both faces and five between. */
export const PLANES = [0, 1 / 6, 2 / 6, 3 / 6, 4 / 6, 5 / 6, 1] as const;

/** What a program does when it is run. */
export interface Simulation {
  /** Moves and waits together, s. */
  readonly totalSeconds: number;
  /** For each core and plane how far the cut is from the plan. */
  readonly deviations: readonly (PlaneDeviation & { readonly core: number })[];
  readonly largestDeviationMm: number;
  readonly findings: readonly Finding[];
}

/**
 * Reads a machine program back and runs it: the wire between both towers sweeps the foam, and the core it leaves is compared with the planned one at
 * root, tip and five planes between; travel, feed and the block are checked on what the text says. Every breach is a finding with its
 * line.
 *
 * Between the ends a straight wire can't touch a twisted core along a whole ruling: where the surface normals of both ends differ by the angle δ, it
 * runs about h (1 − cos δ/2) too near for half a kerf of h, a little more where the kerf changes. That is no fault of the program. With
 * sections alike, 5° of washout and 1.6 mm of kerf it is below 0.006 mm; above 0.02 mm it comes with more than some 10° of washout, or
 * at the nose of a panel whose sections differ much.
 * @param text the program, from wherever it comes
 * @param cores what must come out, in the order of the block
 */
export function simulate(text: string, plan: WireSetup, cores: readonly ExpectedCore[]): Simulation {
  const read = readProgram(text, plan.machine);
  const bench = benchOf(plan);
  const towers = {
    left: polylineOf(read.moves.map(({ leftX, leftY }) => ({ x: leftX, y: leftY }))),
    right: polylineOf(read.moves.map(({ rightX, rightY }) => ({ x: rightX, y: rightY }))),
  };
  const plane = (share: number): Polyline =>
    fromTowers(bench, towers, bench.leftFaceMm + share * (bench.rightFaceMm - bench.leftFaceMm));
  const wires = PLANES.map((share) => plane(share));
  const deviations = cores.flatMap((core, index) =>
    PLANES.map((share, k) => ({ ...deviationAt(wires[k] ?? plane(share), core, share), core: index })),
  );
  const faces = { left: plane(0), right: plane(1) };
  const worst = deviations.reduce(
    (most, of) => (of.deviationMm > (most?.deviationMm ?? 0) ? of : most),
    deviations[0],
  );
  const findings = [
    ...read.findings,
    ...limitBreaches(plan, read.moves, faces, cores),
    ...deviations.flatMap((of) => deviationFinding(plan, read.moves, of, of === worst)),
  ];
  const largestDeviationMm = worst?.deviationMm ?? 0;
  return { totalSeconds: read.totalSeconds, deviations, largestDeviationMm, findings };
}

/** What a difference gives reason to say; one that is no fault is said once, where it is largest. */
function deviationFinding(
  plan: WireSetup,
  moves: readonly ReadMove[],
  of: PlaneDeviation,
  worst: boolean,
): Finding[] {
  if (of.deviationMm <= SIMULATION_TOLERANCE_MM) return [];
  const line = moves[of.move]?.line ?? 0;
  const left = at(
    PLANES,
    PLANES.findIndex((share) => share === of.share),
  );
  const fromRoot = plan.machine.rootFace === 'left' ? left : 1 - left;
  const spanMm = fromRoot * plan.panel.spanMm;
  const difference = `Line ${line}: the cut differs from the plan by ${mm(of.deviationMm, 3)} at ${mm(spanMm, 0)} from the root`;
  const place = { line, spanMm };
  if (of.share === 0 || of.share === 1 || of.deviationMm > BETWEEN_MM)
    return [error('cut-differs', 'cut.toleranceMm', `${difference}.`, place)];
  if (!worst) return [];
  const message = `${difference}: a straight wire can’t follow sections that turn so much from root to tip.`;
  return [warning('cut-differs-between', 'panel', message, place)];
}
