import { STRIP_WIDTHS_MM } from '#geometry/cutting/test-strip.ts';
import { type MaterialSettings } from './shop.ts';

/** Foam that stays above the first and below the last cut, as the strip's plan keeps it. */
const KEPT_MM = 15;

/** Widths in mm that the test strip of a material is commanded to: what is measured on it is set beside them. None when the foam is too low. */
export function stripWidthsOf(material: MaterialSettings): readonly number[] {
  if (material.kind === 'sheet') return STRIP_WIDTHS_MM;
  let left = material.blockHeightMm - KEPT_MM;
  return STRIP_WIDTHS_MM.filter((width) => {
    left -= width;
    return left >= 0;
  });
}
