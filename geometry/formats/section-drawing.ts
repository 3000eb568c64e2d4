import { type Extents } from '../contour/contour.ts';
import { type Outline, stationOf } from '../shapes/outline.ts';
import { type Chain, type Drawing } from './drawing.ts';
import { type FileIdentity, headerLines, titleOf } from './identity.ts';
import { type Layer } from './options.ts';
import { textsBelow } from './text-block.ts';

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
    texts: textsBelow(header, parts.chordMm, { x: 0, y: Math.min(parts.extents.minY, 0) }),
    extents: parts.extents,
  };
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
