import { type Point } from '../point.ts';
import { type Polyline, polylineOf } from './arrays.ts';

/**
 * Digits of single strokes in tenths of the height, as the line of a stroke one tenth wide runs in them: upright, after the proportions of ISO
 * 3098-1, type B (height 10, stroke 1, gap between characters 2, from memory). The forms are our own.
 */
interface Glyph {
  /** Width of the stroke's line; the character itself is one stroke wider. */
  readonly width: number;
  readonly lines: readonly (readonly Point[])[];
}

const STROKE = 1;
const GAP = 2;
/** Height of the stroke's line: half a stroke stays on either side. */
const TOP = 10 - STROKE;
const ARC_STEP_DEG = 15;

function p(x: number, y: number): Point {
  return { x, y };
}

/** Points of an upright ellipse from one angle to another, counter-clockwise when the second is larger. */
function arc(cx: number, cy: number, rx: number, ry: number, fromDeg: number, toDeg: number): Point[] {
  const steps = Math.ceil(Math.abs(toDeg - fromDeg) / ARC_STEP_DEG);
  return Array.from({ length: steps + 1 }, (_, i) => {
    const angle = ((fromDeg + ((toDeg - fromDeg) * i) / steps) * Math.PI) / 180;
    return p(cx + rx * Math.cos(angle), cy + ry * Math.sin(angle));
  });
}

const SIX = [...arc(3.5, 2.8, 3.5, TOP - 2.8, 90, 180), ...arc(2, 2.8, 2, 2.8, 180, 540).slice(1)];

const GLYPHS: Readonly<Record<string, Glyph>> = {
  '0': { width: 4, lines: [[...arc(2, 7, 2, 2, 0, 180), ...arc(2, 2, 2, 2, 180, 360), p(4, 7)]] },
  '1': { width: 2, lines: [[p(0, 7), p(2, TOP), p(2, 0)]] },
  '2': { width: 4, lines: [[...arc(2, 7, 2, 2, 180, -30), p(0, 0), p(4, 0)]] },
  '3': { width: 4, lines: [[...arc(2, 6.9, 1.9, 2.1, 150, -90), ...arc(2, 2.4, 2, 2.4, 90, -150).slice(1)]] },
  '4': { width: 4, lines: [[p(3, 0), p(3, TOP), p(0, 2.5), p(4, 2.5)]] },
  '5': { width: 4, lines: [[p(3.8, TOP), p(0.7, TOP), p(0.4, 4.6), ...arc(2, 2.8, 2, 2.8, 120, -150)]] },
  '6': { width: 4, lines: [SIX] },
  '7': { width: 4, lines: [[p(0, TOP), p(4, TOP), p(1.2, 0)]] },
  '8': { width: 4, lines: [[...arc(2, 6.9, 1.9, 2.1, -90, 270), ...arc(2, 2.4, 2, 2.4, 90, 450).slice(1)]] },
  '9': { width: 4, lines: [SIX.map(({ x, y }) => p(4 - x, TOP - y))] },
  '.': { width: 0, lines: [[p(0, 0), p(0, 0.5)]] },
};

/** Width over height of a text of digits and points, its strokes' thickness included. */
export function strokeWidth(text: string): number {
  const glyphs = glyphsOf(text);
  const sum = glyphs.reduce((total, { width }) => total + width + STROKE, 0);
  return (sum + GAP * Math.max(0, glyphs.length - 1)) / 10;
}

/**
 * The lines to engrave for a text of digits and points, centred on a place.
 * @param text digits and decimal points
 * @param heightMm height of the digits, the stroke's thickness of a tenth included
 * @throws RangeError when a character has no strokes
 */
export function strokeText(text: string, centre: Point, heightMm: number): Polyline[] {
  const unit = heightMm / 10;
  const left = centre.x - (strokeWidth(text) * heightMm) / 2;
  const bottom = centre.y - heightMm / 2;
  let pen = 0;
  return glyphsOf(text).flatMap(({ width, lines }) => {
    const from = pen + STROKE / 2;
    pen += width + STROKE + GAP;
    return lines.map((points) =>
      polylineOf(points.map(({ x, y }) => p(left + (from + x) * unit, bottom + (STROKE / 2 + y) * unit))),
    );
  });
}

function glyphsOf(text: string): Glyph[] {
  return Array.from(text, (character) => {
    const glyph = GLYPHS[character];
    if (!glyph) throw new RangeError(`There are no strokes for “${character}”.`);
    return glyph;
  });
}
