/** Lift curve slope per degree with which the search begins: about that of a flat plate with a boundary layer. */
const FIRST_SLOPE = 0.105;
/** Largest step in angle while the target is not yet bracketed, degrees. */
const LARGEST_STEP_DEG = 3;
/** A bracket narrower than this holds no angle to be found any more, degrees. */
const NARROW_DEG = 1e-4;

interface Lift {
  readonly alphaDeg: number;
  readonly cl: number;
}

/**
 * Looks for the angle of a lift coefficient on the rising part of a lift curve: steps by the slope found so far until the target lies between
 * two angles, then interpolates between them; a step that lands beyond the stall is halved.
 */
export class LiftSearch {
  private readonly target: number;
  private below: Lift | null = null;
  private above: Lift | null = null;
  /** An angle beyond the highest lift, where lift is below the target again. */
  private stalledDeg = Infinity;
  private slope = FIRST_SLOPE;

  /** @param target lift coefficient */
  constructor(target: number) {
    this.target = target;
  }

  /** The next angle to look at after a point, or null when there is none left: the section does not reach the target. */
  next(point: Lift): number | null {
    const { below, above } = this;
    const last = below ?? above;
    if (last && point.alphaDeg !== last.alphaDeg) {
      const slope = (point.cl - last.cl) / (point.alphaDeg - last.alphaDeg);
      if (slope > 0.01) this.slope = slope;
    }
    if (point.cl >= this.target) this.above = point;
    else if (below && point.alphaDeg > below.alphaDeg && point.cl < below.cl)
      this.stalledDeg = point.alphaDeg;
    else this.below = point;
    return this.propose();
  }

  private propose(): number | null {
    const { below, above, target, stalledDeg } = this;
    if (below && above) {
      const width = above.alphaDeg - below.alphaDeg;
      const share = (target - below.cl) / (above.cl - below.cl);
      // Kept off the ends, so that a curve that bends does not leave one of them standing.
      return Math.abs(width) < NARROW_DEG
        ? null
        : below.alphaDeg + width * Math.min(0.95, Math.max(0.05, share));
    }
    if (above) return above.alphaDeg - Math.min(LARGEST_STEP_DEG, (above.cl - target) / this.slope + 0.05);
    if (!below) return null;
    if (stalledDeg < Infinity) {
      return stalledDeg - below.alphaDeg < 0.1 ? null : (below.alphaDeg + stalledDeg) / 2;
    }
    return below.alphaDeg + Math.min(LARGEST_STEP_DEG, (target - below.cl) / this.slope + 0.02);
  }
}
