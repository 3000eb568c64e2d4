import { expect, test } from 'vitest';
import { PointView } from '#geometry/flow/panel-influence.ts';
import { panelOutline, panelsOf } from '#geometry/flow/panels.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

const sharp = panelsOf(panelOutline(outlineOf(naca4('4412')), 24));
const blunt = panelsOf(panelOutline(outlineOf(naca4('4412', 'open')), 24));
const POINTS = [
  [0.4, 0.3],
  [-0.2, 0.05],
  [0.5, 0.01],
  [1.3, -0.1],
] as const;

const stream = (panels: typeof sharp, x: number, y: number) => {
  const view = new PointView(panels);
  const [vortex, source] = [new Float64Array(panels.nodes), new Float64Array(panels.nodes - 1)];
  view.look(x, y);
  view.streamRow(vortex, 0, source, 0);
  return { vortex, source };
};

test('stream function of a linear vortex panel: ∫ γ ln r ds / 2π by fine midpoints', () => {
  const [px, py] = [0.4, 0.3];
  const { vortex } = stream(sharp, px, py);
  const sum = (node: number) => {
    let total = 0;
    for (const [j, rising] of [
      [node - 1, true],
      [node, false],
    ] as const) {
      for (let k = 0; k < 400; k++) {
        const t = (k + 0.5) / 400;
        const l = sharp.length[j]!;
        const [x, y] = [sharp.x[j]! + t * l * sharp.tx[j]!, sharp.y[j]! + t * l * sharp.ty[j]!];
        total += ((rising ? t : 1 - t) * Math.log(Math.hypot(px - x, py - y)) * l) / 400 / (2 * Math.PI);
      }
    }
    return total;
  };
  for (const node of [3, 8, 12, 20]) expect(vortex[node]).toBeCloseTo(sum(node), 7);
});

test.each(POINTS)('the speed at (%d, %d) is the slope of the stream function, edge face included', (x, y) => {
  for (const panels of [sharp, blunt]) {
    const view = new PointView(panels);
    const step = 1e-5;
    const between = (a: Float64Array, b: Float64Array, k: number) => (a[k]! - b[k]!) / (2 * step);
    const [up, down, right, left] = [stream(panels, x, y + step), stream(panels, x, y - step), stream(panels, x + step, y), stream(panels, x - step, y)]; // prettier-ignore
    const [vortex, source] = [new Float64Array(panels.nodes), new Float64Array(panels.nodes - 1)];
    const [ux, uy] = [0.6, 0.8];
    view.look(x, y);
    view.speedRow(ux, uy, vortex, 0, source, 0);
    for (let k = 0; k < panels.nodes; k += 3) {
      expect(vortex[k]).toBeCloseTo(
        ux * between(up.vortex, down.vortex, k) - uy * between(right.vortex, left.vortex, k),
        6,
      );
    }
    for (let k = 0; k < panels.nodes - 1; k += 3) {
      expect(source[k]).toBeCloseTo(
        ux * between(up.source, down.source, k) - uy * between(right.source, left.source, k),
        6,
      );
    }
  }
});

test('sources alone may be left out', () => {
  const view = new PointView(sharp);
  const vortex = new Float64Array(sharp.nodes);
  view.look(0.4, 0.3);
  view.streamRow(vortex, 0, null, 0);
  expect(vortex).toEqual(stream(sharp, 0.4, 0.3).vortex);
});
