import { boatTailAngleDegOf } from '#geometry/shapes/cst.ts';
import { noseCircle, scaleOf } from '#client/drawing/section-points.ts';
import { parseQuantity, type Units } from '#client/app/units.ts';
import { type FieldId, withField } from './fields.ts';
import { noticeText } from './notices.ts';
import { type ReadText } from './use-typed-text.ts';
import { type Present } from './present.ts';

/** The value of a typed dimension as it is shown: mm for lengths at the chord in use, degrees for angles. */
export function dimensionValue({ shape, chordMm }: Present, field: FieldId): number {
  if (field === 'chordMm') return chordMm;
  if (field === 'noseRadius') return noseCircle(shape).radius * chordMm;
  if (shape.kind === 'naca4') {
    return field === 'maxCamber' || field === 'maxCamberPosition' || field === 'maxThickness'
      ? shape[field] * chordMm
      : 0;
  }
  if (field === 'trailingEdgeGap') return shape.trailingEdgeGap * scaleOf(shape) * chordMm;
  if (field === 'boatTail-upper' || field === 'boatTail-lower') {
    return boatTailAngleDegOf(shape, field === 'boatTail-upper' ? 'upper' : 'lower');
  }
  return 0;
}

/**
 * Reads what was typed for a dimension of a section, as the value of its field. Refused with the reason when the text
 * is no quantity, the value is out of range, or the section could not be so.
 */
export function readDimension(
  text: string,
  present: Present,
  field: FieldId,
  units: Units,
): ReadText<number> {
  const isAngle = field.startsWith('boatTail');
  const { chordMm } = present;
  const read = parseQuantity(text, { kind: isAngle ? 'angle' : 'length', chordMm, units });
  if (read.error !== undefined) return { error: read.error };
  const value = isAngle || field === 'chordMm' ? read.value : read.value / chordMm;
  const { notice, present: next } = withField(present, field, value);
  if (next !== null) return { value };
  if (notice?.code === 'refused') return { error: notice.reason };
  return { error: notice ? noticeText(notice, chordMm, units) : 'Not applied.' };
}
