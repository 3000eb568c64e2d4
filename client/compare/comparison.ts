import { deviationOf, laidOn, type OutlineDeviation } from '#geometry/contour/deviation.ts';
import { type Point } from '#geometry/point.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { drawSection, type SectionDrawing } from '#client/drawing/section-drawing.ts';
import { type OfferedAlignment } from './choice.ts';

/** One version in a comparison. Lengths in fractions of chord. */
export interface Compared {
  /** Its number in the list, from 1: the tag on the drawing and the head of its column. */
  readonly tag: number;
  readonly version: SectionVersion;
  readonly drawing: SectionDrawing;
  /** Its contour as laid on the reference: upper trailing edge → nose → lower trailing edge. */
  readonly points: readonly Point[];
  /** From the reference; null for the reference itself. */
  readonly deviation: OutlineDeviation | null;
}

/** Lays every version on the first one and measures how far it lies off. */
export function compare(
  entries: readonly { readonly tag: number; readonly version: SectionVersion }[],
  alignment: OfferedAlignment,
): Compared[] {
  const [first] = entries;
  if (!first) return [];
  const reference = drawSection(first.version.shape);
  return entries.map(({ tag, version }, index) => {
    const drawing = drawSection(version.shape);
    const { x, y } = drawing.contour;
    const own = Array.from(x, (value, i): Point => ({ x: value, y: y[i] ?? 0 }));
    return {
      tag,
      version,
      drawing,
      points: index === 0 ? own : laidOn(reference.outline, drawing.outline, alignment, own),
      deviation: index === 0 ? null : deviationOf(reference.outline, drawing.outline, alignment),
    };
  });
}

/** The largest deviation of all, in size; 0 when there is none. */
export function largestOf(compared: readonly Compared[]): number {
  return Math.max(0, ...compared.map(({ deviation }) => Math.abs(deviation?.largest.deviation ?? 0)));
}
