import { expect, test } from 'vitest';
import { panelOutline, panelsOf } from '#geometry/flow/panels.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, naca4 } from '#tests/geometry/shapes/samples.ts';

test.each([20, 80, 160, 320])(
  '%d panels: nodes from edge to edge, no panel more than 1.6 times as long as its neighbour',
  (count) => {
    const panels = panelsOf(panelOutline(outlineOf(naca4('2412')), count));
    expect(panels.nodes).toBe(count + 1);
    expect([panels.x[0], panels.x[count]]).toEqual([1, 1]);
    expect(panels.edge.sharp).toBe(true);
    if (count < 80) return;
    panels.length.forEach((l, j) => j > 0 && expect(Math.max(l / panels.length[j - 1]!, panels.length[j - 1]! / l)).toBeLessThan(1.6)); // prettier-ignore
  },
);

test('the nose of a thin section gets shorter panels', () => {
  const shortest = (digits: string) =>
    Math.min(...panelsOf(panelOutline(outlineOf(naca4(digits)), 160)).length);
  expect(shortest('0006')).toBeLessThan(0.7 * shortest('0015'));
});

test('a blunt edge has its face and a bisector that points downstream', () => {
  const { edge, nodes, x, y } = panelsOf(panelOutline(outlineOf(FREE_FORM), 120));
  expect(edge.sharp).toBe(false);
  expect(edge.gap).toBeCloseTo(0.004 * 1.0005, 6);
  expect(Math.hypot(x[0]! - x[nodes - 1]!, y[0]! - y[nodes - 1]!)).toBeCloseTo(edge.gap, 12);
  expect(edge.bx).toBeGreaterThan(0.98);
  expect(Math.hypot(edge.bx, edge.by)).toBeCloseTo(1, 12);
});

test('odd counts, counts out of range and repeated points are refused', () => {
  const outline = outlineOf(naca4('0012'));
  expect(() => panelOutline(outline, 161)).toThrow(ShapeError);
  expect(() => panelOutline(outline, 10)).toThrow(/panels/);
  const contour = panelOutline(outline, 40);
  const x = contour.x.slice();
  const y = contour.y.slice();
  [x[5], y[5]] = [x[4]!, y[4]!];
  expect(() => panelsOf({ ...contour, x, y })).toThrow(/two equal points/);
  expect(() => panelsOf({ ...contour, x: x.slice(0, 9), y: y.slice(0, 9) })).toThrow(/panels/);
});
