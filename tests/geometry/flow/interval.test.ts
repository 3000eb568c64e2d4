import { expect, test } from 'vitest';
import { Interval } from '#geometry/flow/interval.ts';
import { LAMINAR, type Regime, Station, TURBULENT, WAKE } from '#geometry/flow/station.ts';
import { SIMILAR_FLOWS } from '#tests/reference/flow-similarity.ts';
import { marchPlain } from './march-plain.ts';
import { difference, expectSlope } from './slopes.ts';

const geometric = (from: number, to: number, n: number) =>
  Array.from({ length: n + 1 }, (_, i) => from * (to / from) ** (i / n));

test.each(SIMILAR_FLOWS.filter(({ beta }) => beta > -0.11))(
  'Falkner–Skan β = $beta: θ and δ* within 2 % after a run to a hundred times the length',
  ({ beta, momentum, displacement, shapeFactor }) => {
    // ue = x^m, η = y √((m+1) ue/(2 ν x)), ν = 1
    const m = beta / (2 - beta);
    const s = geometric(1e4, 1e6, 60);
    const ue = s.map((x) => (x / 1e4) ** m);
    const scale = (i: number) => Math.sqrt((2 * s[i]!) / ((m + 1) * ue[i]!));
    const first = { theta: momentum * scale(0), dstar: shapeFactor * momentum * scale(0), c: 0 };
    const end = marchPlain(LAMINAR, s, ue, 1, first).at(-1)!;
    expect(Math.abs(end.theta / (momentum * scale(60)) - 1)).toBeLessThan(0.02);
    expect(Math.abs(end.dstar / (displacement * scale(60)) - 1)).toBeLessThan(0.02);
  },
);

test('Blasius: the drag of the plate is 1.32823/√Re within 2 %', () => {
  const s = geometric(1e3, 1e6, 60);
  const first = { theta: 0.664115 * Math.sqrt(1e3), dstar: 1.720788 * Math.sqrt(1e3), c: 0 };
  const end = marchPlain(
    LAMINAR,
    s,
    s.map(() => 1),
    1,
    first,
  ).at(-1)!;
  expect(Math.abs((2 * end.theta) / 1e6 / (1.32823 / 1e3) - 1)).toBeLessThan(0.02);
});

test('turbulent flat plate: mean friction within 5 % of Schoenherr and of Prandtl–Schlichting at 3e6 and 1e7', () => {
  const s = geometric(1e5, 1e7, 80);
  const states = marchPlain(
    TURBULENT,
    s,
    s.map(() => 1),
    1,
    { theta: 300, dstar: 480, c: Math.sqrt(0.0023) },
  );
  const mean = (rx: number) => {
    const i = s.findIndex((x) => x >= rx * 0.9999);
    return (2 * states[i]!.theta) / s[i]!;
  };
  const prandtl = (re: number) => 0.455 / Math.log10(re) ** 2.58;
  const at3 = s.reduce((best, x) => (Math.abs(x - 3e6) < Math.abs(best - 3e6) ? x : best));
  expect(Math.abs(mean(at3) / prandtl(at3) - 1)).toBeLessThan(0.05);
  expect(Math.abs(mean(1e7) / prandtl(1e7) - 1)).toBeLessThan(0.05);
  expect(Math.abs(mean(1e7) / 0.002934 - 1)).toBeLessThan(0.05);
  const end = states.at(-1)!;
  expect(end.dstar / end.theta).toBeGreaterThan(1.28);
  expect(end.dstar / end.theta).toBeLessThan(1.33);
});

test.each([
  [LAMINAR, 2.4, 2.5],
  [LAMINAR, 5, 3.5],
  [TURBULENT, 1.45, 1.6],
  [TURBULENT, 3.2, 4.5],
  [WAKE, 2.4, 2.1],
] as const)('slopes of the residuals in regime %d between H = %d and %d', (regime: Regime, h1, h2) => {
  const state = [0.002, 0.002 * h1, 1.1, 0.05, 0.3, 0.0022, 0.0022 * h2, 1.05, 0.06, 0.34];
  const interval = new Interval();
  const evaluate = (x: readonly number[]) => {
    const [a, b] = [new Station(), new Station()];
    a.set(regime, x[4]!, x[0]!, x[1]!, x[2]!, x[3]!, 1e-6, 0.0005);
    b.set(regime, x[9]!, x[5]!, x[6]!, x[7]!, x[8]!, 1e-6, 0.0003);
    interval.between(a, b);
  };
  evaluate(state);
  const slopes = [Float64Array.from(interval.up), Float64Array.from(interval.down)];
  state.forEach((value, k) => {
    for (let q = 0; q < (regime === LAMINAR ? 2 : 3); q++) {
      const vary = (x: number) => {
        evaluate(state.map((own, i) => (i === k ? x : own)));
        return interval.residual[q]!;
      };
      expectSlope(slopes[k < 5 ? 0 : 1]![q * 5 + (k % 5)]!, difference(vary, value), 0.01 / value);
    }
  });
});
