import { type Point } from '../point.ts';
import { type Polyline, at } from './arrays.ts';
import { type Core } from './core.ts';
import { verticalCut } from './feature-ends.ts';
import { type Finding, mm, note } from './findings.ts';
import { ENDS, type End, type TemplatePlan } from './plan.ts';
import { PART } from './row.ts';

/** The tongue behind the trailing edge is at least as thick as this where the section allows it, so that it can be handled; common practice. */
export const TONGUE_MM = 2;

/** The pairs at which the tongue begins on both surfaces, the same at both ends so that they stay in step. */
export interface Neck {
  readonly upper: number;
  readonly lower: number;
}

/** The rearmost pairs at which both templates are as thick as a tongue must be; those at the trailing edge when no pair is. */
export function neckOf({ panel }: Core, lines: Readonly<Record<End, Polyline>>): Neck {
  const { part } = panel.chain;
  const of = (surface: 'upper' | 'lower') => Array.from(part.keys()).filter((i) => part[i] === PART[surface]);
  const thick = (i: number) =>
    ENDS.every((end) => {
      const cut = verticalCut(lines[end], at(lines[end].x, i));
      return cut !== null && cut.high - cut.low >= TONGUE_MM;
    });
  const [upper, lower] = [of('upper'), of('lower')];
  const [foundUpper, foundLower] = [upper.find(thick), lower.findLast(thick)];
  return foundUpper === undefined || foundLower === undefined
    ? { upper: upper[0] ?? 0, lower: lower.at(-1) ?? 0 }
    : { upper: foundUpper, lower: foundLower };
}

/** One edge of a tongue: from the contour past the trailing edge to its outer end. */
export interface TongueEdge {
  readonly from: Point;
  /** Abreast of the trailing edge. */
  readonly abreast: Point;
  readonly outer: Point;
  /** Unit direction into the template. */
  readonly inwards: Point;
  readonly station: number;
}

/** The outline at the trailing edge of one template. */
export interface Tongue {
  /** The contour between the beginnings of both edges, round the nose. */
  readonly kept: readonly Point[];
  readonly upper: TongueEdge;
  readonly lower: TongueEdge;
  readonly rampMm: number;
  readonly tongueMm: number;
}

/** The tongue of one template: its edges run straight from the neck, as far apart as the template is thick there. */
export function tongueOf(core: Core, end: End, line: Polyline, neck: Neck, rules: TemplatePlan): Tongue {
  const { chain } = core.panel;
  const [ax, ay] = [at(chain[end].nx, 0), at(chain[end].ny, 0)];
  const rampMm = rules.rampFraction * core.panel[end].chordMm;
  const point = (i: number): Point => ({ x: at(line.x, i), y: at(line.y, i) });
  const inner = Array.from(chain.part.keys()).filter((i) => chain.part[i] !== PART.tail);
  const [first, final] = [point(inner[0] ?? 0), point(inner.at(-1) ?? 0)];
  const middle = { x: (first.x + final.x) / 2, y: (first.y + final.y) / 2 };
  const [upper, lower] = [point(neck.upper), point(neck.lower)];
  const tongueMm = Math.abs((upper.y - lower.y) * ax - (upper.x - lower.x) * ay);
  const edge = (from: Point, side: 1 | -1, station: number): TongueEdge => {
    const half = (side * tongueMm) / 2;
    const outer = { x: middle.x + rampMm * ax - half * ay, y: middle.y + rampMm * ay + half * ax };
    const ahead = (middle.x - from.x) * ax + (middle.y - from.y) * ay;
    const share = ahead / (ahead + rampMm);
    const [dx, dy] = [outer.x - from.x, outer.y - from.y];
    const size = Math.hypot(dx, dy);
    return {
      from,
      outer,
      abreast: { x: from.x + share * dx, y: from.y + share * dy },
      inwards: { x: (side * dy) / size, y: (-side * dx) / size },
      station,
    };
  };
  return {
    kept: inner.filter((i) => i >= neck.upper && i <= neck.lower).map(point),
    upper: edge(upper, 1, at(chain.station, neck.upper)),
    lower: edge(lower, -1, at(chain.station, neck.lower)),
    rampMm,
    tongueMm,
  };
}

/** What to know of a tongue: that it is thin, or that foam stays beside it. */
export function tongueFindings({ panel }: Core, end: End, { tongueMm }: Tongue, neck: Neck): Finding[] {
  const path = 'template.rampFraction';
  if (tongueMm < TONGUE_MM - 0.01) {
    const message = `The ramp of the ${end} template is ${mm(tongueMm)} thick at the trailing edge: back it up.`;
    return [note('thin-ramp', path, message, { end })];
  }
  const station = Math.min(at(panel.chain.station, neck.upper), at(panel.chain.station, neck.lower));
  const last = Math.max(...panel.chain.station);
  if (station >= last) return [];
  const aheadMm = (last - station) * panel[end].chordMm;
  const message = `The tongue of the ${end} template is ${mm(tongueMm, 1)} thick: over the last ${mm(aheadMm, 1)} ahead of the trailing edge the foam stays thicker and is sanded to shape.`;
  return [note('tongue-leaves-foam', path, message, { end, station })];
}
