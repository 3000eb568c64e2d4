import { expect, test } from 'vitest';
import { Crossing } from '#geometry/flow/crossing.ts';
import { Interval } from '#geometry/flow/interval.ts';
import { LAMINAR, Station, TURBULENT } from '#geometry/flow/station.ts';
import { difference, expectSlope } from './slopes.ts';

const NU = 1e-6;
const A = [0.0008, 0.0022, 1.2, 0, 0.4] as const;
const B = [0.00095, 0.0019, 1.15, 0.05, 0.43] as const;

function station(regime: typeof LAMINAR | typeof TURBULENT, x: readonly number[]): Station {
  const made = new Station();
  made.set(regime, x[4]!, x[0]!, x[1]!, x[2]!, x[3]!, NU, 0);
  return made;
}

test('turning at the downstream end leaves the laminar equations, at the upstream end the turbulent ones', () => {
  const crossing = new Crossing();
  const plain = new Interval();
  crossing.between(station(LAMINAR, A), station(TURBULENT, B), 1, NU);
  plain.between(station(LAMINAR, A), station(LAMINAR, B));
  expect(crossing.residual[0]).toBeCloseTo(plain.residual[0]!, 12);
  // H* differs between the laminar and the turbulent state of one place: the sum carries both.
  expect(crossing.residual[1]).toBeCloseTo(plain.residual[1]!, 12);
  crossing.between(station(LAMINAR, A), station(TURBULENT, B), 0, NU);
  const start = station(TURBULENT, A);
  start.set(TURBULENT, A[4], A[0], A[1], A[2], Math.sqrt(0.7) * start.equilibrium.value, NU, 0);
  plain.between(start, station(TURBULENT, B));
  [0, 1, 2].forEach((q) => expect(crossing.residual[q]).toBeCloseTo(plain.residual[q]!, 10));
});

test('slopes against both ends and the share', () => {
  const crossing = new Crossing();
  const evaluate = (a: readonly number[], b: readonly number[], xi: number) =>
    crossing.between(station(LAMINAR, a), station(TURBULENT, b), xi, NU);
  evaluate(A, B, 0.4);
  const [up, down, share] = [crossing.up, crossing.down, crossing.share].map((x) => Float64Array.from(x));
  for (let q = 0; q < 3; q++) {
    const at = (run: () => void) => {
      run();
      return crossing.residual[q]!;
    };
    for (const k of [0, 1, 2]) {
      const upstream = (x: number) =>
        at(() =>
          evaluate(
            A.map((own, i) => (i === k ? x : own)),
            B,
            0.4,
          ),
        );
      expectSlope(up![q * 5 + k]!, difference(upstream, A[k]!), 0.1 / A[k]!);
    }
    for (const k of [0, 1, 2, 3]) {
      const downstream = (x: number) =>
        at(() =>
          evaluate(
            A,
            B.map((own, i) => (i === k ? x : own)),
            0.4,
          ),
        );
      expectSlope(down![q * 5 + k]!, difference(downstream, B[k]!), 0.1 / B[k]!);
    }
    expectSlope(share![q]!, difference((xi) => at(() => evaluate(A, B, xi)), 0.4)); // prettier-ignore
  }
});
