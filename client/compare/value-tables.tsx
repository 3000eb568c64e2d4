import { useState } from 'react';
import { type Units } from '#client/app/units.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { Button } from '#client/ui/button.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { type Compared } from './comparison.ts';
import { measureRows, parameterRows, type Row, tabSeparated } from './differences.ts';
import { largestWords, nameOf } from './words.ts';

interface ValueTablesProps {
  readonly compared: readonly Compared[];
  readonly chordMm: number;
  readonly units: Units;
}

/** What each version is and measures, beside the reference. */
export function ValueTables({ compared, chordMm, units }: ValueTablesProps) {
  const measures = measureRows(compared, chordMm, units);
  const parameters = parameterRows(compared);
  return (
    <section aria-labelledby="compare-values" className="print:hidden">
      <div className="mb-2 flex flex-wrap items-center justify-between gap-2">
        <h2 id="compare-values" className="font-semibold">
          Side by side
        </h2>
        <CopyButton text={() => tabSeparated(compared, [...measures, ...(parameters ?? [])])} />
      </div>
      <div
        role="region"
        aria-label="Values side by side"
        tabIndex={0}
        className="overflow-x-auto border border-rule bg-sheet"
      >
        <table className="border-collapse text-xs">
          <Head compared={compared} chordMm={chordMm} units={units} />
          <Rows title="Measured on the contour" rows={measures} compared={compared} />
          {parameters && <Rows title="Parameters" rows={parameters} compared={compared} />}
        </table>
      </div>
      {!parameters && (
        <p className="mt-2 text-graphite">
          The shapes are of different kinds: there are no parameters to put beside each other.
        </p>
      )}
    </section>
  );
}

const rowHead = 'sticky left-0 bg-sheet px-2 py-1 text-left font-normal text-graphite align-top min-w-28';

function Head({ compared, chordMm, units }: ValueTablesProps) {
  return (
    <thead>
      <tr>
        <td className={rowHead} />
        {compared.map((one) => (
          <th key={one.tag} scope="col" className="w-48 min-w-40 px-2 py-2 text-right align-top font-normal">
            <span className="block font-extrabold">
              {one.tag} {nameOf(one)}
            </span>
            <StatusMark status={one.version.status} />
            <span className="block text-graphite">
              {one.version.author.name}, <Moment at={one.version.createdAt} />
            </span>
            <span className="block text-graphite">{one.version.description}</span>
            <span className="block">{largestWords(one, chordMm, units)}</span>
          </th>
        ))}
      </tr>
    </thead>
  );
}

interface RowsProps {
  readonly title: string;
  readonly rows: readonly Row[];
  readonly compared: readonly Compared[];
}

function Rows({ title, rows, compared }: RowsProps) {
  return (
    <tbody>
      <tr className="border-t border-rule">
        <th scope="rowgroup" colSpan={compared.length + 1} className="px-2 pt-2 pb-1 text-left font-semibold">
          {title}
        </th>
      </tr>
      {rows.map(({ label, cells }, index) => (
        <tr key={`${label} ${index}`} className="border-t border-hair">
          <th scope="row" className={rowHead}>
            {label}
          </th>
          {cells.map(({ value, difference }, column) => (
            <td key={compared[column]?.tag} className="px-2 py-1 text-right align-top">
              <span className="block font-semibold whitespace-nowrap">{value}</span>
              {difference !== null && (
                <span className="block whitespace-nowrap text-graphite">{difference}</span>
              )}
            </td>
          ))}
        </tr>
      ))}
    </tbody>
  );
}

/** Copies the tables; says beside itself what came of it. */
function CopyButton({ text }: { readonly text: () => string }) {
  const announce = useAnnounce();
  const [said, setSaid] = useState('');
  const copy = async () => {
    let sentence = 'Copied.';
    try {
      await navigator.clipboard.writeText(text());
    } catch {
      sentence = 'This browser does not let the page copy.';
    }
    setSaid(sentence);
    announce(sentence);
  };
  return (
    <span className="flex flex-wrap items-center gap-2">
      <span className="text-xs text-graphite">{said}</span>
      <Button onClick={() => void copy()}>Copy as text</Button>
    </span>
  );
}
