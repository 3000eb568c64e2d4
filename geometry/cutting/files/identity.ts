/** Which version of which section stands at an end of the panel. */
export interface EndIdentity {
  /** The section's name as its people typed it: free text. */
  readonly sectionName: string;
  readonly versionNumber: number;
  /** SHA-256 of the version's canonical shape, in hexadecimal. */
  readonly checksum: string;
  /** What the shape calls itself, for instance `NACA 2412`. */
  readonly designation: string;
}

/** What every file of a cut sheet says about where it comes from. Names are free text. */
export interface SheetIdentity {
  readonly sheetName: string;
  readonly versionNumber: number;
  /** `draft`, `released`, `superseded` or `withdrawn`. */
  readonly status: string;
  /** SHA-256 of the sheet's version, in hexadecimal. */
  readonly checksum: string;
  /** Short enough to be typed: by it a printed sheet is looked up. */
  readonly shortCode: string;
  /** The version's address, as the QR code carries it. */
  readonly address: string;
  readonly root: EndIdentity;
  readonly tip: EndIdentity;
  readonly author: string;
  /** ISO 8601. Files carry this date and no other, so the same version gives the same bytes. */
  readonly createdAt: string;
  /** Null before the release, as is its time. */
  readonly releasedBy: string | null;
  readonly releasedAt: string | null;
  /** Null where none cuts, or nothing is cut of it. */
  readonly machineName: string | null;
  readonly materialName: string | null;
  readonly ribMaterialName: string | null;
}
