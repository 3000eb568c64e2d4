import { expect, test } from 'vitest';
import { LAMINAR, type Regime, type Slopes, Station, TURBULENT, WAKE } from '#geometry/flow/station.ts';
import { difference, expectSlope } from './slopes.ts';

const NU = 1e-6;
const STATE = [0.002, 0.0035, 1.1, 0.06] as const;
const QUANTITIES = ['shape', 'energy', 'friction', 'balance', 'equilibrium', 'thickness'] as const;

function at(regime: Regime, state: readonly number[]): Station {
  const station = new Station();
  station.set(regime, 0.4, state[0]!, state[1]!, state[2]!, state[3]!, NU, 0.0004);
  return station;
}

test('H, Rθ and the share of dead air', () => {
  const station = at(TURBULENT, STATE);
  expect(station.h).toBeCloseTo(1.75, 12);
  expect(station.r).toBeCloseTo(2200, 8);
  expect(station.gap).toBeCloseTo(0.2, 12);
});

test.each<Regime>([LAMINAR, TURBULENT, WAKE])(
  'slopes of all quantities against θ, δ*, ue and √CT in regime %d',
  (regime) => {
    const station = at(regime, STATE);
    for (const name of regime === LAMINAR ? QUANTITIES.slice(0, 4) : QUANTITIES) {
      const slopes: Slopes = station[name];
      const found = [slopes.t, slopes.d, slopes.u, slopes.c];
      STATE.forEach((value, k) => {
        const vary = (x: number) =>
          at(
            regime,
            STATE.map((own, i) => (i === k ? x : own)),
          )[name].value;
        expectSlope(found[k]!, difference(vary, value), Math.abs(slopes.value / value) + 1e-6);
      });
    }
  },
);

test('the layer counts as at most twelve momentum thicknesses thick', () => {
  const thin = at(TURBULENT, [0.002, 0.0021, 1, 0.05]);
  expect(thin.thickness.value).toBeCloseTo(0.024, 12);
});
