import { expect, test } from 'vitest';
import { airAt } from '#geometry/flow/atmosphere.ts';
import {
  checkFlightCondition,
  flightConditionSchema,
  flightFigures,
  reynoldsTable,
  speedAtLift,
  speedRange,
} from '#geometry/flow/flight-condition.ts';
import { ShapeError } from '#geometry/shapes/error.ts';

const INPUT = {
  massKg: 2,
  wing: { kind: 'area', areaM2: 0.4 },
  rootChordMm: 240,
  tipChordMm: 160,
  flight: { kind: 'speed', speedMS: 15 },
} as const;
const condition = checkFlightCondition(INPUT);

test('level flight: 2 kg on 0.4 m² at 15 m/s at sea level', () => {
  const figures = flightFigures(condition);
  // 2 · 9.80665 / (137.8125 · 0.4)
  expect(figures.liftCoefficient).toBeCloseTo(0.355797, 5);
  expect(figures.wingLoading).toBeCloseTo(5, 12);
  expect(figures.meanChordMm).toBe(200);
  expect(figures.reynoldsMean).toBeCloseTo(205_378, -1);
  expect(figures.reynoldsRoot / figures.reynoldsTip).toBeCloseTo(1.5, 12);
  expect(figures.mach).toBeCloseTo(15 / 340.294, 6);
  expect([figures.tripUpper, figures.tripLower]).toEqual([1, 1]);
});

test('turbulence of 0.07 % gives the exponent of a quiet tunnel', () => {
  expect(flightFigures(condition).criticalN).toBeCloseTo(9.0, 1);
});

test('a speed and its lift coefficient name the same flight', () => {
  const { liftCoefficient } = flightFigures(condition);
  const byLift = flightFigures({ ...condition, flight: { kind: 'lift', liftCoefficient } });
  expect(byLift.speedMS).toBeCloseTo(15, 10);
  expect(speedAtLift(condition, 4 * liftCoefficient)).toBeCloseTo(7.5, 10);
});

test('speeds run from the stall to fast flight', () => {
  const { stallMS, fastMS } = speedRange(condition, 1.2, 0.2);
  expect(stallMS).toBeCloseTo(15 * Math.sqrt(0.355797 / 1.2), 4);
  expect(fastMS / stallMS).toBeCloseTo(Math.sqrt(6), 10);
  expect(() => speedRange(condition, 0.1, 0.2)).toThrow(/highestLift/);
  expect(() => speedRange(condition, 1.2, 0)).toThrow(/lowestLift/);
});

test('a wing by span and mean chord is the wing of that area', () => {
  const bySpan = flightFigures({ ...condition, wing: { kind: 'span', spanM: 2, meanChordMm: 200 } });
  expect(bySpan).toEqual(flightFigures(condition));
});

test('thin and warm air need more lift and lower the Reynolds number', () => {
  const high = flightFigures({ ...condition, altitudeM: 2000, temperatureOffsetC: 15 });
  const low = flightFigures(condition);
  expect(high.liftCoefficient).toBeGreaterThan(low.liftCoefficient * 1.2);
  expect(high.reynoldsMean).toBeLessThan(low.reynoldsMean * 0.85);
});

test('the table runs over speeds and chords', () => {
  const table = reynoldsTable(airAt(0), [10, 20], [100, 200, 300]);
  expect(table.map((row) => row.length)).toEqual([2, 2, 2]);
  expect(table[2]?.[1]).toBeCloseTo((table[0]?.[0] ?? 0) * 6, 6);
});

test('fields out of range are named', () => {
  const refused = flightConditionSchema.safeParse({
    ...INPUT,
    massKg: 0,
    flight: { kind: 'lift', liftCoefficient: 9 },
    surface: { tripUpper: 1.5 },
  });
  expect(refused.success).toBe(false);
  expect(refused.error?.issues.map(({ path }) => path.join('.')).sort()).toEqual([
    'flight.liftCoefficient',
    'massKg',
    'surface.tripUpper',
  ]);
  expect(() => checkFlightCondition({ ...INPUT, wingspan: 2 })).toThrow(ShapeError);
  expect(() => checkFlightCondition({ ...INPUT, wingspan: 2 })).toThrow(/wingspan is not a value/);
});
