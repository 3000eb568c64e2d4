import { formatLength, type Units } from '#client/app/units.ts';

/** A deviation with its sign: "+0.05 mm", "−0.80 mm". */
export function deviationText(mm: number, units: Units): string {
  return `${mm < 0 ? '−' : '+'}${formatLength(Math.abs(mm), units)}`;
}
