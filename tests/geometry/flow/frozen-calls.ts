import { airAt } from '#geometry/flow/atmosphere.ts';
import { checkConditions } from '#geometry/flow/conditions.ts';
import { Coupling } from '#geometry/flow/coupling.ts';
import { checkFlightCondition } from '#geometry/flow/flight-condition.ts';
import { panelSystem, strengthsAt } from '#geometry/flow/inviscid.ts';
import { Layer } from '#geometry/flow/layer.ts';
import { March } from '#geometry/flow/march.ts';
import { panelOutline, panelsOf } from '#geometry/flow/panels.ts';
import { coldStart } from '#geometry/flow/start.ts';
import { traceWake } from '#geometry/flow/wake.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

const outline = () => outlineOf(naca4('2412'));
const flight = () =>
  checkFlightCondition({
    massKg: 2,
    wing: { kind: 'area', areaM2: 0.4 },
    rootChordMm: 240,
    tipChordMm: 160,
    flight: { kind: 'speed', speedMS: 15 },
  });
const contour = () => panelOutline(outline(), 40);
const panels = () => panelsOf(contour());
const system = () => panelSystem(panels(), true);
const wake = () => traceWake(panels(), strengthsAt(system(), 0.05), 0.05);
const coupling = () => new Coupling(system());
/** A layer started at an angle, and its outer flow. */
const flow = () => {
  const outer = coupling().at(0.05);
  const march = new March(new Layer(panels(), outer.size, checkConditions({ reynolds: 5e5 })));
  coldStart(march, outer);
  return { outer, layer: march.layer };
};
const failed = (alphaDeg: number) => ({ converged: false, alphaDeg, iterations: 9 });
const RANGE = { fromDeg: 0, toDeg: 1, stepDeg: 1 };

/** A call of each function of geometry/flow/ that is given objects, for the test that none of them is written on. */
export const flowCalls: Readonly<Record<string, () => readonly unknown[]>> = {
  dynamicPressure: () => [airAt(0), 15],
  reynoldsNumber: () => [airAt(0), 15, 200],
  reynoldsTable: () => [airAt(0), [10, 20], [100, 200]],
  checkFlightCondition: () => [flight()],
  flightFigures: () => [flight()],
  speedRange: () => [flight(), 1.2, 0.2],
  speedAtLift: () => [flight(), 0.5],
  checkConditions: () => [{ reynolds: 5e5 }],
  panelOutline: () => [outline(), 40],
  panelsOf: () => [contour()],
  panelSystem: () => [panels(), true],
  strengthsAt: () => [system(), 0.05],
  inviscidFlow: () => [contour(), [0, 4]],
  forcesOf: () => [panels(), new Float64Array(41), 0.05, 0],
  traceWake: () => [panels(), strengthsAt(system(), 0.05), 0.05],
  wakeStream: () => [wake(), 3, 0.5, 0.2],
  wakeSpeed: () => [wake(), 3, 0.5, 0.2, 1, 0],
  ownWakeSpeed: () => [wake(), 3, 3],
  prepareSection: () => [contour()],
  surfaceSpeeds: () => [flow().layer],
  wallFriction: () => [flow().layer],
  pointOf: () => [flow().layer, flow().outer, 3, 0, 5],
  distributionOf: () => [flow().layer, flow().outer, 0],
  sweepAll: () => [coupling(), { reynolds: 5e5 }, RANGE],
  sweep: () => [coupling(), { reynolds: 5e5 }, RANGE],
  anglesOf: () => [RANGE],
  curveFigures: () => [[failed(0), failed(1)]],
  expectedStall: () => [outline()],
};

/** Functions given numbers only, and the steps of the boundary layer, which work on the march that they are given for that. */
export const flowCallsWithoutObjects = [
  'airAt',
  'karmanTsien',
  'criticalPressure',
  'criticalExponent',
  'criticalLogR',
  'coldStart',
  'project',
  'marchSide',
  'joinWake',
  'edgeStress',
] as const;
