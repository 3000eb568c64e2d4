import { singleLine } from './text.ts';

/** What says which version of which section a file was made from. */
export interface FileIdentity {
  /** The section's name as its people typed it: free text. */
  readonly sectionName: string;
  readonly versionNumber: number;
  /** `draft`, `released`, `superseded` or `withdrawn`. */
  readonly status: string;
  /** What the shape calls itself, for instance `NACA 2412` or `CST order 6/6`. */
  readonly designation: string;
  /** SHA-256 of the canonical shape, in hexadecimal. */
  readonly checksum: string;
}

/** How the coordinates in a file were made. */
interface FileScale {
  /** Chord in mm; null when the coordinates are fractions of chord. */
  readonly chordMm: number | null;
  /** What the spacing of the points obeys, for instance `tolerance 0.01 mm` or `100 points per surface`. */
  readonly spacing: string;
}

/** Digits of the checksum that are printed: 48 bits tell the versions of a workshop apart and can still be read aloud. */
export const CHECKSUM_DIGITS = 12;

/** The section's name and version, on one line. */
export function titleOf(identity: FileIdentity): string {
  return `${singleLine(identity.sectionName) || 'Section'} v${identity.versionNumber}`;
}

/**
 * What every file says about itself: name, version and status, designation, chord and unit, spacing, and the first 12 digits
 * of the version's checksum. Four short pieces, each on one line, neither escaped nor cut.
 */
export function headerLines(identity: FileIdentity, scale: FileScale): readonly string[] {
  const chord = scale.chordMm === null ? 'unit chord' : `chord ${scale.chordMm} mm, unit mm`;
  return [
    `${titleOf(identity)}, ${singleLine(identity.status)}`,
    singleLine(identity.designation),
    `${chord}, ${scale.spacing}`,
    `checksum ${singleLine(identity.checksum).slice(0, CHECKSUM_DIGITS)}`,
  ];
}
