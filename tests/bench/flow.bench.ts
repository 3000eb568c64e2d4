import { panelOutline } from '#geometry/flow/panels.ts';
import { inviscidFlow } from '#geometry/flow/inviscid.ts';
import { DenseMatrix } from '#geometry/flow/dense.ts';
import { sweepAll } from '#geometry/flow/sweep.ts';
import { ViscousSection, prepareSection } from '#geometry/flow/viscous.ts';
import { outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { type Bench, type Figure } from './figures.ts';

const SHAPE: Shape = {
  kind: 'naca4',
  maxCamber: 0.02,
  maxCamberPosition: 0.4,
  maxThickness: 0.12,
  trailingEdge: 'closed',
};
const OUTLINE = outlineOf(SHAPE);
/** Nodes of the surface and the wake: the size of the coupled system. */
const SYSTEM = 181;

/** Median time of one call in ms, after the engine has compiled it. */
function medianMs(work: (run: number) => unknown, warmUp: number, runs: number): number {
  let kept: unknown;
  for (let i = 0; i < warmUp; i += 1) kept = work(i);
  const times = Array.from({ length: runs }, (_, i) => {
    const start = performance.now();
    kept = work(warmUp + i);
    return performance.now() - start;
  });
  if (kept === undefined) throw new Error('Nothing was measured.');
  return times.sort((a, b) => a - b)[Math.floor(runs / 2)] ?? NaN;
}

function factorisation(): number {
  const values = Float64Array.from({ length: SYSTEM * SYSTEM }, (_, i) => Math.sin(1 + i * i));
  for (let i = 0; i < SYSTEM; i++) values[i * SYSTEM + i] = 20;
  const matrix = new DenseMatrix(SYSTEM);
  return medianMs(
    () => {
      matrix.values.set(values);
      return matrix.factorise();
    },
    60,
    101,
  );
}

/** One point after another in steps of a degree, up and down the attached range. */
function warmPoints(): number {
  const section = new ViscousSection(prepareSection(panelOutline(OUTLINE, 160)), { reynolds: 5e5 });
  const angles = [0, 1, 2, 3, 4, 5, 6, 7, 8, 7, 6, 5, 4, 3, 2, 1];
  return medianMs((run) => section.at(angles[run % angles.length] ?? 0), 48, 96);
}

function figures(): Figure[] {
  const contour = panelOutline(OUTLINE, 160);
  const curve = { fromDeg: -10, toDeg: 14, stepDeg: 1 };
  const wide = { fromDeg: -20, toDeg: 20, stepDeg: 1 };
  return [
    { what: 'panels of an outline', value: medianMs(() => panelOutline(OUTLINE, 160), 100, 101), unit: 'ms' },
    { what: 'potential flow at one angle, 160 panels', value: medianMs(() => inviscidFlow(contour, [4]), 40, 61), unit: 'ms', goal: 4 }, // prettier-ignore
    { what: 'section made ready for the boundary layer', value: medianMs(() => prepareSection(contour), 20, 41), unit: 'ms' }, // prettier-ignore
    { what: `dense factorisation of ${SYSTEM} equations`, value: factorisation(), unit: 'ms' },
    { what: 'viscous point, 1° from the last', value: warmPoints(), unit: 'ms', goal: 15 },
    {
      what: '25 angles at one Reynolds number, section included',
      value: medianMs(() => sweepAll(prepareSection(contour), { reynolds: 5e5 }, curve), 1, 5),
      unit: 'ms',
      goal: 1500,
    },
    {
      what: '41 angles at three Reynolds numbers, one core',
      value: medianMs(
        () => {
          const section = prepareSection(contour);
          return [2e5, 5e5, 1e6].map((reynolds) => sweepAll(section, { reynolds }, wide));
        },
        0,
        3,
      ),
      unit: 'ms',
    },
  ];
}

const bench: Bench = { name: 'Flow (medians of warm calls)', run: () => Promise.resolve(figures()) };
export default bench;
