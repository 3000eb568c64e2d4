import { type OuterFlow } from './coupling.ts';
import { DenseMatrix } from './dense.ts';
import { type Change } from './growth.ts';
import { LOWEST_SPEED, type Layer, type Side } from './layer.ts';
import { type March, PER_NODE, PER_UNKNOWN } from './march.ts';
import { edgeStress } from './project.ts';
import { SideRows } from './side-rows.ts';
import { LAMINAR } from './station.ts';

/**
 * Newton's method for layer and outer flow together (simultaneous solution: Drela & Giles, AIAA J. 25, 1987). The stations' equations are
 * resolved from the stagnation point downstream, so that θ, c and ue are linear in the mass defects m = ue δ*; what is left is one dense
 * system, ue(m) = outer flow (m), of one equation for each node [own arrangement].
 */
export class NewtonSystem {
  readonly change: { theta: Float64Array; dstar: Float64Array; c: Float64Array; ue: Float64Array };
  private readonly layer: Layer;
  private readonly march: March;
  private readonly size: number;
  private readonly matrix: DenseMatrix;
  private readonly right: Float64Array;
  private readonly upper: SideRows;
  private readonly lower: SideRows;
  private readonly signed: Float64Array;

  constructor(march: March) {
    this.march = march;
    this.layer = march.layer;
    const size = (this.size = march.layer.size);
    const row = () => new Float64Array(size + 1);
    this.matrix = new DenseMatrix(size);
    this.right = new Float64Array(size);
    this.upper = new SideRows(march);
    this.lower = new SideRows(march);
    this.signed = row();
    this.change = { theta: row(), dstar: row(), c: row(), ue: row() };
  }

  /** Outer flow's speed less the layer's at each node; the largest and the root mean square tell how far both are apart. */
  mismatch(outer: OuterFlow, out: Float64Array): number {
    const { layer, size } = this;
    const defects = this.signed;
    for (let j = 0; j < size; j++) defects[j] = layer.sign(j) * layer.massDefect(j);
    let sum = 0;
    for (let i = 0; i < size; i++) {
      let speed = outer.inviscid[i] ?? 0;
      for (let j = 0; j < size; j++) speed += (outer.influence[i * size + j] ?? 0) * (defects[j] ?? 0);
      const value = layer.sign(i) * speed - (layer.ue[i] ?? 0);
      out[i] = value;
      // Within the stagnation point's play a node's speed may be the smallest there is instead of a little below 0.
      if ((layer.ue[i] ?? 0) > LOWEST_SPEED) sum += value * value;
    }
    return Math.sqrt(sum / size);
  }

  /**
   * The change of all stations that brings the linearised layer and the outer flow together.
   * @param mismatch from `mismatch` @param fresh builds and factors the system anew; otherwise that of the last step serves again
   * @returns false when the system is singular
   */
  solve(outer: OuterFlow, mismatch: Float64Array, fresh: boolean): boolean {
    const { right, layer, march } = this;
    if (!fresh) {
      right.set(mismatch);
      this.matrix.solve(right, 1);
      this.backOuter(outer, mismatch);
      return true;
    }
    this.resolveSide(layer.upper, march.upperChange, this.upper, outer, mismatch);
    this.resolveSide(layer.lower, march.lowerChange, this.lower, outer, mismatch);
    this.resolveWake(outer, mismatch);
    if (!this.matrix.factorise()) return false;
    this.matrix.solve(right, 1);
    this.back();
    return true;
  }

  /** Row i of the dense system: the layer's δue less the outer flow's answer = mismatch. */
  private closeRow(
    i: number,
    ue: Float64Array,
    outer: OuterFlow,
    mismatch: Float64Array,
    from: number,
    to: number,
  ): void {
    const { size, layer } = this;
    const matrix = this.matrix.values;
    const { influence } = outer;
    const at = i * size;
    const si = layer.sign(i);
    const [lower, wake] = [layer.lower.first, layer.panels.nodes];
    for (let j = 0; j < lower; j++) matrix[at + j] = -si * (influence[at + j] ?? 0);
    for (let j = lower; j < wake; j++) matrix[at + j] = si * (influence[at + j] ?? 0);
    for (let j = wake; j < size; j++) matrix[at + j] = -si * (influence[at + j] ?? 0);
    for (let j = from; j <= to; j++) matrix[at + j] = (matrix[at + j] ?? 0) + (ue[j] ?? 0);
    this.right[i] = (mismatch[i] ?? 0) - (ue[size] ?? 0);
  }

