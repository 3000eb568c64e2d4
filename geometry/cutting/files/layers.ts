import { THIN_WIDTH_MM } from '../../formats/drawing.ts';
import { type DxfLayer } from '../../formats/dxf-document.ts';

const layer = (name: string, color: number): DxfLayer => ({
  name,
  color,
  centerLine: false,
  lineWeight: THIN_WIDTH_MM * 100,
});

/** Colours of the DXF reference; red for what is cut and blue for what is engraved is common practice at lasers. */
const CUT = layer('CUT', 1);
const SLOT = layer('SLOT', 6);
const ENGRAVE = layer('ENGRAVE', 5);
const REFERENCE = layer('REFERENCE', 8);
const TEXT = layer('TEXT', 3);

/**
 * Layers of an end of the core: the outline the tool must leave, what is cut out within it, what is engraved, what is only looked at, and
 * what the file says about itself.
 */
export const END_LAYERS: readonly DxfLayer[] = [CUT, SLOT, ENGRAVE, REFERENCE, TEXT];

/** Layers of a sheet of ribs. */
export const RIB_LAYERS: readonly DxfLayer[] = [CUT, ENGRAVE, REFERENCE, TEXT];
