import { type Contour } from '../contour/contour.ts';

/** The nearest number with `decimals` decimals. */
export function roundTo(value: number, decimals: number): number {
  const unit = 10 ** decimals;
  return Math.round(value * unit) / unit;
}

/** A contour whose coordinates have `decimals` decimals, as a file will carry them. */
export function roundContour(contour: Contour, decimals: number): Contour {
  const round = (value: number) => roundTo(value, decimals);
  return { ...contour, x: contour.x.map(round), y: contour.y.map(round) };
}

/**
 * A contour without neighbours that coincide; the nose stays. A blunt trailing edge whose two points coincide becomes a sharp one.
 */
export function withoutRepeats({ x, y, noseIndex, sharp }: Contour): Contour {
  const same = (i: number, k: number) => x[i] === x[k] && y[i] === y[k];
  const last = x.length - 1;
  const closes = last > 0 && same(0, last);
  const kept = Array.from(x.keys()).filter((i) => {
    if (i === noseIndex) return true;
    if (i === last && closes) return false;
    return i < noseIndex ? !same(i, i + 1) : !same(i, i - 1);
  });
  return {
    x: Float64Array.from(kept, (i) => x[i] ?? NaN),
    y: Float64Array.from(kept, (i) => y[i] ?? NaN),
    noseIndex: kept.indexOf(noseIndex),
    sharp: sharp || closes,
  };
}
