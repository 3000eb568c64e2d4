import { scaleLinear } from 'd3-scale';
import {
  type FlightCondition,
  type FlightFigures,
  reynoldsTable,
  type SpeedRange,
} from '#geometry/flow/flight-condition.ts';
import { formatLength, formatNumber, MM_PER_INCH, type Units, useUnits } from '#client/app/units.ts';

interface ReynoldsTableProps {
  condition: FlightCondition;
  figures: FlightFigures;
  range: SpeedRange;
}

/** Round values from a little below the smaller to a little above the larger of two lengths, in the person's unit. */
function chordsAround(condition: FlightCondition, meanChordMm: number, units: Units): number[] {
  const unitMm = units === 'mm' ? 1 : MM_PER_INCH;
  const chords = [condition.rootChordMm, condition.tipChordMm, meanChordMm];
  const [low, high] = [Math.min(...chords) / unitMm, Math.max(...chords) / unitMm];
  const ticks = scaleLinear([0.75 * low, 1.25 * high], [0, 1]).ticks(6);
  return ticks.filter((chord) => chord > 0).map((chord) => chord * unitMm);
}

/** Reynolds numbers over round speeds within the range, the condition's own included, and round chords about the wing's own. */
export function ReynoldsTable({ condition, figures, range }: ReynoldsTableProps) {
  const units = useUnits();
  const ends = [Math.min(range.stallMS, figures.speedMS), Math.max(range.fastMS, figures.speedMS)];
  const speeds = scaleLinear(ends, [0, 1]).ticks(6);
  const chords = chordsAround(condition, figures.meanChordMm, units);
  const rows = reynoldsTable(figures.air, speeds, chords);
  const decimals = speeds.some((speed) => !Number.isInteger(speed)) ? 1 : 0;
  return (
    <section>
      <h3 className="mb-1 border-b border-rule pb-1 text-xs font-semibold text-graphite uppercase">
        Reynolds number in thousands
      </h3>
      <div
        role="region"
        tabIndex={0}
        aria-label="Reynolds number over speed and chord"
        className="relative overflow-x-auto"
      >
        <table className="w-full border-collapse text-xs">
          <caption className="sr-only">Reynolds number in thousands, over chord and speed</caption>
          <thead>
            <tr className="border-b border-edge text-graphite">
              <th scope="col" className="h-7 pr-2 text-left font-normal whitespace-nowrap">
                Chord
              </th>
              {speeds.map((speed) => (
                <th key={speed} scope="col" className="px-1.5 text-right font-normal whitespace-nowrap">
                  {formatNumber(speed, decimals)} m/s
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <tr key={chords[index]} className="border-b border-rule">
                <th scope="row" className="h-7 pr-2 text-left font-normal whitespace-nowrap">
                  {formatLength(chords[index] ?? 0, units, 0)}
                </th>
                {row.map((reynolds, column) => (
                  <td key={speeds[column]} className="px-1.5 text-right">
                    {formatNumber(reynolds / 1000, 0)}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}
