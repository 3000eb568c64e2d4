import { LONG_DASH_DOT_MM, OUTLINE_WIDTH_MM, THIN_WIDTH_MM } from './drawing.ts';
import type { DxfLayer } from './dxf-document.ts';
import type { Layer } from './options.ts';

export const CENTER = {
  name: 'CENTER',
  description: 'Long-dashed dotted line',
  /** Dashes positive, gaps negative, in mm. */
  pattern: LONG_DASH_DOT_MM.map((length, i) => (i % 2 === 0 ? length : -length)),
  length: LONG_DASH_DOT_MM.reduce((sum, length) => sum + length, 0),
};

/** The layers of a section's drawing. */
export const SECTION_LAYERS: Readonly<Record<Layer, DxfLayer>> = {
  OUTLINE: { name: 'OUTLINE', color: 7, centerLine: false, lineWeight: OUTLINE_WIDTH_MM * 100 },
  CHORD: { name: 'CHORD', color: 1, centerLine: true, lineWeight: THIN_WIDTH_MM * 100 },
  CAMBER: { name: 'CAMBER', color: 5, centerLine: true, lineWeight: THIN_WIDTH_MM * 100 },
  TEXT: { name: 'TEXT', color: 3, centerLine: false, lineWeight: THIN_WIDTH_MM * 100 },
};
