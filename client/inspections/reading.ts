import { compareReading, type InspectionRow } from '#geometry/cutting/inspection.ts';

/** A caliper entry as typed; empty where nothing was measured yet. */
export type Readings = ReadonlyMap<string, string>;

export function keyOf({ end, station }: Pick<InspectionRow, 'end' | 'station'>): string {
  return `${end} ${String(station)}`;
}

export type Judged =
  | { readonly state: 'empty' }
  | { readonly state: 'unreadable'; readonly message: string }
  | { readonly state: 'within' | 'out'; readonly measuredMm: number; readonly deviationMm: number };

const LARGEST_MM = 500;

/** Reads "11.9", "11,9" or ".5" in the caliper's unit and compares it with nominal. */
export function judge(text: string | undefined, row: InspectionRow, mmPerUnit: number): Judged {
  const typed = (text ?? '').trim().replace(',', '.');
  if (typed === '') return { state: 'empty' };
  const value = /^\d*\.?\d+$|^\d+\.$/.test(typed) ? Number(typed) * mmPerUnit : NaN;
  if (!(value <= LARGEST_MM)) return { state: 'unreadable', message: 'Type what the caliper shows.' };
  const measuredMm = Number(value.toFixed(4));
  const { deviationMm, within } = compareReading(row, measuredMm);
  return { state: within ? 'within' : 'out', measuredMm, deviationMm };
}
