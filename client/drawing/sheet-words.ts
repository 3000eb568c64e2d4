import { formatLength, type Units } from '#client/app/units.ts';
import { type Exaggeration, scaleText, type SheetTransform } from './sheet-view.ts';

/** The scale for the title block: along the chord, and that thickness is drawn larger where it is. */
export function scaleWords(transform: SheetTransform, chordMm: number, exaggeration: Exaggeration): string {
  const scale = scaleText(transform.chordPixels * transform.scale, chordMm);
  return exaggeration === 1 ? scale : `${scale}, y ×${exaggeration}`;
}

export interface RemarkInput {
  readonly units: Units;
  readonly exaggeration: Exaggeration;
  /** Grid spacing in mm, or null without a grid. */
  readonly gridMm: number | null;
  readonly comb: boolean;
  readonly ghost: number | null;
}

/** What the sheet says about itself: short sentences, those that say how the drawing differs from the section first. */
export function sheetRemarks({ units, exaggeration, gridMm, comb, ghost }: RemarkInput): string[] {
  const remarks = [`Dimensions in ${units === 'mm' ? 'mm' : 'inches'}.`];
  if (exaggeration > 1) remarks.push(`Thickness drawn ${exaggeration} times too large.`);
  if (ghost !== null) remarks.push(`Short dashes: version ${ghost}.`);
  if (gridMm !== null) remarks.push(`Grid ${gridLength(gridMm, units)}.`);
  if (comb) remarks.push('Comb: square root of the curvature.');
  return remarks;
}

function gridLength(mm: number, units: Units): string {
  const [value = '', unit = ''] = formatLength(mm, units, 4).split(' ');
  return `${Number(value)} ${unit}`;
}
