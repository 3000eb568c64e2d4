import { type OuterFlow } from './coupling.ts';
import { type Layer } from './layer.ts';
import { March } from './march.ts';
import { NewtonSystem } from './newton.ts';
import { project } from './project.ts';
import { LAMINAR } from './station.ts';
import { coldStart } from './start.ts';

/** A run that has not converged by then moves between two states or is lost. */
const MOST_ITERATIONS = 30;
/** Root mean square of the speeds by which layer and outer flow may differ at the end, over free stream. */
const CLOSE = 2e-5;
/** The system of the last step serves again when that step brought layer and outer flow this much closer. */
const REUSE = 0.2;
/** Smallest damping of the steps when they do not bring both closer. */
const SMALLEST_STEP = 0.2;

/** How an iteration ended. */
export interface Convergence {
  readonly converged: boolean;
  readonly iterations: number;
}

/**
 * Layer and outer flow solved together: in turn the layer is brought onto its equations (project) and both onto each other by a Newton
 * step. Steps that do not bring them closer are halved, which ends the to and fro of a transition point at a node [own choice].
 */
export class CoupledLayer {
  readonly layer: Layer;
  readonly march: March;
  private readonly newton: NewtonSystem;
  private readonly mismatch: Float64Array;
  private readonly self: Float64Array;
  private readonly signed: Float64Array;

  constructor(layer: Layer) {
    this.layer = layer;
    this.march = new March(layer);
    this.newton = new NewtonSystem(this.march);
    this.mismatch = new Float64Array(layer.size);
    this.self = new Float64Array(layer.size);
    this.signed = new Float64Array(layer.size);
  }

  /** A first state from nothing. */
  start(outer: OuterFlow): void {
    coldStart(this.march, outer);
  }

  /** Carries the state over to another angle: the speeds change by as much as those without a layer do. */
  shift(from: Float64Array, to: OuterFlow): void {
    const { layer, signed } = this;
    for (let i = 0; i < layer.size; i++) {
      signed[i] = (layer.ue[i] ?? 0) + layer.sign(i) * ((to.inviscid[i] ?? 0) - (from[i] ?? 0));
    }
    layer.takeSpeeds(signed);
  }

  /** Iterates from the present state; when it does not converge the state left behind is of no use. */
  iterate(outer: OuterFlow): Convergence {
    const { layer, march, newton, mismatch } = this;
    this.setSelfInfluence(outer);
    let [before, damping, taken, iteration] = [Infinity, 1, 1, 1];
    for (; iteration <= MOST_ITERATIONS; iteration++) {
      layer.measure();
      layer.measureWake(outer);
      project(march, this.self);
      const apart = newton.mismatch(outer, mismatch);
      if (!Number.isFinite(apart)) break;
      if (apart < CLOSE && march.failures === 0) return { converged: true, iterations: iteration };
      const slow = iteration > 3 && apart > (1 - 0.5 * taken) * before;
      damping = slow ? Math.max(SMALLEST_STEP, damping / 2) : Math.min(1, damping * 1.5);
      const fresh = iteration === 1 || iteration > 8 || march.failures > 0 || apart > REUSE * before;
      if (!newton.solve(outer, mismatch, fresh)) break;
      taken = damping * newton.largestStep();
      if (!Number.isFinite(taken)) break;
      this.take(taken);
      before = apart;
    }
    return { converged: false, iterations: Math.min(iteration, MOST_ITERATIONS) };
  }

  /** The speeds' answer to a node's own defect; at the ends, where it is no measure, that of the next node inside. */
  private setSelfInfluence(outer: OuterFlow): void {
    const { self } = this;
    const n = this.layer.panels.nodes;
    for (let i = 0; i < outer.size; i++) self[i] = outer.influence[i * outer.size + i] ?? 0;
    self[0] = self[1] = self[2] ?? 0;
    self[n - 1] = self[n - 2] = self[n - 3] ?? 0;
    self[n] = self[n + 1] ?? 0;
  }

  private take(factor: number): void {
    const { layer, signed } = this;
    const { theta, dstar, c, ue } = this.newton.change;
    for (let i = 0; i < layer.size; i++) {
      layer.theta[i] = (layer.theta[i] ?? 0) + factor * (theta[i] ?? 0);
      layer.dstar[i] = (layer.dstar[i] ?? 0) + factor * (dstar[i] ?? 0);
      if (layer.regime[i] !== LAMINAR) layer.c[i] = (layer.c[i] ?? 0) + factor * (c[i] ?? 0);
      signed[i] = (layer.ue[i] ?? 0) + factor * (ue[i] ?? 0);
    }
    layer.keepShape();
    layer.takeSpeeds(signed);
  }
}
