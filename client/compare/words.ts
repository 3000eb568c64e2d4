import { formatLength, formatPercent, type Units } from '#client/app/units.ts';
import { type OfferedAlignment } from './choice.ts';
import { type Compared } from './comparison.ts';

export const ALIGNMENT_NAMES: Readonly<Record<OfferedAlignment, string>> = {
  chord: 'Chord',
  'leading-edge': 'Leading edge',
  'quarter-chord': 'Quarter chord',
};

/** "Heron outer panel v3". */
export function nameOf({ version }: Pick<Compared, 'version'>): string {
  return `${version.sectionName} v${version.number}`;
}

/** A signed text: a plus before what is larger than nothing as shown. */
export function signed(text: string): string {
  return text.startsWith('-') || !/[1-9]/.test(text) ? text : `+${text}`;
}

/** Below this a deviation is rounding of the calculation; fractions of chord. */
const NOTHING = 1e-9;

/** Where a version lies furthest from the reference: "+0.42 mm (outside) on the upper surface at 31 % of chord". */
export function largestWords({ deviation }: Compared, chordMm: number, units: Units): string {
  if (!deviation) return 'the reference';
  const { largest } = deviation;
  if (Math.abs(largest.deviation) < NOTHING) return 'no deviation';
  const length = signed(formatLength(largest.deviation * chordMm, units, 3));
  const side = largest.deviation > 0 ? 'outside' : 'inside';
  return `${length} (${side}) ${placeWords(largest.surface, largest.station)}`;
}

function placeWords(surface: 'upper' | 'lower', station: number): string {
  if (station < 0.0005) return 'at the nose';
  if (station > 0.9995) return `on the ${surface} surface at the trailing edge`;
  return `on the ${surface} surface at ${formatPercent(station, 1)} of chord`;
}

/** How deviations are drawn, for the sheet. */
export function magnificationWords(magnification: number): string {
  return `Deviations from the reference ×${magnification}, + is outside.`;
}
