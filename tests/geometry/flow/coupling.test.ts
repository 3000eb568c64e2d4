import { expect, test, vi } from 'vitest';
import { Coupling } from '#geometry/flow/coupling.ts';
import { panelSystem } from '#geometry/flow/inviscid.ts';
import { PointView } from '#geometry/flow/panel-influence.ts';
import { panelOutline, panelsOf } from '#geometry/flow/panels.ts';
import { wakeSpeed } from '#geometry/flow/wake.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const make = (edge: 'open' | 'closed') => {
  const panels = panelsOf(panelOutline(outlineOf(naca4('2412', edge)), 120));
  return { panels, outer: new Coupling(panelSystem(panels, true)).at(0.08) };
};

test.each(['open', 'closed'] as const)(
  '%s edge: defects that do not change along the way displace nothing',
  (edge) => {
    const { panels, outer } = make(edge);
    const { influence, size } = outer;
    for (const i of [0, 30, 60, 100, 120, 125, 135]) {
      const row = influence.subarray(i * size, (i + 1) * size);
      expect(row.subarray(0, panels.nodes).reduce((sum, value) => sum + value, 0)).toBeCloseTo(0, 6);
      expect(row.subarray(panels.nodes).reduce((sum, value) => sum + value, 0)).toBeCloseTo(0, 6);
    }
  },
);

test.each(['open', 'closed'] as const)(
  '%s edge: the air inside stays at rest whatever the defects',
  (edge) => {
    const { panels, outer } = make(edge);
    const { influence, size, wake } = outer;
    const n = panels.nodes;
    const defects = Float64Array.from(
      { length: size },
      (_, i) => (i < n ? Math.sin(i / 9) : 0.5 + (i - n) / 40) * 0.01,
    );
    const strengths = Float64Array.from({ length: n }, (_, i) => defects.reduce((sum, m, j) => sum + influence[i * size + j]! * m, 0)); // prettier-ignore
    const view = new PointView(panels);
    const [vortex, source] = [new Float64Array(n), new Float64Array(n - 1)];
    const speedAt = (x: number, y: number, ux: number, uy: number) => {
      view.look(x, y);
      view.speedRow(ux, uy, vortex, 0, source, 0);
      let speed = vortex.reduce((sum, value, i) => sum + value * strengths[i]!, 0);
      for (let j = 0; j < n - 1; j++)
        speed += (source[j]! * (defects[j]! - defects[j + 1]!)) / panels.length[j]!;
      for (let p = 0; p < wake.nodes - 1; p++) {
        speed +=
          (wakeSpeed(wake, p, x, y, ux, uy) * (defects[n + p + 1]! - defects[n + p]!)) / wake.length[p]!;
      }
      return speed;
    };
    for (const [x, y] of [
      [0.2, 0.01],
      [0.5, 0.02],
      [0.75, 0.01],
    ] as const) {
      const outside = Math.hypot(speedAt(x, y + 0.12, 1, 0), speedAt(x, y + 0.12, 0, 1));
      const inside = Math.hypot(speedAt(x, y, 1, 0), speedAt(x, y, 0, 1));
      expect(inside).toBeLessThan(0.02 * outside);
    }
  },
);

test('the first node of the wake has the speed and the answers of the upper edge; without a layer the wake comes up to the stream', () => {
  const { panels, outer } = make('closed');
  const n = panels.nodes;
  expect(outer.inviscid[n]).toBe(outer.inviscid[0]);
  expect(outer.influence[n * outer.size + 40]).toBe(outer.influence[40]);
  expect(outer.inviscid[outer.size - 1]).toBeGreaterThan(0.98);
  expect(outer.inviscid[outer.size - 1]).toBeLessThan(1.01);
  for (let k = n + 2; k < outer.size; k++) expect(outer.inviscid[k]).toBeGreaterThan(outer.inviscid[k - 1]!);
});
