import { readCoordinates } from './coordinates.ts';
import { readDxfOutline } from './dxf-outline.ts';
import { type ImportedContour } from './imported.ts';

/**
 * Reads a section from a file of either kind: a DXF drawing by its first lines or the ending of its name, else a list of coordinates.
 * @throws ImportRefusal when the file is neither, with its code, a sentence for people, and the line at fault
 */
export function readOutline(bytes: Uint8Array, fileName: string): ImportedContour {
  return isDrawing(bytes, fileName) ? readDxfOutline(bytes) : readCoordinates(bytes, fileName);
}

const LOOKED_AT = 64;

/** A DXF drawing begins with the pair 0, SECTION, or with comments, pairs with the code 999. */
function isDrawing(bytes: Uint8Array, fileName: string): boolean {
  if (fileName.toLowerCase().endsWith('.dxf')) return true;
  const start = String.fromCharCode(...bytes.subarray(0, LOOKED_AT)).trimStart();
  return /^(0\s*[\r\n]\s*SECTION\b|999[ \t]*[\r\n]+[^\d\s])/.test(start);
}
