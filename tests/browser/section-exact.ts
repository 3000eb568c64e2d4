/**
 * The 4-digit section in closed form, written here a second time and on its own, so that the program's geometry is not
 * measured with itself: Jacobs, Ward and Pinkerton, NACA Report 460 (1933); coefficients as published, from memory.
 */
export interface Digits {
  readonly maxCamber: number;
  readonly maxCamberPosition: number;
  readonly maxThickness: number;
}

interface Place {
  readonly x: number;
  readonly y: number;
}

/** A point of a surface of the open section at the station x of the mean line; `side` +1 is the upper surface. */
export function surfacePoint(
  { maxCamber: m, maxCamberPosition: p, maxThickness: t }: Digits,
  side: 1 | -1,
  x: number,
): Place {
  const half =
    5 * t * (0.2969 * Math.sqrt(x) - 0.126 * x - 0.3516 * x ** 2 + 0.2843 * x ** 3 - 0.1015 * x ** 4);
  const ahead = x < p;
  const scale = ahead ? m / p ** 2 : m / (1 - p) ** 2;
  const camber = scale * ((ahead ? 0 : 1 - 2 * p) + 2 * p * x - x ** 2);
  const angle = Math.atan(2 * scale * (p - x));
  return { x: x - side * half * Math.sin(angle), y: camber + side * half * Math.cos(angle) };
}

/** The distance of a point from the nearest of both surfaces, fractions of chord. */
export function distanceFromSection(digits: Digits, point: Place): number {
  return Math.min(...([1, -1] as const).map((side) => distanceFromSurface(digits, side, point)));
}

/** Stations run as u² so that the round nose is resolved; a scan, then a ternary search about its best place. */
function distanceFromSurface(digits: Digits, side: 1 | -1, point: Place): number {
  const at = (u: number) => {
    const { x, y } = surfacePoint(digits, side, u * u);
    return Math.hypot(x - point.x, y - point.y);
  };
  const steps = 400;
  let best = 0;
  for (let i = 1; i <= steps; i += 1) if (at(i / steps) < at(best / steps)) best = i;
  let [from, to] = [Math.max(0, best - 1) / steps, Math.min(steps, best + 1) / steps];
  for (let i = 0; i < 60; i += 1) {
    const third = (to - from) / 3;
    if (at(from + third) < at(to - third)) to -= third;
    else from += third;
  }
  return at((from + to) / 2);
}
