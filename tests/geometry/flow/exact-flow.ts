import { type Contour } from '#geometry/contour/contour.ts';

type Complex = readonly [re: number, im: number];
const times = ([a, b]: Complex, [c, d]: Complex): Complex => [a * c - b * d, a * d + b * c];
const over = (a: Complex, [c, d]: Complex): Complex => times(a, [c / (c * c + d * d), -d / (c * c + d * d)]);
const plus = ([a, b]: Complex, [c, d]: Complex): Complex => [a + c, b + d];
const power = ([a, b]: Complex, k: number): Complex => {
  const [size, angle] = [Math.hypot(a, b) ** k, k * Math.atan2(b, a)];
  return [size * Math.cos(angle), size * Math.sin(angle)];
};
const turn = (angle: number): Complex => [Math.cos(angle), Math.sin(angle)];

/**
 * Exact potential flow of a Kármán–Trefftz section (von Kármán & Trefftz, Z. Flugtechn. Motorluftsch. 9, 1918): z = k (1 + w^k)/(1 − w^k),
 * w = (ζ − 1)/(ζ + 1), of the circle through ζ = 1 about μ; k = 2 is Joukowski's, k = 2 − τ/π has
 * the trailing-edge angle τ. Scaled to chord 1 with the foremost point at x = 0.
 */
export function exactSection(
  mu: Complex,
  k: number,
  alphaDeg: number,
  panels: number,
): { contour: Contour; cp: Float64Array; cl: number } {
  const alpha = (alphaDeg * Math.PI) / 180;
  const radius = Math.hypot(1 - mu[0], mu[1]);
  const beta = Math.asin(mu[1] / radius);
  const circulation = 4 * Math.PI * radius * Math.sin(alpha + beta);
  const points: Complex[] = [];
  const cp = new Float64Array(panels);
  for (let i = 0; i < panels; i++) {
    const onCircle = turn(-beta + (2 * Math.PI * i) / panels);
    const zeta = plus(mu, [radius * onCircle[0], radius * onCircle[1]]);
    const w = over(plus(zeta, [-1, 0]), plus(zeta, [1, 0]));
    const wk = i === 0 ? ([0, 0] as const) : power(w, k);
    const below = plus([1, 0], [-wk[0], -wk[1]]);
    points.push(times([k, 0], over(plus([1, 0], wk), below)));
    if (i === 0) continue;
    const slope = over(times([2 * k * k, 0], over(wk, w)), times(below, below));
    const dz = times(slope, over([2, 0], power(plus(zeta, [1, 0]), 2)));
    const arm: Complex = [radius * onCircle[0], radius * onCircle[1]];
    const far = plus(turn(-alpha), times([-radius * radius, 0], over(turn(alpha), times(arm, arm))));
    const speed = over(plus(far, over([0, circulation / (2 * Math.PI)], arm)), dz);
    cp[i] = 1 - speed[0] ** 2 - speed[1] ** 2;
  }
  const x = Float64Array.from(points, ([re]) => re);
  const y = Float64Array.from(points, ([, im]) => im);
  const nose = x.reduce((best, value, i) => (value < x[best]! ? i : best), 0);
  const [from, chord] = [x[nose]!, x[0]! - x[nose]!];
  const contour = {
    x: x.map((value) => (value - from) / chord),
    y: y.map((value) => value / chord),
    noseIndex: nose,
    sharp: true,
  };
  return { contour, cp, cl: (2 * circulation) / chord };
}
