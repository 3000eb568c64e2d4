import { type CstShape } from '#geometry/shapes/cst.ts';
import { type Naca4Shape } from '#geometry/shapes/naca4.ts';

/** A 4-digit section; NACA 2412 unless told otherwise. */
export function naca4(change: Partial<Naca4Shape> = {}): Naca4Shape {
  return {
    kind: 'naca4',
    maxCamber: 0.02,
    maxCamberPosition: 0.4,
    maxThickness: 0.12,
    trailingEdge: 'open',
    ...change,
  };
}

/** A plain free-form section. */
export function cst(change: Partial<CstShape> = {}): CstShape {
  return {
    kind: 'cst',
    upper: [0.17, 0.16, 0.15],
    lower: [-0.16, -0.12, -0.1],
    n1: 0.5,
    n2: 1,
    trailingEdgeGap: 0.002,
    ...change,
  };
}
