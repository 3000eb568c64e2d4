import { type KeyboardEvent } from 'react';
import { type InspectionRow } from '#geometry/cutting/inspection.ts';
import { formatLength, formatPercent, useUnits } from '#client/app/units.ts';
import { fieldClass } from '#client/ui/field.tsx';
import { deviationText } from './deviation-text.ts';
import { type Judged, keyOf, type Readings } from './reading.ts';
import { Verdict } from './verdict.tsx';

interface ReadingTableProps {
  readonly rows: readonly InspectionRow[];
  readonly judged: readonly Judged[];
  readonly readings: Readings;
  readonly onReading: (row: InspectionRow, text: string) => void;
}

/** Nominal, tolerance and a place for the caliper's reading at each station; Enter and the arrows move between them. */
export function ReadingTable({ rows, judged, readings, onReading }: ReadingTableProps) {
  const units = useUnits();
  return (
    <table className="w-full max-w-[56rem] border-collapse text-base" onKeyDown={moveBetween}>
      <caption className="sr-only">Readings</caption>
      <thead>
        <tr className="border-b border-edge text-left text-sm text-graphite">
          <th className="h-9 pr-3 font-normal">Station</th>
          <th className="pr-3 text-right font-normal">Nominal</th>
          <th className="pr-3 text-right font-normal max-sm:hidden">Tolerance</th>
          <th className="w-36 pr-3 font-normal">Caliper</th>
          <th className="font-normal">Verdict</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row, i) => {
          const reading = judged[i] ?? { state: 'empty' };
          return (
            <tr key={keyOf(row)} className="h-15 border-b border-rule">
              <th scope="row" className="pr-3 text-left font-semibold">
                {row.end} {formatPercent(row.station, 0)}
              </th>
              <td className="pr-3 text-right whitespace-nowrap">{formatLength(row.nominalMm, units)}</td>
              <td className="pr-3 text-right whitespace-nowrap max-sm:hidden">
                ± {formatLength(row.toleranceMm, units)}
              </td>
              <td className="pr-3">
                <input
                  aria-label={`Reading at the ${row.end}, ${formatPercent(row.station, 0)}, in ${units}`}
                  aria-invalid={reading.state === 'unreadable'}
                  inputMode="decimal"
                  autoComplete="off"
                  data-reading=""
                  value={readings.get(keyOf(row)) ?? ''}
                  onChange={(event) => onReading(row, event.target.value)}
                  className={`${fieldClass} h-12 text-right text-lg font-semibold`}
                />
              </td>
              <td>
                <Verdict
                  judged={reading}
                  deviation={'deviationMm' in reading ? deviationText(reading.deviationMm, units) : ''}
                />
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}

/** A caliper with a data key types the reading and Enter: the next field takes the next one. */
function moveBetween(event: KeyboardEvent<HTMLTableElement>): void {
  const step = { Enter: 1, ArrowDown: 1, ArrowUp: -1 }[event.key];
  if (step === undefined || !(event.target instanceof HTMLInputElement)) return;
  const fields = [...event.currentTarget.querySelectorAll<HTMLInputElement>('[data-reading]')];
  const next = fields[fields.indexOf(event.target) + step];
  event.preventDefault();
  next?.focus();
  next?.select();
}
