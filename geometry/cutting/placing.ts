import { type Point } from '../point.ts';
import { type Outline } from '../shapes/outline.ts';
import { outlineOf } from '../shapes/shape.ts';
import { type End, type PanelPlan } from './plan.ts';
import { type StationMap, stationMap } from './stations.ts';

export type Surface = 'upper' | 'lower';

/** A section in its place in the panel: enlarged to its chord, turned and moved. */
export interface PlacedSection {
  readonly outline: Outline;
  readonly chordMm: number;
  readonly upper: StationMap;
  readonly lower: StationMap;
  /** Cosine and sine of the angle by which it is turned, counter-clockwise. */
  readonly cos: number;
  readonly sin: number;
  /** A point of the unit sheet in the panel, mm. */
  toPanel(point: Point): Point;
  /** A point of the panel on the unit sheet. */
  toSheet(point: Point): Point;
}

/** A point of a placed surface with its unit normal away from the section. */
export interface SurfacePoint extends Point {
  readonly nx: number;
  readonly ny: number;
}

/** At a pointed end the curve's derivative vanishes; its direction is taken this far inside. */
const NUDGE = 1e-5;

/** Root or tip in the panel's frame: the root's leading edge at the origin, the tip swept, raised and turned by the washout. */
export function placeSection(panel: PanelPlan, end: End): PlacedSection {
  const { shape, chordMm } = panel[end];
  const outline = outlineOf(shape);
  const tip = end === 'tip';
  const angle = tip ? (panel.washoutDeg * Math.PI) / 180 : 0;
  const pivot = tip ? panel.washoutStation * chordMm : 0;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  const x0 = pivot + (tip ? panel.sweepMm : 0);
  const y0 = tip ? panel.verticalOffsetMm : 0;
  return {
    outline,
    chordMm,
    cos,
    sin,
    upper: stationMap(outline.upper),
    lower: stationMap(outline.lower),
    toPanel: ({ x, y }) => {
      const along = x * chordMm - pivot;
      return { x: x0 + cos * along - sin * y * chordMm, y: y0 + sin * along + cos * y * chordMm };
    },
    toSheet: ({ x, y }) => {
      const [along, up] = [x - x0, y - y0];
      return { x: (pivot + cos * along + sin * up) / chordMm, y: (cos * up - sin * along) / chordMm };
    },
  };
}

/** The point of a surface at a parameter, in the panel. */
export function surfacePoint(section: PlacedSection, surface: Surface, t: number): SurfacePoint {
  const curve = section.outline[surface];
  const inside = curve.derivatives(Math.min(1 - NUDGE, t));
  const { dx, dy } =
    Math.hypot(inside.dx, inside.dy) > NUDGE ? inside : curve.derivatives(Math.min(1 - NUDGE, t + NUDGE));
  const { x, y } = section.toPanel(t > 1 - NUDGE ? curve.at(t) : inside);
  // The upper surface has the outside on its left from the nose on, the lower on its right.
  const size = (surface === 'upper' ? 1 : -1) * Math.hypot(dx, dy);
  const { cos, sin } = section;
  return { x, y, nx: (-sin * dx - cos * dy) / size, ny: (cos * dx - sin * dy) / size };
}

/** The station at which a straight spar that stands square on the root face meets the tip's chord: it may lie outside 0 … 1. */
export function squareTipStation(panel: PanelPlan, rootStation: number): number {
  const cos = Math.cos((panel.washoutDeg * Math.PI) / 180);
  const pivot = panel.washoutStation * panel.tip.chordMm;
  const x = rootStation * panel.root.chordMm - panel.sweepMm - pivot;
  return (pivot + x / cos) / panel.tip.chordMm;
}