  private resolveSide(
    side: Side,
    change: Change,
    rows: SideRows,
    outer: OuterFlow,
    mismatch: Float64Array,
  ): void {
    rows.clear();
    let laminar = change.node !== -1;
    for (let i = side.first; ; i += side.step) {
      const first = i === side.first;
      const turns = i === change.node;
      if (turns) {
        rows.setShare(change);
        laminar = false;
      }
      const [from, to] = side.step === 1 ? [side.first, i] : [i, side.first];
      rows.advance(i, first ? -1 : i - side.step, turns ? rows.xi : null, from, to);
      if (laminar) rows.advanceGrowth(i, first, from, to);
      this.closeRow(i, rows.ue, outer, mismatch, from, to);
      if (i === side.last) return;
    }
  }

  private resolveWake(outer: OuterFlow, mismatch: Float64Array): void {
    const { layer, size, upper: rows } = this;
    this.joinRows();
    const w = layer.panels.nodes;
    for (let i = w; i < size; i++) {
      if (i > w) rows.advance(i, i - 1, null, 0, i);
      this.closeRow(i, rows.ue, outer, mismatch, 0, i);
    }
  }

  /** The wake's first station from both edges, written over the upper side's expressions. */
  private joinRows(): void {
    const { layer, size, march, upper: a, lower: b } = this;
    const { theta, dstar, ue, c } = layer;
    const [u, l, w] = [layer.upper.last, layer.lower.last, layer.panels.nodes];
    const [ea, eb] = [edgeStress(march, layer.upper), edgeStress(march, layer.lower)];
    const [ta, tb] = [theta[u] ?? 0, theta[l] ?? 0];
    const sum = ta + tb;
    const [ka, kb] = [(ea.value - (c[w] ?? 0)) / sum, (eb.value - (c[w] ?? 0)) / sum];
    const [wa, wb] = [ta / sum, tb / sum];
    const [da, db] = [(dstar[u] ?? 0) / (ue[u] ?? 1), (dstar[l] ?? 0) / (ue[l] ?? 1)];
    const [ma, mb] = [1 / (ue[u] ?? 1), 1 / (ue[l] ?? 1)];
    const uw = ue[w] ?? 1;
    const total = (dstar[w] ?? 0) + (layer.deadAir[w] ?? 0);
    for (let j = 0; j <= size; j++) {
      const dsA = (j === u ? ma : 0) - da * (a.ue[j] ?? 0);
      const dsB = (j === l ? mb : 0) - db * (b.ue[j] ?? 0);
      const [tA, tB] = [a.theta[j] ?? 0, b.theta[j] ?? 0];
      a.c[j] =
        ka * tA + kb * tB +
        wa * (ea.t * tA + ea.d * dsA + ea.u * (a.ue[j] ?? 0) + ea.c * (a.c[j] ?? 0)) +
        wb * (eb.t * tB + eb.d * dsB + eb.u * (b.ue[j] ?? 0) + eb.c * (b.c[j] ?? 0)); // prettier-ignore
      a.theta[j] = tA + tB;
      a.ue[j] = ((j === w ? 1 : 0) - uw * (dsA + dsB)) / total;
    }
  }

  /** All changes from those of the mass defects. */
  private back(): void {
    const { layer, size } = this;
    const dot = (row: Float64Array) => {
      let sum = row[size] ?? 0;
      for (let j = 0; j < size; j++) sum += (row[j] ?? 0) * (this.right[j] ?? 0);
      return sum;
    };
    this.backSide(layer.upper, this.march.upperChange, dot(this.upper.xi));
    this.backSide(layer.lower, this.march.lowerChange, dot(this.lower.xi));
    this.backWake();
  }

  /** Speeds from the outer flow's answer to the changed mass defects; thicknesses and stresses are left to the next march. */
  private backOuter(outer: OuterFlow, mismatch: Float64Array): void {
    const { layer, size, change, right, signed } = this;
    for (let j = 0; j < size; j++) signed[j] = layer.sign(j) * (right[j] ?? 0);
    for (let i = 0; i < size; i++) {
      let speed = 0;
      for (let j = 0; j < size; j++) speed += (outer.influence[i * size + j] ?? 0) * (signed[j] ?? 0);
      const ue = (change.ue[i] = layer.sign(i) * speed + (mismatch[i] ?? 0));
      const total = (layer.dstar[i] ?? 0) + (layer.deadAir[i] ?? 0);
      change.dstar[i] = ((right[i] ?? 0) - total * ue) / (layer.ue[i] ?? 1);
      change.theta[i] = 0;
      change.c[i] = 0;
    }
  }

