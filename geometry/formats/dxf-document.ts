import type { Extents } from '../contour/contour.ts';
import type { Point } from '../point.ts';
import type { Chain, DrawingText } from './drawing.ts';

/** A layer of a DXF drawing; its name and looks are ours, not a person's. */
export interface DxfLayer {
  /** Capital letters. */
  readonly name: string;
  /** Colour number of the DXF reference: 7 black or white, 1 red, 5 blue, 3 green. */
  readonly color: number;
  /** Long-dashed dotted instead of continuous. */
  readonly centerLine: boolean;
  /** In hundredths of a millimetre, as group 370 wants it. */
  readonly lineWeight: number;
}

/** What is drawn, each on the layer it names. Lengths in mm. */
export type DxfEntity =
  | {
      readonly kind: 'polyline';
      readonly layer: string;
      readonly chain: Chain;
      readonly closed: boolean;
      /** Vertices that rounding makes coincide stay, so that vertex k remains vertex k; absent: they become one. */
      readonly keepRepeats?: boolean;
    }
  | { readonly kind: 'line'; readonly layer: string; readonly from: Point; readonly to: Point }
  | { readonly kind: 'circle'; readonly layer: string; readonly center: Point; readonly radius: number }
  | { readonly kind: 'text'; readonly layer: string; readonly text: DrawingText };

/** All that a DXF file of ours holds, in the order in which it is written. */
export interface DxfDocument {
  /** Free text, one comment for each line, before the first section. */
  readonly comments: readonly string[];
  /** Every layer that an entity names. */
  readonly layers: readonly DxfLayer[];
  readonly entities: readonly DxfEntity[];
  readonly extents: Extents;
}
