/**
 * The NACA 4-digit section straight from its printed formulas (NACA Report 460; NACA Report 824), written a second time and in
 * another way than in geometry/, so that files can be held against something that the writers do not use.
 */
interface FourDigits {
  readonly maxCamber: number;
  readonly maxCamberPosition: number;
  readonly maxThickness: number;
  readonly trailingEdge: 'open' | 'closed';
}

export const NACA_2412 = {
  kind: 'naca4',
  maxCamber: 0.02,
  maxCamberPosition: 0.4,
  maxThickness: 0.12,
  trailingEdge: 'open',
} as const;

export type XY = readonly [x: number, y: number];

/** Upper trailing edge, nose, lower trailing edge, `stations` on each surface, fractions of chord times `chord`. */
export function closedForm(form: FourDigits, chord: number, stations = 2000): readonly XY[] {
  const upper: XY[] = [];
  const lower: XY[] = [];
  for (let i = 0; i <= stations; i += 1) {
    const x = 0.5 - 0.5 * Math.cos((Math.PI * i) / stations);
    const { maxCamber: m, maxCamberPosition: p, maxThickness: t } = form;
    const last = form.trailingEdge === 'open' ? -0.1015 : -0.1036;
    const yt = 5 * t * (0.2969 * x ** 0.5 - 0.126 * x - 0.3516 * x ** 2 + 0.2843 * x ** 3 + last * x ** 4);
    const [yc, slope] =
      m === 0
        ? [0, 0]
        : x < p
          ? [(m / p ** 2) * (2 * p * x - x ** 2), ((2 * m) / p ** 2) * (p - x)]
          : [(m / (1 - p) ** 2) * (1 - 2 * p + 2 * p * x - x ** 2), ((2 * m) / (1 - p) ** 2) * (p - x)];
    const theta = Math.atan(slope);
    upper.push([chord * (x - yt * Math.sin(theta)), chord * (yc + yt * Math.cos(theta))]);
    lower.push([chord * (x + yt * Math.sin(theta)), chord * (yc - yt * Math.cos(theta))]);
  }
  return [...upper.reverse(), ...lower.slice(1)];
}

/** Distance of a point from a chain of straight pieces. */
export function distanceToChain([px, py]: XY, chain: readonly XY[], closed = false): number {
  let least = Infinity;
  for (let i = closed ? 0 : 1; i < chain.length; i += 1) {
    const [ax, ay] = chain[i === 0 ? chain.length - 1 : i - 1]!;
    const [bx, by] = chain[i]!;
    const [dx, dy] = [bx - ax, by - ay];
    const square = dx * dx + dy * dy;
    const share = square === 0 ? 0 : Math.min(1, Math.max(0, ((px - ax) * dx + (py - ay) * dy) / square));
    least = Math.min(least, Math.hypot(px - ax - share * dx, py - ay - share * dy));
  }
  return least;
}

export interface BulgeVertex {
  readonly x: number;
  readonly y: number;
  readonly bulge?: number;
}

/**
 * Distance of a point from a closed chain of arcs, each by its centre, radius and the angle over which it runs (DXF reference,
 * LWPOLYLINE: bulge is the tangent of a quarter of the included angle, negative clockwise).
 */
export function distanceToArcs(point: XY, vertices: readonly BulgeVertex[]): number {
  return Math.min(
    ...vertices.map((a, i) => {
      const b = vertices[(i + 1) % vertices.length]!;
      const ends: readonly XY[] = [
        [a.x, a.y],
        [b.x, b.y],
      ];
      if (!a.bulge) return distanceToChain(point, ends);
      const included = 4 * Math.atan(a.bulge);
      const chord = Math.hypot(b.x - a.x, b.y - a.y);
      const radius = chord / 2 / Math.sin(Math.abs(included) / 2);
      const toCenter =
        Math.atan2(b.y - a.y, b.x - a.x) + Math.sign(included) * (Math.PI / 2 - Math.abs(included) / 2);
      const [cx, cy] = [a.x + radius * Math.cos(toCenter), a.y + radius * Math.sin(toCenter)];
      const start = Math.atan2(a.y - cy, a.x - cx);
      const turned = (Math.atan2(point[1] - cy, point[0] - cx) - start) * Math.sign(included);
      const angle = ((turned % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI);
      if (angle <= Math.abs(included)) return Math.abs(Math.hypot(point[0] - cx, point[1] - cy) - radius);
      return Math.min(...ends.map(([x, y]) => Math.hypot(point[0] - x, point[1] - y)));
    }),
  );
}