  private backSide(side: Side, change: Change, xi: number): void {
    for (let i = side.first; ; i += side.step) {
      this.backNode(i, i === side.first ? -1 : i - side.step, i === change.node ? xi : 0);
      if (i === side.last) return;
    }
  }

  private backNode(i: number, before: number, xi: number): void {
    const { march, right, change, layer } = this;
    const a = march.answers;
    const at = i * PER_NODE;
    const first = before < 0;
    const m2 = right[i] ?? 0;
    // In the order of the answers: constant, δθ₁, δc₁, δue₁, δm₁, δm₂, δξ.
    const factors = [
      1,
      first ? 0 : (change.theta[before] ?? 0),
      first ? 0 : (change.c[before] ?? 0),
      first ? 0 : (change.ue[before] ?? 0),
      first ? 0 : (right[before] ?? 0),
      m2,
      xi,
    ];
    const value = (k: number) => {
      let sum = 0;
      for (let f = 0; f < PER_UNKNOWN; f++) sum += (a[at + k + f] ?? 0) * (factors[f] ?? 0);
      return sum;
    };
    change.theta[i] = value(0);
    change.c[i] = value(PER_UNKNOWN);
    const ue = (change.ue[i] = value(2 * PER_UNKNOWN));
    const total = (layer.dstar[i] ?? 0) + (layer.deadAir[i] ?? 0);
    change.dstar[i] = (m2 - total * ue) / (layer.ue[i] ?? 1);
  }

  private backWake(): void {
    const { layer, change, right, march, size } = this;
    const { theta, ue, c } = layer;
    const [u, l, w] = [layer.upper.last, layer.lower.last, layer.panels.nodes];
    const total = (layer.dstar[w] ?? 0) + (layer.deadAir[w] ?? 0);
    const [ta, tb] = [theta[u] ?? 0, theta[l] ?? 0];
    const stress = (side: Side, i: number) => {
      const e = edgeStress(march, side);
      const own =
        e.t * (change.theta[i] ?? 0) +
        e.d * (change.dstar[i] ?? 0) +
        e.u * (change.ue[i] ?? 0) +
        e.c * (change.c[i] ?? 0);
      return ((theta[i] ?? 0) * own + (e.value - (c[w] ?? 0)) * (change.theta[i] ?? 0)) / (ta + tb);
    };
    change.c[w] = stress(layer.upper, u) + stress(layer.lower, l);
    change.theta[w] = (change.theta[u] ?? 0) + (change.theta[l] ?? 0);
    change.dstar[w] = (change.dstar[u] ?? 0) + (change.dstar[l] ?? 0);
    change.ue[w] = ((right[w] ?? 0) - (ue[w] ?? 1) * (change.dstar[w] ?? 0)) / total;
    for (let i = w + 1; i < size; i++) this.backNode(i, i - 1, 0);
  }

  /** The largest part of the step, at most 1, that keeps all changes within bounds; not a number when the step is not finite. */
  largestStep(): number {
    const { layer, change, size } = this;
    let factor = 1;
    for (let i = 0; i < size; i++) {
      // Stations of the stagnation flow are set outright.
      if ((change.theta[i] ?? 0) === 0 && i < layer.panels.nodes) continue;
      factor = within(factor, (change.theta[i] ?? 0) / (layer.theta[i] ?? 1), -0.5, 1.5);
      factor = within(factor, (change.dstar[i] ?? 0) / (layer.dstar[i] ?? 1), -0.5, 1.5);
      if (layer.regime[i] !== LAMINAR)
        factor = within(factor, (change.c[i] ?? 0) / (layer.c[i] ?? 1), -0.6, 2);
      factor = within(factor, change.ue[i] ?? 0, -0.375, 0.375);
    }
    return factor;
  }
}

function within(factor: number, change: number, low: number, high: number): number {
  if (!Number.isFinite(change)) return NaN;
  if (change * factor > high) return high / change;
  return change * factor < low ? low / change : factor;
}
