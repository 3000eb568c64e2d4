import { expect, test } from 'vitest';
import { forcesOf } from '#geometry/flow/forces.ts';
import { panelOutline, panelsOf } from '#geometry/flow/panels.ts';
import { panelSystem, strengthsAt } from '#geometry/flow/inviscid.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

const panels = panelsOf(panelOutline(outlineOf(naca4('2412', 'open')), 160));

test('air at one pressure all round pushes nowhere', () => {
  const still = forcesOf(panels, new Float64Array(panels.nodes), 0.1, 0);
  expect(still.cl).toBeCloseTo(0, 12);
  expect(still.cm).toBeCloseTo(0, 12);
  expect(still.cp.every((value) => value === 1)).toBe(true);
});

test('lift from pressures is that of the circulation, 2 Γ', () => {
  const alpha = 0.07;
  const speed = strengthsAt(panelSystem(panels, false), alpha);
  let circulation = 0;
  panels.length.forEach((l, j) => (circulation += ((speed[j]! + speed[j + 1]!) / 2) * l));
  const face =
    (-(speed[0]! - speed.at(-1)!) / 2) * (panels.edge.bx * panels.edge.tx + panels.edge.by * panels.edge.ty);
  circulation += face * panels.edge.gap;
  expect(Math.abs(forcesOf(panels, speed, alpha, 0).cl - 2 * circulation)).toBeLessThan(1e-3);
});

test('a Mach number out of range is refused', () => {
  expect(() => forcesOf(panels, new Float64Array(panels.nodes), 0, 0.9)).toThrow(/mach/);
});
