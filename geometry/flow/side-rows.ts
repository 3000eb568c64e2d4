import { type Change } from './growth.ts';
import { type March, PER_NODE, PER_UNKNOWN } from './march.ts';

/**
 * Linear expressions in the mass defects of all nodes for δθ, δ√CT and δue of one station after the other, each with its constant in the
 * last place; and for n and its growth rates as long as the layer is laminar.
 */
export class SideRows {
  readonly theta: Float64Array;
  readonly c: Float64Array;
  readonly ue: Float64Array;
  /** δξ of the interval in which the side turns turbulent. */
  readonly xi: Float64Array;
  private readonly n: Float64Array;
  private readonly rate: Float64Array;
  private readonly rateBefore: Float64Array;
  private readonly march: March;
  private readonly size: number;

  constructor(march: March) {
    this.march = march;
    this.size = march.layer.size;
    const row = () => new Float64Array(this.size + 1);
    this.theta = row();
    this.c = row();
    this.ue = row();
    this.xi = row();
    this.n = row();
    this.rate = row();
    this.rateBefore = row();
  }

  /** Begins a side anew. */
  clear(): void {
    for (const row of [this.theta, this.c, this.ue, this.xi, this.n, this.rate, this.rateBefore]) row.fill(0);
  }

  /** δξ from the growth up to the station before. */
  setShare({ byN, byRate, byRateBefore }: Change): void {
    for (let j = 0; j <= this.size; j++) {
      this.xi[j] =
        byN * (this.n[j] ?? 0) + byRate * (this.rate[j] ?? 0) + byRateBefore * (this.rateBefore[j] ?? 0);
    }
  }

  /** The three expressions of node i from those of the node before, which hold the columns `from` … `to` and the constant. */
  advance(i: number, before: number, xi: Float64Array | null, from: number, to: number): void {
    const { answers } = this.march;
    const { theta, c, ue } = this;
    const at = i * PER_NODE;
    const [t1, t2, t3] = [answers[at + 1] ?? 0, answers[at + 2] ?? 0, answers[at + 3] ?? 0];
    const [c1, c2, c3] = [answers[at + 8] ?? 0, answers[at + 9] ?? 0, answers[at + 10] ?? 0];
    const [u1, u2, u3] = [answers[at + 15] ?? 0, answers[at + 16] ?? 0, answers[at + 17] ?? 0];
    for (let j = from; j <= to; j++) {
      const x = theta[j] ?? 0;
      const y = c[j] ?? 0;
      const z = ue[j] ?? 0;
      theta[j] = t1 * x + t2 * y + t3 * z;
      c[j] = c1 * x + c2 * y + c3 * z;
      ue[j] = u1 * x + u2 * y + u3 * z;
    }
    const k = this.size;
    const [x, y, z] = [theta[k] ?? 0, c[k] ?? 0, ue[k] ?? 0];
    theta[k] = t1 * x + t2 * y + t3 * z;
    c[k] = c1 * x + c2 * y + c3 * z;
    ue[k] = u1 * x + u2 * y + u3 * z;
    this.addOwn(theta, at, i, before, xi, from, to);
    this.addOwn(c, at + PER_UNKNOWN, i, before, xi, from, to);
    this.addOwn(ue, at + 2 * PER_UNKNOWN, i, before, xi, from, to);
  }

  private addOwn(
    row: Float64Array,
    at: number,
    i: number,
    before: number,
    xi: Float64Array | null,
    from: number,
    to: number,
  ): void {
    const { answers } = this.march;
    const k = this.size;
    row[k] = (row[k] ?? 0) + (answers[at] ?? 0);
    if (before >= 0) row[before] = (row[before] ?? 0) + (answers[at + 4] ?? 0);
    row[i] = (row[i] ?? 0) + (answers[at + 5] ?? 0);
    if (xi === null) return;
    const share = answers[at + 6] ?? 0;
    for (let j = from; j <= to; j++) row[j] = (row[j] ?? 0) + share * (xi[j] ?? 0);
    row[k] = (row[k] ?? 0) + share * (xi[k] ?? 0);
  }

  /** n and its growth rate at laminar node i. */
  advanceGrowth(i: number, first: boolean, from: number, to: number): void {
    const { size, march, n, rate, rateBefore } = this;
    const { layer } = march;
    const byRate = first ? 0 : (march.growth.answers[i * 2] ?? 0);
    const byRateBefore = first ? 0 : (march.growth.answers[i * 2 + 1] ?? 0);
    const ue = layer.ue[i] ?? 1;
    const byT = march.growth.rates[i * 4 + 1] ?? 0;
    const byD = march.growth.rates[i * 4 + 2] ?? 0;
    const byU = (march.growth.rates[i * 4 + 3] ?? 0) - (byD * (layer.dstar[i] ?? 0)) / ue;
    const { theta, ue: speed } = this;
    const one = (j: number) => {
      n[j] = (n[j] ?? 0) + byRate * (rate[j] ?? 0) + byRateBefore * (rateBefore[j] ?? 0);
      rateBefore[j] = rate[j] ?? 0;
      rate[j] = byT * (theta[j] ?? 0) + byU * (speed[j] ?? 0);
    };
    for (let j = from; j <= to; j++) one(j);
    one(size);
    rate[i] = (rate[i] ?? 0) + byD / ue;
  }
}
