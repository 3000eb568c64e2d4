import { expect, test } from 'vitest';
import { airAt, dynamicPressure, reynoldsNumber } from '#geometry/flow/atmosphere.ts';
import { ShapeError } from '#geometry/shapes/error.ts';

/** ISO 2533: h, T, p, ρ, μ (1e-5), ν (1e-5), a; the row at 1000 m stands in the published tables. */
const ROWS = [
  [0, 288.15, 101325, 1.225, 1.78938, 1.46072, 340.294],
  [500, 284.9, 95460.84, 1.16727, 1.77366, 1.51949, 338.369],
  [1000, 281.65, 89874.56, 1.11164, 1.75785, 1.5813, 336.434],
  [2000, 275.15, 79495.2, 1.00649, 1.72596, 1.71483, 332.529],
  [3000, 268.65, 70108.53, 0.90912, 1.69372, 1.86303, 328.578],
] as const;

test.each(ROWS)('standard atmosphere at %d m', (h, temperature, pressure, density, mu, nu, sound) => {
  const air = airAt(h);
  const relative = (value: number, wanted: number) => expect(Math.abs(value / wanted - 1)).toBeLessThan(2e-5);
  relative(air.temperatureK, temperature);
  relative(air.pressurePa, pressure);
  relative(air.density, density);
  relative(air.viscosity, mu * 1e-5);
  relative(air.kinematicViscosity, nu * 1e-5);
  relative(air.speedOfSound, sound);
});

test('warm air at sea level keeps its pressure: ν at 0, 20 and 35 °C', () => {
  const nu = [0, 20, 35].map((celsius) => airAt(0, celsius - 15).kinematicViscosity * 1e5);
  expect(nu.map((value) => value.toFixed(4))).toEqual(['1.3280', '1.5060', '1.6450']);
  expect(airAt(0, 20).pressurePa).toBe(101_325);
});

test('15 m/s and 0.2 m of chord at sea level', () => {
  expect(reynoldsNumber(airAt(0), 15, 200)).toBeCloseTo(205_378, -1);
  expect(dynamicPressure(airAt(0), 15)).toBeCloseTo(137.8125, 3);
});

test('altitudes and offsets out of range are refused by name', () => {
  expect(() => airAt(12_000)).toThrow(ShapeError);
  expect(() => airAt(NaN)).toThrow(/altitudeM/);
  expect(() => airAt(0, 80)).toThrow(/temperatureOffsetC/);
});
