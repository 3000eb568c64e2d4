import { type Extents } from '../contour/contour.ts';
import { type Outline, stationOf } from '../shapes/outline.ts';
import { type Chain, type Drawing, type DrawingText } from './drawing.ts';
import { type FileIdentity, headerLines, titleOf } from './identity.ts';
import { type Layer } from './options.ts';

/** What a drawing of a section is made of; lengths in mm. */
interface SectionDrawingParts {
  readonly outline: Outline;
  readonly identity: FileIdentity;
  readonly chordMm: number;
  readonly toleranceMm: number;
  readonly layers: readonly Layer[];
  /** The outline as it is to be written. */
  readonly chain: Chain;
  readonly extents: Extents;
  /** What the header says about the points. */
  readonly spacing: string;
}

/** The drawing of a section at its chord: outline, chord line, mean camber line within the tolerance, and text below. */
export function sectionDrawing(parts: SectionDrawingParts): Drawing {
  const header = headerLines(parts.identity, { chordMm: parts.chordMm, spacing: parts.spacing });
  return {
    title: titleOf(parts.identity),
    header,
    layers: parts.layers,
    outline: parts.chain,
    chordLine: [
      { x: 0, y: 0 },
      { x: parts.chordMm, y: 0 },
    ],
    camberLine: camberLine(parts.outline, parts.chordMm, parts.toleranceMm),
    texts: textsBelow(header, parts.chordMm, Math.min(parts.extents.minY, 0)),
    extents: parts.extents,
  };
}

/** Heights of capitals in mm: the series of ISO 3098 (from memory). */
const LETTER_HEIGHTS_MM = [1.8, 2.5, 3.5, 5, 7, 10, 14, 20];
/** Letters of this height let a line of some 40 letters end within the chord. */
const CHORD_SHARE = 1 / 40;
const LINE_PITCH = 1.6;

function textsBelow(lines: readonly string[], chordMm: number, lowest: number): readonly DrawingText[] {
  const height = LETTER_HEIGHTS_MM.findLast((h) => h <= chordMm * CHORD_SHARE) ?? 1.8;
  return lines.map((text, i) => ({ text, x: 0, y: lowest - height * (2.5 + LINE_PITCH * i), height }));
}

const CHECKS_PER_PIECE = 8;
const MOST_PIECES = 4096;

/** The mean camber line with as few halvings of cosine-spaced pieces as keep it within the tolerance. */
function camberLine(outline: Outline, chordMm: number, toleranceMm: number): Chain {
  let pieces = 1;
  while (pieces < MOST_PIECES && camberError(outline, pieces) * chordMm > toleranceMm) pieces *= 2;
  const points = Array.from({ length: pieces + 1 }, (_, i) => outline.meanLine(stationOf(i / pieces)));
  return { x: points.map(({ x }) => x * chordMm), y: points.map(({ y }) => y * chordMm) };
}

function camberError(outline: Outline, pieces: number): number {
  let largest = 0;
  for (let i = 0; i < pieces; i += 1) {
    const a = outline.meanLine(stationOf(i / pieces));
    const b = outline.meanLine(stationOf((i + 1) / pieces));
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    for (let k = 1; k < CHECKS_PER_PIECE; k += 1) {
      const p = outline.meanLine(stationOf((i + k / CHECKS_PER_PIECE) / pieces));
      largest = Math.max(largest, Math.abs((b.x - a.x) * (p.y - a.y) - (b.y - a.y) * (p.x - a.x)) / length);
    }
  }
  return largest;
}
