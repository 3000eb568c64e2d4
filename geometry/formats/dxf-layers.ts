import { LONG_DASH_DOT_MM, OUTLINE_WIDTH_MM, THIN_WIDTH_MM } from './drawing.ts';
import type { Layer } from './options.ts';

export const CENTER = {
  name: 'CENTER',
  description: 'Long-dashed dotted line',
  /** Dashes positive, gaps negative, in mm. */
  pattern: LONG_DASH_DOT_MM.map((length, i) => (i % 2 === 0 ? length : -length)),
  length: LONG_DASH_DOT_MM.reduce((sum, length) => sum + length, 0),
};

interface LayerStyle {
  /** Colour number of the DXF reference: 7 black or white, 1 red, 5 blue, 3 green. */
  readonly color: number;
  readonly centerLine: boolean;
  /** In hundredths of a millimetre, as group 370 wants it. */
  readonly lineWeight: number;
}

export const LAYER_STYLES: Readonly<Record<Layer, LayerStyle>> = {
  OUTLINE: { color: 7, centerLine: false, lineWeight: OUTLINE_WIDTH_MM * 100 },
  CHORD: { color: 1, centerLine: true, lineWeight: THIN_WIDTH_MM * 100 },
  CAMBER: { color: 5, centerLine: true, lineWeight: THIN_WIDTH_MM * 100 },
  TEXT: { color: 3, centerLine: false, lineWeight: THIN_WIDTH_MM * 100 },
};
