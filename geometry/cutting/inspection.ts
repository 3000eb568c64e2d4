import { ordinateOn, sidesOf, stationOn } from '../contour/chord-line.ts';
import { thicknessAt } from '../contour/thickness.ts';
import { type Polyline, at, polylineOf } from './arrays.ts';
import { type Core } from './core.ts';
import { verticalCut } from './feature-ends.ts';
import { type PlacedFeature } from './features.ts';
import { type Finding, note, stationText, warning } from './findings.ts';
import { type PlacedSection } from './placing.ts';
import { ENDS, type End, type Plan } from './plan.ts';

/** One place to measure with a caliper. */
export interface InspectionRow {
  readonly end: End;
  /** Along the chord line from the nose, 0 … 1. */
  readonly station: number;
  /** Wanted thickness square to the chord line, mm. */
  readonly nominalMm: number;
  /** May differ by as much either way, mm. */
  readonly toleranceMm: number;
}

/** A caliper reading beside what is wanted. */
export interface Compared {
  /** Measured less nominal, mm. */
  readonly deviationMm: number;
  readonly within: boolean;
}

/** Decimals of a mm that a deviation is compared in: far below what a caliper shows, far above binary rounding. */
const DEVIATION_DECIMALS = 4;

/** Compares a reading with its row; a deviation of exactly the tolerance is within it. */
export function compareReading(row: InspectionRow, measuredMm: number): Compared {
  const deviationMm = Number((measuredMm - row.nominalMm).toFixed(DEVIATION_DECIMALS));
  return { deviationMm, within: Math.abs(deviationMm) <= row.toleranceMm };
}

/** Foam thinner than this is none, mm. */
const LEAST_MM = 1e-6;

/**
 * Nominal thicknesses at root and tip, square to the chord line of the section: of the foam as it is cut, without the skins, or of the true
 * contour, which is the part with its skins on. Features are not taken off. Stations without foam are left out;
 * `inspectionFindings` names them.
 */
export function inspectionRows(plan: Plan, core: Core): InspectionRow[] {
  const { stations, toleranceMm } = plan.inspection;
  return ENDS.flatMap((end) => {
    const thickness = thicknessOf(plan, core, end);
    return stations.flatMap((station) => {
      const nominalMm = thickness(station);
      return nominalMm > LEAST_MM ? [{ end, station, nominalMm, toleranceMm }] : [];
    });
  });
}

/** Thickness in mm at a station of one end; 0 where nothing is left. */
function thicknessOf(plan: Plan, core: Core, end: End): (station: number) => number {
  const section = core.panel[end];
  if (plan.inspection.measured === 'with-skin')
    return (station) => thicknessAt(section.outline, station) * section.chordMm;
  const line = onChordLine(section, core[end].core);
  return (station) => {
    const cut = verticalCut(line, station);
    return cut ? (cut.high - cut.low) * section.chordMm : 0;
  };
}

/** A line of the panel as stations and ordinates of an end's chord line. */
function onChordLine(section: PlacedSection, { x, y }: Polyline): Polyline {
  const { line } = sidesOf(section.outline);
  return polylineOf(
    Array.from(x, (value, i) => {
      const point = section.toSheet({ x: value, y: at(y, i) });
      return { x: stationOn(line, point), y: ordinateOn(line, point) };
    }),
  );
}

/** Stations at which nothing is left to measure, and those at which a caliper falls into a feature. */
export function inspectionFindings(plan: Plan, core: Core, features: readonly PlacedFeature[]): Finding[] {
  const rows = inspectionRows(plan, core);
  return ENDS.flatMap((end) =>
    plan.inspection.stations.flatMap((station, i): Finding[] => {
      const path = `inspection.stations.${i}`;
      const place = { end, station };
      if (!rows.some((row) => row.end === end && row.station === station)) {
        const message = `At ${stationText(station)} of the ${end} chord no foam is left to measure.`;
        return [warning('inspection-without-foam', path, message, place)];
      }
      const met = features.find((feature) => meets(core, feature, end, station));
      if (!met) return [];
      const message = `At ${stationText(station)} of the ${end} chord the caliper meets feature ${met.index + 1}.`;
      return [note('inspection-at-feature', path, message, place)];
    }),
  );
}

/** Whether a feature opens a surface at a station of an end. */
function meets(core: Core, feature: PlacedFeature, end: End, station: number): boolean {
  const { line } = sidesOf(core.panel[end].outline);
  return feature[end].mouths.some(({ edges }) => {
    const stations = edges.map((edge) => stationOn(line, core.panel[end].toSheet(edge)));
    return station >= Math.min(...stations) && station <= Math.max(...stations);
  });
}
