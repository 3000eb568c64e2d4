import { parameterOf, stationOf } from '../shapes/outline.ts';
import { cornerRows, noseRows, tailRows } from './corners.ts';
import { type PlacedSection, type Surface, surfacePoint } from './placing.ts';
import { ENDS, type End, type Plan } from './plan.ts';
import { type Row, type RowEnd, PART } from './row.ts';

export type Sections = Readonly<Record<End, PlacedSection>>;

/** The polygon that is thinned follows the curve this many times closer than the tolerance. */
const FINENESS = 10;
const DENSE = { min: 200, max: 3000 } as const;
/** Where the skins of both surfaces differ, the thicker one passes over to the thinner by 1 in this many, behind this station: a scarf as it is sanded, our choice of slope. */
const SCARF = 20;
const BEHIND_NOSE = 0.04;
/** Skins that differ by less are alike, mm. */
const ALIKE = 1e-6;
/** A corner of the curve this near to another vertex needs none of its own, in fractions of chord. */
const NEAR = 1e-4;

/** The closed contour chain of both ends, far denser than needed, with corners as fans of turning normals. */
export function denseRows(plan: Plan, sections: Sections): Row[] {
  const front = plan.stock.leadingEdgeStation;
  const upper = surfaceRows(plan, sections, 'upper');
  const lower = surfaceRows(plan, sections, 'lower');
  const [lastUpper, lastLower, firstUpper, firstLower] = [upper.at(-1), lower.at(-1), upper[0], lower[0]];
  if (!lastUpper || !lastLower || !firstUpper || !firstLower)
    throw new RangeError('a surface without points');
  const radius = Math.max(plan.kerfMm.root, plan.kerfMm.tip) / 2;
  const fineness = { radius, tolerance: plan.cut.toleranceMm };
  const tail = tailRows(lastUpper, lastLower, fineness);
  const nose =
    front === null
      ? noseRows(firstUpper, firstLower, fineness)
      : cornerRows(firstUpper, firstLower, PART.nose, fineness).rows;
  return [...tail.before, ...upper.slice(1).reverse(), ...nose, ...lower.slice(1), ...tail.after];
}

/** The points of one surface from its foremost to its rearmost station. */
function surfaceRows(plan: Plan, sections: Sections, surface: Surface): Row[] {
  const { upperMm, lowerMm } = plan.allowances;
  const skin = surface === 'upper' ? upperMm : lowerMm;
  const rows = stopsOf(plan, sections, surface).map(({ station, fixed }): Row => {
    const end = (section: PlacedSection): RowEnd => ({
      ...surfacePoint(section, surface, section[surface].parameterAt(station)),
      skin,
    });
    return { station, part: PART[surface], fixed, root: end(sections.root), tip: end(sections.tip) };
  });
  const change = Math.min(upperMm, lowerMm) - skin;
  if (change > -ALIKE || plan.stock.leadingEdgeStation !== null) return rows;
  const fades = { root: fade(rows, 'root', change), tip: fade(rows, 'tip', change) };
  return rows.map((row, i) => ({
    ...row,
    root: { ...row.root, skin: skin + (fades.root[i] ?? 0) },
    tip: { ...row.tip, skin: skin + (fades.tip[i] ?? 0) },
  }));
}

/**
 * What is added to the thicker skin so that it meets the thinner one: the whole change round the nose, then fading at the slope of the scarf, over half
 * the surface at most.
 */
function fade(rows: readonly Row[], end: End, change: number): number[] {
  const arcs: number[] = [];
  let arc = 0;
  let flat = 0;
  rows.forEach((row, i) => {
    const last = rows[i - 1] ?? row;
    arc += Math.hypot(row[end].x - last[end].x, row[end].y - last[end].y);
    if (row.station <= BEHIND_NOSE) flat = arc;
    arcs.push(arc);
  });
  const reach = Math.min(SCARF * Math.abs(change), arc / 2 - flat);
  return arcs.map((value) => change * Math.max(0, 1 - Math.max(0, value - flat) / reach));
}

interface Stop {
  readonly station: number;
  readonly fixed: boolean;
}

/** Steps of the dense chain on each surface, and how many of them a segment may span at most. */
export function denseSteps(plan: Plan): { readonly count: number; readonly longest: number } {
  const chord = Math.max(plan.panel.root.chordMm, plan.panel.tip.chordMm);
  // A step of 1/n in the parameter leaves at most about 0.6 chord / n² between the curve and its chord.
  const wanted = Math.sqrt((0.6 * chord * FINENESS) / plan.cut.toleranceMm);
  const steps = plan.cut.pointsPerSurface - 1;
  const longest = Math.ceil(Math.min(DENSE.max, Math.max(DENSE.min, wanted)) / steps);
  return { count: longest * steps, longest };
}

/** Stations spaced evenly in the curve's parameter, with those that must be vertices: ends, features, and places where the curve has a corner. */
function stopsOf(plan: Plan, sections: Sections, surface: Surface): Stop[] {
  const from = plan.stock.leadingEdgeStation ?? 0;
  const to = plan.stock.trailingEdgeStation ?? 1;
  const { count } = denseSteps(plan);
  const [low, high] = [parameterOf(from), parameterOf(to)];
  const inside = (station: number) => station > from + 1e-9 && station < to - 1e-9;
  const features = plan.features.map(({ rootStation }) => rootStation).filter(inside);
  const corners = ENDS.flatMap((end) =>
    sections[end].outline[surface].breaks.map((t) => sections[end][surface].stationAt(t)),
  ).filter((station) => inside(station) && features.every((of) => Math.abs(of - station) > NEAR));
  const fixed = [from, to, ...features, ...corners].map((station) => ({ station, fixed: true }));
  const even = Array.from({ length: count - 1 }, (_, i) => ({
    station: stationOf(low + ((high - low) * (i + 1)) / count),
    fixed: false,
  }));
  return withoutRepeats([...fixed, ...even].sort((a, b) => a.station - b.station));
}

function withoutRepeats(stops: readonly Stop[]): Stop[] {
  const kept: Stop[] = [];
  for (const stop of stops) {
    const last = kept.at(-1);
    const near =
      last !== undefined && stop.station - last.station <= (stop.fixed && last.fixed ? 1e-7 : 1e-9);
    if (!near) kept.push(stop);
    else if (stop.fixed && !last.fixed) kept[kept.length - 1] = stop;
  }
  return kept;
}
