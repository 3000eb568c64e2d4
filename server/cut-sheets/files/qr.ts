import { create } from 'qrcode';

/**
 * The modules of a QR code (ISO/IEC 18004) row by row, true where dark, at recovery level M: 15 % of the code may be lost to dirt and folds.
 * @throws Error when the text is longer than a code holds (2331 bytes)
 */
export function qrModules(text: string): boolean[][] {
  const { modules } = create(text, { errorCorrectionLevel: 'M' });
  const places = Array.from({ length: modules.size }, (_, i) => i);
  return places.map((row) => places.map((column) => modules.get(row, column) === 1));
}
