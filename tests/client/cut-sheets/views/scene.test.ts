// @vitest-environment node
import { expect, test } from 'vitest';
import { boxOf } from '#geometry/cutting/arrays.ts';
import { type WirePlan } from '#geometry/cutting/plan.ts';
import { highlightsOf } from '#client/cut-sheets/views/highlight.tsx';
import { type PlanModel } from '#client/cut-sheets/views/plan-model.ts';
import { facesAt, sceneOf, shownAt } from '#client/cut-sheets/views/scene.ts';
import { workOut } from '#client/cut-sheets/views/work-out.ts';
import { PLAN } from '#tests/geometry/cutting/plans.ts';

const IDENTITY = { sheetName: 'Heron left', versionNumber: 1, checksum: 'draft', part: 'core' };
/** So that the tests take little time. */
const COARSE = { ...PLAN.cut, toleranceMm: 0.3, pointsPerSurface: 12 };
const worked = new Map<string, PlanModel>();

/** The plan with a change, worked out once for all tests. */
function modelOf(change: Partial<WirePlan> = {}): PlanModel {
  const key = JSON.stringify(change);
  const model = worked.get(key) ?? workOut({ ...PLAN, cut: COARSE, ...change }, IDENTITY).model;
  if (!model) throw new Error('The plan cannot be drawn.');
  worked.set(key, model);
  return model;
}

test('the wire in the plane of a face goes round the contour that is drawn there, half a kerf off', () => {
  for (const rootFace of ['left', 'right'] as const) {
    for (const trailingEdge of ['origin', 'far'] as const) {
      const model = modelOf({ machine: { ...PLAN.machine, rootFace, trailingEdge } });
      const scene = sceneOf(model);
      for (const end of ['root', 'tip'] as const) {
        const { x, y } = scene.wire![end];
        const cuts = model.cut!.kinds.flatMap((kind, i) => (kind === 'cut' ? [i] : []));
        const wire = boxOf({
          x: Float64Array.from(cuts, (i) => x[i]!),
          y: Float64Array.from(cuts, (i) => y[i]!),
        });
        const path = boxOf(facesAt(scene, end)[0]!.path);
        expect(wire.minX).toBeCloseTo(path.minX, 9);
        expect(wire.maxY).toBeCloseTo(path.maxY, 9);
        expect(wire.minY).toBeCloseTo(path.minY, 9);
      }
    }
  }
});

test('seen from above with the nose up, the root is where the machine has it', () => {
  const rootAtLeft = (rootFace: 'left' | 'right', trailingEdge: 'origin' | 'far') =>
    sceneOf(modelOf({ machine: { ...PLAN.machine, rootFace, trailingEdge } })).rootAtLeft;
  expect(rootAtLeft('left', 'origin')).toBe(true);
  expect(rootAtLeft('left', 'far')).toBe(false);
  expect(rootAtLeft('right', 'origin')).toBe(false);
  expect(rootAtLeft('right', 'far')).toBe(true);
});

test('the towers stand as far from the faces as the machine says, whichever way the root looks', () => {
  for (const rootFace of ['left', 'right'] as const) {
    const machine = { ...PLAN.machine, rootFace, trailingEdge: 'far' as const };
    const { bench, spanMm } = sceneOf(modelOf({ machine }));
    const leftFace = rootFace === 'left' ? 0 : spanMm;
    expect(Math.abs(bench!.leftAt - leftFace)).toBeCloseTo(PLAN.machine.blockFromLeftMm, 9);
    expect(Math.abs(bench!.leftAt - bench!.rightAt)).toBeCloseTo(PLAN.machine.towerDistanceMm, 9);
  }
});

test('a tower far off is drawn nearer, in the right order, and what is cut is drawn true', () => {
  const far = sceneOf(modelOf({ machine: { ...PLAN.machine, towerDistanceMm: 3000 } }));
  const { bench, spanMm } = far;
  expect(shownAt(far, 0)).toBe(0);
  expect(shownAt(far, spanMm)).toBe(spanMm);
  expect(shownAt(far, bench!.rightAt)).toBeLessThan(1.5 * spanMm);
  expect(shownAt(far, bench!.rightAt)).toBeGreaterThan(spanMm);
  const near = sceneOf(modelOf());
  expect(shownAt(near, near.bench!.rightAt)).toBe(near.bench!.rightAt);
});

test('the mirrored core of a pair has its tip in the plane of the root', () => {
  const pair = sceneOf(modelOf({ block: { ...PLAN.block, heightMm: 120, pair: true } }));
  expect(pair.cores.map(({ mirrored }) => mirrored)).toEqual([false, true]);
  const [first, second] = facesAt(pair, 'root').map(({ contour }) => boxOf(contour));
  expect(second!.maxX - second!.minX).toBeLessThan(first!.maxX - first!.minX - 30);
});

const finding = { severity: 'error', code: 'web-too-thin', message: 'Thin.' } as const;

test('a finding is shown at the station of the end that it names', () => {
  const scene = sceneOf(modelOf());
  const [mark, ...others] = highlightsOf(
    { ...finding, path: 'features.1.rootDepthMm', at: { end: 'root', station: 0.4 } },
    scene,
  );
  const { nose, trailingEdge } = scene.cores[0]!.root;
  expect(others).toEqual([]);
  expect(mark).toMatchObject({ kind: 'point', view: 'root' });
  expect((mark as { x: number }).x).toBeCloseTo(nose.x + 0.4 * (trailingEdge.x - nose.x), 9);
});

test('a finding without a place is shown at its feature, at both ends or the one of its field', () => {
  const scene = sceneOf(modelOf());
  const views = (path: string) =>
    highlightsOf({ ...finding, path }, scene).map((mark) => (mark.kind === 'point' ? mark.view : mark.kind));
  expect(views('features.0.diameterMm')).toEqual(['root', 'tip']);
  expect(views('features.0.tipStation')).toEqual(['tip']);
  expect(views('features.9.widthMm')).toEqual([]);
  expect(views('cut.toleranceMm')).toEqual([]);
});

test('a finding along the span is a line across the planform', () => {
  const scene = sceneOf(modelOf());
  expect(highlightsOf({ ...finding, path: 'ribs.stations', at: { spanMm: 150 } }, scene)).toEqual([
    { kind: 'station', spanMm: 150 },
  ]);
});
