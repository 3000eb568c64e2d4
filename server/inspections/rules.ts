import { buildCore } from '#geometry/cutting/core.ts';
import { compareReading, type InspectionRow, inspectionRows } from '#geometry/cutting/inspection.ts';
import { buildPanel } from '#geometry/cutting/panel.ts';
import { type End, type Plan } from '#geometry/cutting/plan.ts';
import { type Inspection } from '#server/contracts/cutting-list.ts';
import { Refusal, refuseField } from '#server/refusal.ts';

/** One caliper reading as it came in. */
interface Reading {
  readonly end: End;
  readonly station: number;
  readonly measuredMm: number;
}
type Measurement = Inspection['measurements'][number];

/** Stations are fractions with a few decimals; this only bridges their way through text. */
const SAME_STATION = 1e-9;

/** What a caliper must show on parts of a pinned plan; none when the plan leaves nothing to measure. */
export function nominalRows(plan: Plan): InspectionRow[] {
  const { core } = buildCore(plan, buildPanel(plan));
  return core ? inspectionRows(plan, core) : [];
}

/**
 * Sets readings beside what the plan wants at their stations.
 * @throws Refusal `invalid` naming every reading at a station that the plan does not have, or that stands twice
 */
export function compareReadings(rows: readonly InspectionRow[], readings: readonly Reading[]): Measurement[] {
  const errors: { path: string; message: string }[] = [];
  const seen = new Set<InspectionRow>();
  const measurements = readings.flatMap(({ end, station, measuredMm }, i) => {
    const refuse = (message: string) => {
      errors.push({ path: `measurements.${i}.station`, message });
      return [];
    };
    const row = rows.find((one) => one.end === end && Math.abs(one.station - station) < SAME_STATION);
    const place = `${Number((station * 100).toFixed(1))} % of the ${end} chord`;
    if (!row) return refuse(`The plan has nothing to measure at ${place}.`);
    if (seen.has(row)) return refuse(`The reading at ${place} stands twice.`);
    seen.add(row);
    return [{ ...row, measuredMm, ...compareReading(row, measuredMm) }];
  });
  if (errors.length > 0) throw new Refusal('invalid', { errors });
  return measurements;
}

/** Whether all readings are within their tolerances. */
export function isWithin(measurements: readonly Pick<Measurement, 'within'>[]): boolean {
  return measurements.every(({ within }) => within);
}

/**
 * Whether an inspection waits for an answer.
 * @throws Refusal `status-conflict` for a part within tolerance, and one that was answered already
 */
export function checkAnswerable({ within, answer }: Pick<Inspection, 'within' | 'answer'>): void {
  if (within) {
    throw new Refusal('status-conflict', {
      detail: 'This part is within tolerance: there is nothing to decide.',
    });
  }
  if (answer) {
    throw new Refusal('status-conflict', {
      detail: `${answer.by.name} ${answer.decision} this part already.`,
    });
  }
}

/** Photographs that an inspection holds. */
export const MOST_PHOTOS = 8;

/** @throws Refusal naming `file` when the inspection has as many photographs as it holds */
export function checkPhotoRoom(count: number): void {
  if (count >= MOST_PHOTOS) {
    throw refuseField('file', `An inspection holds at most ${MOST_PHOTOS} photographs.`);
  }
}
