/**
 * Lines of the sheet after ISO 128-2: two widths in the ratio 2:1, and the dash patterns of the line types used here.
 * Widths are CSS pixels on screen; in print one pixel is 1/96 inch, so the wide line comes out at about 0.5 mm.
 */
export const LINE = {
  /** Continuous wide: the outline of the section. */
  wide: 1.9,
  /** Continuous wide of the sheet frame and the title block (ISO 5457 asks for 0.7 mm; drawn calmer on screen). */
  frame: 1.5,
  /** Continuous narrow: dimension, extension and leader lines. */
  narrow: 0.95,
  /** Hair lines of the grid, lighter than any line that carries meaning. */
  hair: 0.75,
} as const;

export const DASH = {
  /** Long-dash-dot narrow: chord line and mean camber line. */
  longDashDot: '14 3.5 1.5 3.5',
  /** Short dashes: another version behind this one. */
  short: '3.5 3',
} as const;

/** Arrowheads: length and half width in pixels (ISO 129-1: closed, filled, about 15° at the tip). */
export const ARROW = { length: 8, halfWidth: 1.7 } as const;

/** Character advance of the typeface as a fraction of its size; it has one width for all characters. */
const ADVANCE = 0.6;

/** Width of a text on the sheet in pixels, exact because the typeface is monospaced. */
export function textWidth(text: string, size: number): number {
  return [...text].length * size * ADVANCE;
}
