import { curveFigures } from '#geometry/flow/curve-figures.ts';
import { type FlowPoint } from '#geometry/flow/flow-point.ts';
import { inviscidFlow } from '#geometry/flow/inviscid.ts';
import { panelOutline } from '#geometry/flow/panels.ts';
import { sweepAll } from '#geometry/flow/sweep.ts';
import { ViscousSection } from '#geometry/flow/viscous.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import {
  CORRELATED_0012,
  INVISCID_SECTIONS,
  MEASURED_LEAST_DRAG,
  MEASURED_SECTIONS,
  TRIPPED_0012,
} from '#tests/reference/flow-sections.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';
import { exactSection } from './exact-flow.ts';
import { prepared } from './prepared.ts';

/** One comparison with a value from outside. */
export interface ErrorRow {
  readonly what: string;
  readonly source: string;
  readonly wanted: number;
  readonly found: number;
  /** In the tolerance's unit: relative (a share), or absolute in the value's own. */
  readonly error: number;
  readonly tolerance: number;
  readonly kind: 'relative' | 'absolute';
  readonly met: boolean;
}

const EXACT = 'exact flow, Kármán & Trefftz 1918';
const MAPPING = 'conformal mapping, 4096 points';
const R824 = 'NACA Report 824, Re 9e6, smooth (Datcom 4.1.1-B, from memory)';
const R824_DRAG = 'NACA Report 824, Re 6e6, smooth (from memory)';
const LADSON = 'NASA TM 4074 (1988), Re 6e6, tripped (from memory)';
const MCCROSKEY = 'NASA TM 100019 (1987), tripped (from memory)';
const PRACTICE = 'common practice, Re 1e6 assumed';

type Compare = (
  what: string,
  wanted: number,
  found: number | null | undefined,
  tolerance: number,
) => ErrorRow;

const row =
  (source: string, kind: 'relative' | 'absolute'): Compare =>
  (what, wanted, found, tolerance) => {
    const value = found ?? NaN;
    const error = kind === 'relative' ? value / wanted - 1 : value - wanted;
    return { what, source, wanted, found: value, error, tolerance, kind, met: Math.abs(error) <= tolerance };
  };

/** Straight line through the converged points of a range: slope per degree. */
function slopeBetween(points: readonly FlowPoint[], fromDeg: number, toDeg: number): number {
  const used = points.filter((point) => point.converged).filter(({ alphaDeg }) => alphaDeg >= fromDeg && alphaDeg <= toDeg); // prettier-ignore
  const mean = (value: (point: (typeof used)[number]) => number) => used.reduce((sum, point) => sum + value(point), 0) / used.length; // prettier-ignore
  const [x, y] = [mean((point) => point.alphaDeg), mean((point) => point.cl)];
  return mean((point) => (point.alphaDeg - x) * (point.cl - y)) / mean((point) => (point.alphaDeg - x) ** 2);
}

function inviscidRows(): ErrorRow[] {
  const cases = [
    ['Joukowski', [-0.1, 0.1], 2],
    ['Kármán–Trefftz 15°', [-0.1, 0.08], 2 - 15 / 180],
  ] as const;
  const exact = cases.flatMap(([name, mu, k]) => {
    const { contour, cp, cl } = exactSection(mu, k, 5, 160);
    const found = inviscidFlow(contour, [5])[0]!;
    const rms = Math.sqrt(
      cp.reduce((sum, value, i) => (i === 0 ? 0 : sum + (value - found.cp[i]!) ** 2), 0) / 159,
    );
    return [
      row(EXACT, 'relative')(`${name} 5°, 160 panels: cl`, cl, found.cl, 0.005),
      row(EXACT, 'absolute')(`${name} 5°, 160 panels: cp (rms)`, 0, rms, 0.01),
    ];
  });
  const sections = Object.entries(INVISCID_SECTIONS).flatMap(([digits, { cl, cm }]) => {
    const [, found] = inviscidFlow(panelOutline(outlineOf(naca4(digits)), 160), [0, 4]);
    return [
      row(MAPPING, 'absolute')(`${digits} 4° without viscosity: cl`, cl[1]!, found!.cl, 0.001),
      row(MAPPING, 'absolute')(`${digits} 4° without viscosity: cm`, cm[1]!, found!.cm, 0.001),
    ];
  });
  return [...exact, ...sections];
}

