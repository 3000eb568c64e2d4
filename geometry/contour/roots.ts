/** A function's value and its slope at one place. */
interface ValueAndSlope {
  readonly value: number;
  readonly slope: number;
}

const MOST_STEPS = 100;

/**
 * A root between two places by Newton's method, safeguarded by bisection: a step that leaves the bracket or does not shorten quickly
 * enough is replaced by the middle (after Press et al., Numerical Recipes, "rtsafe").
 * The value must not be positive at `low` and not be negative at `high`; `low` may lie on either side of `high`.
 * @param start first guess; outside the bracket it is replaced by the middle
 * @param tolerance absolute, of the place
 * @returns the place evaluated last
 */
export function safeguardedRoot(
  evaluate: (at: number) => ValueAndSlope,
  low: number,
  high: number,
  start: number,
  tolerance: number,
): number {
  let below = low;
  let above = high;
  let at = (start - below) * (start - above) < 0 ? start : (below + above) / 2;
  let lastStep = Math.abs(above - below);
  for (let step = 0; ; step++) {
    const { value, slope } = evaluate(at);
    const newton = at - value / slope;
    if (value === 0 || Math.abs(newton - at) <= tolerance || step === MOST_STEPS) return at;
    if (value < 0) below = at;
    else above = at;
    const inside = (newton - below) * (newton - above) < 0;
    const next = inside && Math.abs(newton - at) < 0.6 * lastStep ? newton : (below + above) / 2;
    lastStep = Math.abs(next - at);
    if (lastStep <= tolerance) return at;
    at = next;
  }
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * The place of the largest value between two places, for a function with one peak there, by golden section.
 * @param low not above `high`
 * @param tolerance absolute, of the place; below rounding it is met as far as rounding allows
 */
export function goldenMaximum(
  f: (at: number) => number,
  low: number,
  high: number,
  tolerance: number,
): { readonly at: number; readonly value: number } {
  let [a, b] = [low, high];
  let [c, d] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)];
  let [fc, fd] = [f(c), f(d)];
  for (let step = 0; step < MOST_STEPS && b - a > tolerance; step++) {
    if (fc > fd) {
      [b, d, fd] = [d, c, fc];
      c = b - GOLDEN * (b - a);
      fc = f(c);
    } else {
      [a, c, fc] = [c, d, fd];
      d = a + GOLDEN * (b - a);
      fd = f(d);
    }
  }
  return fc > fd ? { at: c, value: fc } : { at: d, value: fd };
}
