import { type Layer, type Side } from './layer.ts';
import { type Station } from './station.ts';
import { Amplification } from './transition.ts';

/** Where a side turns turbulent, and how the place answers to n and its growth rates at the two stations before. */
export interface Change {
  /** First turbulent node; −1 when the side stays laminar. */
  node: number;
  /** Share of the interval before it at which the layer turns. */
  xi: number;
  byN: number;
  byRate: number;
  byRateBefore: number;
}

/**
 * Least growth of n per chord as n nears N, from nothing at N/2 on [own choice]: where the waves stop growing just short of N the place of
 * transition would otherwise jump along the surface for any trifle. It shifts n by far less than N is known.
 */
const LEAST_GROWTH = 0.5;

/** A side that stays laminar. */
export const NO_CHANGE: Readonly<Change> = { node: -1, xi: 0, byN: 0, byRate: 0, byRateBefore: 0 };

/**
 * The exponent n along the laminar layer, from what lies upstream alone: n₂ = n₁ + f₁ d + ½ g d², f = dn/ds, g its slope over the interval
 * before, 0 ≤ g d ≤ 2 f₁ [own choice: explicit, so that whether the layer turns does not depend on the state that turning changes].
 */
export class Growth {
  /** Growth rate dn/ds of each laminar node with its slopes against θ, δ*, ue: four each. */
  readonly rates: Float64Array;
  /** ∂n₂/∂(dn/ds) at the station before and at the one before that: two for each node. */
  readonly answers: Float64Array;
  private readonly layer: Layer;
  private readonly amplification = new Amplification();
  private g = 0;
  private byRate = 0;
  private byRateBefore = 0;

  constructor(layer: Layer) {
    this.layer = layer;
    this.rates = new Float64Array(layer.size * 4);
    this.answers = new Float64Array(layer.size * 2);
  }

  /** Keeps the growth rate at a laminar node. */
  rate(i: number, { h, r, theta, ue }: Station): void {
    const a = this.amplification.at(h, r, theta);
    this.rates[i * 4] = a.rate;
    this.rates[i * 4 + 1] = a.rateT + (a.rateR * r - a.rateH * h) / theta;
    this.rates[i * 4 + 2] = a.rateH / theta;
    this.rates[i * 4 + 3] = (a.rateR * r) / ue;
  }

  /** Decides whether the layer turns turbulent before node i, by its waves or by the trip; sets n of the node otherwise. */
  turns(side: Side, change: Change, i: number): boolean {
    const { layer, rates, answers } = this;
    const p = i - side.step;
    const start = layer.s[p] ?? 0;
    const d = (layer.s[i] ?? 0) - start;
    const n = layer.c[p] ?? 0;
    const { criticalN } = layer.conditions;
    const own = rates[p * 4] ?? 0;
    const least = LEAST_GROWTH * Math.max(0, (2 * n) / criticalN - 1);
    const live = own >= least ? 1 : 0;
    const f = live === 1 ? own : least;
    this.curve(side, p, d, live === 1);
    const end = n + d * (f + 0.5 * this.g * d);
    const missing = criticalN - n;
    const reached = f > 0 && end - n >= missing;
    const natural = reached ? (2 * missing) / (f + Math.sqrt(f * f + 2 * this.g * missing)) : Infinity;
    const trip = side.tripS - start;
    if (Math.min(natural, trip) > d) {
      layer.c[i] = end;
      answers[i * 2] = live * d + 0.5 * d * d * this.byRate;
      answers[i * 2 + 1] = 0.5 * d * d * this.byRateBefore;
      return false;
    }
    side.tripped = trip < natural;
    const at = Math.max(0, Math.min(natural, trip));
    side.transitionS = start + at;
    const slope = side.tripped ? 0 : -1 / ((f + this.g * at) * d);
    change.node = i;
    change.xi = at / d;
    change.byN = slope;
    change.byRate = slope * (live * at + 0.5 * at * at * this.byRate);
    change.byRateBefore = slope * 0.5 * at * at * this.byRateBefore;
    return true;
  }

  /** The rate's slope g behind node p over an interval d, and its slopes against the rates at p and at the node before. */
  private curve(side: Side, p: number, d: number, live: boolean): void {
    [this.g, this.byRate, this.byRateBefore] = [0, 0, 0];
    if (p === side.first || !live) return;
    const { layer, rates } = this;
    const before = p - side.step;
    const h = (layer.s[p] ?? 0) - (layer.s[before] ?? 0);
    const f = rates[p * 4] ?? 0;
    const g = (f - (rates[before * 4] ?? 0)) / h;
    if (g <= 0) return;
    if (g * d > 2 * f) [this.g, this.byRate] = [(2 * f) / d, 2 / d];
    else [this.g, this.byRate, this.byRateBefore] = [g, 1 / h, -1 / h];
  }
}
