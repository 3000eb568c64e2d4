import { ordinateAtStation, sidesOf } from '../contour/chord-line.ts';
import { type Outline } from '../shapes/outline.ts';

/** The three kinds of stall at low speed, and what lies between the last two. */
export type StallKind = 'thin-airfoil' | 'leading-edge' | 'combined' | 'trailing-edge';

/** Station at which the nose is judged, fractions of chord. */
const NOSE_STATION = 0.0125;
/**
 * Upper-surface ordinates at that station below which each kind is to be expected: read off the correlation of Gault, NACA TN 3963 (1957),
 * for Reynolds numbers of some millions, from memory; the kinds as in McCullough & Gault, NACA TN 2502 (1951). The bounds are about right
 * only, and at low Reynolds numbers the
 * nose stalls with thicker noses too.
 */
const BOUNDS = { thin: 0.01, leadingEdge: 0.0165, combined: 0.0225 } as const;

/**
 * The kind of stall to expect from the height of the upper surface just behind the nose. This method sees trailing-edge stall only: with
 * any other kind the highest lift it finds is too high and the stall comes sooner and more abruptly.
 */
export function expectedStall(outline: Outline): { readonly kind: StallKind; readonly noseOrdinate: number } {
  const noseOrdinate = ordinateAtStation(sidesOf(outline).upper, NOSE_STATION).ordinate;
  return { kind: kindOf(noseOrdinate), noseOrdinate };
}

function kindOf(ordinate: number): StallKind {
  if (ordinate < BOUNDS.thin) return 'thin-airfoil';
  if (ordinate < BOUNDS.leadingEdge) return 'leading-edge';
  return ordinate < BOUNDS.combined ? 'combined' : 'trailing-edge';
}
