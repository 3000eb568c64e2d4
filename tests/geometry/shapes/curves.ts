import { expect } from 'vitest';
import { type SurfaceCurve } from '#geometry/shapes/outline.ts';

/** Compares the analytic derivatives with central differences, away from the ends and breaks. */
export function expectDerivatives(
  surface: SurfaceCurve,
  parameters: readonly number[],
  tolerance = 1e-6,
): void {
  for (const t of parameters) {
    const h = 1e-5;
    const [a, m, b] = [surface.derivatives(t - h), surface.derivatives(t), surface.derivatives(t + h)];
    const here = surface.at(t);
    expect(Math.hypot(m.x - here.x, m.y - here.y)).toBeLessThan(1e-15);
    expect(Math.abs((b.x - a.x) / (2 * h) - m.dx)).toBeLessThan(tolerance);
    expect(Math.abs((b.y - a.y) / (2 * h) - m.dy)).toBeLessThan(tolerance);
    expect(Math.abs((b.dx - a.dx) / (2 * h) - m.ddx)).toBeLessThan(tolerance);
    expect(Math.abs((b.dy - a.dy) / (2 * h) - m.ddy)).toBeLessThan(tolerance);
  }
}

/** Every number that the surface hands out is finite. */
export function expectFinite(surface: SurfaceCurve): void {
  for (const t of [0, 1e-12, 1e-6, 0.1, 0.5, 0.9, 1 - 1e-6, 1 - 1e-12, 1]) {
    const numbers = [...Object.values(surface.derivatives(t)), ...Object.values(surface.at(t))];
    expect(numbers.every(Number.isFinite)).toBe(true);
  }
}
