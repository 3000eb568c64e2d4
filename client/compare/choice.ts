import { type Alignment } from '#geometry/contour/deviation.ts';
import { LENGTH_LIMITS } from '#geometry/formats/options.ts';
import { idSchema } from '#server/contracts/common.ts';

/** One version of one section. */
export interface VersionRef {
  readonly sectionId: string;
  readonly number: number;
}

/** The ways of laying outlines on each other that the page offers. */
export const OFFERED_ALIGNMENTS = ['chord', 'leading-edge', 'quarter-chord'] as const satisfies Alignment[];
export type OfferedAlignment = (typeof OFFERED_ALIGNMENTS)[number];

/** How many times larger than the outlines their deviations may be drawn. */
export const MAGNIFICATIONS = [0.2, 0.5, 1, 2, 5, 10, 20, 50, 100, 200, 500, 1000] as const;

export const MOST_VERSIONS = 6;
const FIRST_CHORD_MM = 220;

/** Everything that the page shows; the address carries it whole. */
export interface Choice {
  /** The first is the reference. */
  readonly versions: readonly VersionRef[];
  readonly alignment: OfferedAlignment;
  readonly chordMm: number;
  /** One of `MAGNIFICATIONS`; null: the largest that fits. */
  readonly magnification: number | null;
}

/** Reads the choice from the address; `dropped` says in sentences what could not be taken. */
export function choiceOf(search: URLSearchParams): { choice: Choice; dropped: string[] } {
  const dropped: string[] = [];
  const read = <Value>(name: string, usual: Value, parse: (text: string) => Value | undefined): Value => {
    const text = search.get(name);
    if (text === null) return usual;
    const value = parse(text);
    if (value === undefined) dropped.push(`“${shortened(text)}” is no value for ${name}: left out.`);
    return value ?? usual;
  };
  const alignment = read('align', 'chord', (text) => OFFERED_ALIGNMENTS.find((offered) => offered === text));
  const chordMm = read('chord', FIRST_CHORD_MM, (text) => {
    const { min, max } = LENGTH_LIMITS.chordMm;
    const value = Number(text);
    return text.trim() !== '' && value >= min && value <= max ? value : undefined;
  });
  const magnification = read<number | null>('scale', null, (text) =>
    MAGNIFICATIONS.find((offered) => String(offered) === text),
  );
  return { choice: { versions: versionsOf(search, dropped), alignment, chordMm, magnification }, dropped };
}

function versionsOf(search: URLSearchParams, dropped: string[]): VersionRef[] {
  const versions: VersionRef[] = [];
  for (const part of (search.get('v') ?? '').split(',')) {
    if (part.trim() === '') continue;
    const ref = refOf(part.trim());
    if (!ref) dropped.push(`“${shortened(part)}” names no version: left out.`);
    else if (includes(versions, ref)) dropped.push(`Version ${ref.number} was named twice: shown once.`);
    else if (versions.length === MOST_VERSIONS)
      dropped.push(`More than ${MOST_VERSIONS} versions: “${shortened(part)}” is left out.`);
    else versions.push(ref);
  }
  return versions;
}

function refOf(part: string): VersionRef | null {
  const [, sectionId, digits] = /^([0-9a-fA-F-]+)\.([1-9]\d{0,8})$/.exec(part) ?? [];
  const id = idSchema.safeParse(sectionId);
  return id.success ? { sectionId: id.data, number: Number(digits) } : null;
}

function shortened(text: string): string {
  return text.length > 24 ? `${text.slice(0, 23)}…` : text;
}

export function keyOf({ sectionId, number }: VersionRef): string {
  return `${sectionId}.${number}`;
}

export function includes(versions: readonly VersionRef[], ref: VersionRef): boolean {
  return versions.some((one) => keyOf(one) === keyOf(ref));
}

/** The query of the address for a choice; what is as usual is left out. */
export function searchOf({ versions, alignment, chordMm, magnification }: Choice): string {
  const parts = [
    ...(versions.length === 0 ? [] : [`v=${versions.map(keyOf).join(',')}`]),
    ...(alignment === 'chord' ? [] : [`align=${alignment}`]),
    ...(chordMm === FIRST_CHORD_MM ? [] : [`chord=${chordMm}`]),
    ...(magnification === null ? [] : [`scale=${magnification}`]),
  ];
  return parts.join('&');
}

/** The address of a comparison at a chord; the first version is the reference. */
export function comparePath(versions: readonly VersionRef[], chordMm: number = FIRST_CHORD_MM): string {
  return `/compare?${searchOf({ versions, alignment: 'chord', chordMm, magnification: null })}`;
}

/** The version and the reference change places. */
export function withReference(versions: readonly VersionRef[], ref: VersionRef): VersionRef[] {
  const [first] = versions;
  if (!first) return [];
  return versions.map((one, index) => (index === 0 ? ref : keyOf(one) === keyOf(ref) ? first : one));
}
