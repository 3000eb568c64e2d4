import { type Polyline, areaOf, at, between } from './arrays.ts';
import { denseRows, denseSteps } from './contour-rows.ts';
import { type PlacedSection, placeSection } from './placing.ts';
import { type End, type Plan } from './plan.ts';
import { type Row, type RowEnd } from './row.ts';
import { thin } from './thinning.ts';

/** The contour at one end, in mm, with what an offset needs to know. */
export interface Face extends Polyline {
  /** Unit normals away from the section. */
  readonly nx: Float64Array;
  readonly ny: Float64Array;
  /** Skin allowance at each point, mm. */
  readonly skin: Float64Array;
}

/**
 * Root and tip contour in step: point k of the root and point k of the tip are the ends of one straight ruling. In order from the middle of
 * the trailing edge over the upper surface, round the nose and back by the lower surface; closed, counter-clockwise. A corner stands
 * several times with turning normals, so that an outward offset goes round it.
 */
export interface Chain {
  readonly root: Face;
  readonly tip: Face;
  /** Chord station of each pair, 0 … 1. */
  readonly station: Float64Array;
  /** Which part of the contour a pair belongs to, as in `PART`. */
  readonly part: Uint8Array;
}

/** Root, tip and their common chain. */
export interface Panel {
  readonly root: PlacedSection;
  readonly tip: PlacedSection;
  readonly chain: Chain;
}

/** Share of the tolerance given to the thinning; the rest covers the finer polygon that is thinned. */
const USED = 0.8;

/**
 * Places root and tip and samples them in step. The chordal tolerance holds for the contours of both ends and for the wire's path at both;
 * the stations of features are points of the chain.
 */
export function buildPanel(plan: Plan): Panel {
  const sections = { root: placeSection(plan.panel, 'root'), tip: placeSection(plan.panel, 'tip') };
  const kept = thin(denseRows(plan, sections), plan.cut.toleranceMm * USED, denseSteps(plan).longest, {
    root: plan.kerfMm.root / 2,
    tip: plan.kerfMm.tip / 2,
  });
  return { ...sections, chain: chainOf(kept) };
}

function chainOf(rows: readonly Row[]): Chain {
  const face = (end: End): Face => {
    const of = (key: keyof RowEnd) => Float64Array.from(rows, (row) => row[end][key]);
    return { x: of('x'), y: of('y'), nx: of('nx'), ny: of('ny'), skin: of('skin') };
  };
  return {
    root: face('root'),
    tip: face('tip'),
    station: Float64Array.from(rows, (row) => row.station),
    part: Uint8Array.from(rows, (row) => row.part),
  };
}

/**
 * The true ruled section at a share of the span, 0 (root) … 1 (tip): each point on its ruling. Normals are those of both ends in
 * proportion to the chords, which is exact for similar sections and second order in the twist otherwise.
 */
export function faceAt({ root, tip, chain }: Panel, share: number): Face {
  const line = between(chain.root, chain.tip, share);
  const skin = chain.root.skin.map((value, i) => value + share * (at(chain.tip.skin, i) - value));
  const [a, b] = [(1 - share) * root.chordMm, share * tip.chordMm];
  const nx = new Float64Array(skin.length);
  const ny = new Float64Array(skin.length);
  for (let i = 0; i < skin.length; i++) {
    const x = a * at(chain.root.nx, i) + b * at(chain.tip.nx, i);
    const y = a * at(chain.root.ny, i) + b * at(chain.tip.ny, i);
    const size = Math.hypot(x, y);
    nx[i] = x / size;
    ny[i] = y / size;
  }
  return { ...line, nx, ny, skin };
}

/**
 * Volume between two polygons in step, spanned by straight rulings, in mm³: the prismatoid formula span/6 (A₀ + 4 A½ + A₁), exact here because
 * the area of a ruled section is quadratic along the span.
 */
export function ruledVolume(root: Polyline, tip: Polyline, spanMm: number): number {
  return (spanMm / 6) * (areaOf(root) + 4 * areaOf(between(root, tip, 0.5)) + areaOf(tip));
}