function measuredRows(): ErrorRow[] {
  const curves = MEASURED_SECTIONS.flatMap(({ digits, zeroLiftDeg, cm, slope, maxLift, linearToDeg }) => {
    const points = sweepAll(prepared(digits), { reynolds: 9e6 }, { fromDeg: -6, toDeg: 20, stepDeg: 1 });
    const figures = curveFigures(points);
    const top = Math.max(...points.map((point) => (point.converged ? point.cl : -9)));
    return [
      row(R824, 'relative')(
        `${digits}: lift slope per degree`,
        slope,
        slopeBetween(points, zeroLiftDeg, linearToDeg),
        0.05,
      ),
      row(R824, 'absolute')(`${digits}: angle of zero lift`, zeroLiftDeg, figures.zeroLiftDeg, 0.3),
      row(R824, 'absolute')(`${digits}: cm at zero lift`, cm, figures.zeroLiftMoment, 0.01),
      row(R824, 'relative')(`${digits}: highest lift`, maxLift, figures.maxLift?.cl ?? top, 0.12),
    ];
  });
  const drags = MEASURED_LEAST_DRAG.map(([digits, cd]) => {
    const points = sweepAll(prepared(digits), { reynolds: 6e6 }, { fromDeg: -2, toDeg: 4, stepDeg: 1 });
    return row(R824_DRAG, 'relative')(`${digits}: least drag`, cd, curveFigures(points).leastDrag?.cd, 0.1);
  });
  return [...curves, ...drags];
}

function trippedRows(): ErrorRow[] {
  const section = prepared('0012');
  const tripped = (reynolds: number) =>
    new ViscousSection(section, { reynolds, tripUpper: 0.05, tripLower: 0.05 });
  const viscous = tripped(6e6);
  const points = TRIPPED_0012.flatMap(([alphaDeg, cl, cd]) => {
    const point = viscous.at(alphaDeg);
    const known = point.converged ? point : null;
    const beyond = alphaDeg > 11;
    return [
      row(LADSON, Math.abs(cl) < 0.1 ? 'absolute' : 'relative')(
        `0012 ${alphaDeg}°: cl`,
        cl,
        known?.cl,
        Math.abs(cl) < 0.1 ? 0.02 : 0.05,
      ),
      row(LADSON, 'relative')(`0012 ${alphaDeg}°: cd`, cd, known?.cd, beyond ? 0.2 : 0.1),
    ];
  });
  const correlated = CORRELATED_0012.flatMap(([reynolds, slope, cd]) => {
    const range = { fromDeg: 0, toDeg: 4, stepDeg: 2 };
    const found = sweepAll(section, { reynolds, tripUpper: 0.05, tripLower: 0.05 }, range);
    const first = found[0];
    return [
      row(MCCROSKEY, 'relative')(
        `0012 Re ${reynolds}: lift slope per degree`,
        slope,
        slopeBetween(found, 0, 4),
        0.05,
      ),
      row(MCCROSKEY, 'relative')(
        `0012 Re ${reynolds}: drag at zero lift`,
        cd,
        first?.converged ? first.cd : null,
        0.1,
      ),
    ];
  });
  return [...points, ...correlated];
}

function practiceRows(): ErrorRow[] {
  return (
    [
      ['0012', 80, 4, 10],
      ['6412', 140, 2, 7],
    ] as const
  ).map(([digits, ratio, fromDeg, toDeg]) => {
    const points = sweepAll(prepared(digits), { reynolds: 1e6 }, { fromDeg, toDeg, stepDeg: 0.5 });
    return row(PRACTICE, 'relative')(
      `${digits}: best lift-to-drag`,
      ratio,
      curveFigures(points).bestRatio?.ratio,
      0.1,
    );
  });
}

/** The errors against every value from outside, for the test run and for the README. */
export function flowErrors(): ErrorRow[] {
  return [...inviscidRows(), ...measuredRows(), ...trippedRows(), ...practiceRows()];
}

/** The rows as lines of text. */
export function errorTable(rows: readonly ErrorRow[]): string[] {
  const number = (value: number) => (Math.abs(value) < 0.1 ? value.toFixed(5) : value.toFixed(3));
  const percent = (value: number) => `${(100 * value).toFixed(1)} %`;
  return rows.map(({ what, wanted, found, error, tolerance, kind, met, source }) => {
    const text = kind === 'relative' ? percent : number;
    return `${what.padEnd(46)} ${number(wanted).padStart(9)} ${number(found).padStart(9)} ${text(error).padStart(9)} of ${text(tolerance).padStart(7)} ${met ? 'met   ' : 'MISSED'} ${source}`;
  });
}
