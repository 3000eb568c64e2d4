import { type Contour } from '../contour/contour.ts';
import { type ViscousConditions, type ViscousInput, checkConditions } from './conditions.ts';
import { CoupledLayer } from './coupled.ts';
import { Coupling, type OuterFlow } from './coupling.ts';
import { type Distribution, type FlowPoint, distributionOf, pointOf } from './flow-point.ts';
import { panelSystem } from './inviscid.ts';
import { LiftSearch } from './lift-search.ts';
import { Layer } from './layer.ts';
import { panelsOf } from './panels.ts';
import { WAKE_NODES } from './wake.ts';

/** Angles accepted, degrees. */
export const ANGLES_DEG = { min: -30, max: 30 } as const;
/** A solution further away than this is no start for an angle, degrees. */
const NEAR_DEG = 4;
/** Angles tried on the way to a lift coefficient, and how near it has to come. */
const LIFT_STEPS = 16;
const LIFT_CLOSE = 2e-4;
/** So many angles may fail on the way; the next is tried a little aside, degrees. */
const LIFT_FAILURES = 2;
const ASIDE_DEG = 0.15;

/**
 * A section prepared for viscous calculations at any conditions: the factored panel equations and the influence of mass defects on the
 * surface.
 * @param contour chord about 1, nose at x = 0; its points are the panels' ends: see panelOutline, 160 panels is a good number
 * @throws ShapeError for a contour that cannot be solved
 */
export function prepareSection(contour: Contour): Coupling {
  return new Coupling(panelSystem(panelsOf(contour), true));
}

/**
 * A section at given conditions. Each angle starts from the last one that converged, so that neighbouring angles cost least; the answer
 * does not depend on the way (to about 1e-4).
 */
export class ViscousSection {
  readonly conditions: ViscousConditions;
  private readonly coupling: Coupling;
  private readonly coupled: CoupledLayer;
  private readonly good: Layer;
  private goodDeg: number | null = null;
  private goodOuter: OuterFlow | null = null;

  /** @param coupling from prepareSection; shared by any number of conditions @throws ShapeError naming the condition out of range */
  constructor(coupling: Coupling, conditions: ViscousInput) {
    this.conditions = checkConditions(conditions);
    this.coupling = coupling;
    const { panels } = coupling.system;
    const size = panels.nodes + WAKE_NODES;
    this.coupled = new CoupledLayer(new Layer(panels, size, this.conditions));
    this.good = new Layer(panels, size, this.conditions);
  }

  /** Forgets the last solution: the next angle starts from nothing. */
  reset(): void {
    this.goodDeg = this.goodOuter = null;
  }

  /**
   * The section at an angle. When it does not converge from the neighbouring angle, it is tried from nothing and then by way of the angle
   * half way.
   * @param alphaDeg −30 … 30 degrees
   */
  at(alphaDeg: number): FlowPoint {
    if (!(alphaDeg >= ANGLES_DEG.min && alphaDeg <= ANGLES_DEG.max))
      return { converged: false, alphaDeg, iterations: 0 };
    const [from, outer] = [this.goodDeg, this.coupling.at((alphaDeg * Math.PI) / 180)];
    let point = this.attempt(alphaDeg, outer, true);
    if (!point.converged && from !== null) point = this.attempt(alphaDeg, outer, false, point.iterations);
    if (!point.converged && from !== null && Math.abs(alphaDeg - from) > 0.02) {
      const half = (alphaDeg + from) / 2;
      const middle = this.attempt(half, this.coupling.at((half * Math.PI) / 180), true, point.iterations);
      point = middle.converged
        ? this.attempt(alphaDeg, outer, true, middle.iterations)
        : { ...middle, alphaDeg };
    }
    return point;
  }

  /**
   * The section at a lift coefficient on the rising part of its lift curve, by a search in angle (see lift-search.ts).
   * @param cl −3 … 3 @returns the point nearest in angle to the target, not converged when the section does not reach it
   */
  atLift(cl: number): FlowPoint {
    const search = new LiftSearch(cl);
    let [alphaDeg, iterations, failures] = [this.goodDeg ?? 0, 0, 0];
    for (let step = 0; step < LIFT_STEPS && Math.abs(alphaDeg) < ANGLES_DEG.max; step++) {
      const point = this.at(alphaDeg);
      iterations += point.iterations;
      if (!point.converged) {
        if (++failures > LIFT_FAILURES) break;
        alphaDeg += ASIDE_DEG;
        continue;
      }
      if (Math.abs(point.cl - cl) < LIFT_CLOSE) return { ...point, iterations };
      const next = search.next(point);
      if (next === null) break;
      alphaDeg = next;
    }
    return { converged: false, alphaDeg, iterations };
  }

  /** Pressures and layer of the last angle that converged, or null before the first. */
  distribution(): Distribution | null {
    return this.goodOuter === null ? null : distributionOf(this.good, this.goodOuter, this.conditions.mach);
  }

  private attempt(alphaDeg: number, outer: OuterFlow, warm: boolean, spent = 0): FlowPoint {
    const { coupled } = this;
    if (warm && this.goodOuter !== null && Math.abs(alphaDeg - (this.goodDeg ?? 0)) <= NEAR_DEG) {
      coupled.layer.copyFrom(this.good);
      coupled.shift(this.goodOuter.inviscid, outer);
    } else coupled.start(outer);
    const { converged, iterations } = coupled.iterate(outer);
    const point = converged
      ? pointOf(coupled.layer, outer, alphaDeg, this.conditions.mach, spent + iterations)
      : null;
    if (point === null) return { converged: false, alphaDeg, iterations: spent + iterations };
    this.good.copyFrom(coupled.layer);
    this.goodDeg = alphaDeg;
    this.goodOuter = outer;
    return point;
  }
}
