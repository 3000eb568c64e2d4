import { Link } from 'react-router';
import { type CutSheet, isStale } from '#server/contracts/cut-sheets.ts';
import { useMay } from '#client/app/session.tsx';
import { formatLength, useUnits } from '#client/app/units.ts';
import { Moment } from '#client/ui/moment.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { StatusGlyph, StatusMark } from '#client/ui/status-mark.tsx';
import { sheetPath, sheetVersionPath } from '../paths.ts';
import { partsText, sourcesText, staleSources } from '../source-words.tsx';
import { SheetMenu } from './sheet-menu.tsx';

interface SheetRowsProps {
  /** Null while the first page is on its way. */
  readonly sheets: readonly CutSheet[] | null;
  /** The rows are of the question before. */
  readonly stale: boolean;
}

/** Each sheet on two lines: what it is and how it stands; what it is made from and how far it is cut. */
export function SheetRows({ sheets, stale }: SheetRowsProps) {
  return (
    <ul
      className={`border-t border-rule ${stale ? 'opacity-60' : ''}`}
      aria-label="Cut sheets"
      aria-busy={stale || sheets === null}
    >
      {sheets === null
        ? Array.from({ length: 6 }, (_, row) => (
            <li key={row} className="flex h-18 items-center border-b border-rule">
              <Skeleton className="h-8 w-full" />
            </li>
          ))
        : sheets.map((sheet) => <Row key={sheet.id} sheet={sheet} />)}
    </ul>
  );
}

function Row({ sheet }: { readonly sheet: CutSheet }) {
  const mayWrite = useMay('cut-sheets.write');
  const { latest } = sheet;
  const to = mayWrite ? sheetPath(sheet.id) : sheetVersionPath(sheet.id, latest.number);
  return (
    <li className="relative grid min-h-18 grid-cols-[minmax(0,1fr)_auto] items-center gap-x-4 gap-y-1 border-b border-rule py-2 focus-within:bg-sheet hover:bg-sheet lg:grid-cols-[minmax(0,3fr)_minmax(0,4fr)_minmax(0,3fr)_11rem_3rem]">
      <div className="min-w-0">
        <Link to={to} className="block truncate text-base font-semibold after:absolute after:inset-0">
          {sheet.name}
        </Link>
        <p className="flex flex-wrap items-center gap-x-3 text-xs">
          <span>v{latest.number}</span>
          <Status sheet={sheet} />
          <Findings latest={latest} />
        </p>
      </div>
      <div className="min-w-0 text-xs max-lg:col-span-2 max-lg:row-start-2">
        <p className="truncate">
          <Panel latest={latest} />
        </p>
        <p className="truncate text-graphite">
          {sourcesText(latest)}
          {sheet.purpose !== '' && <> · {sheet.purpose}</>}
        </p>
        {isStale(latest) && <Stale latest={latest} />}
      </div>
      <div className="min-w-0 text-xs max-lg:col-span-2">
        <p className="truncate">
          {partsText(latest.parts)}
          {latest.machine !== null && <span className="text-graphite"> on {latest.machine.name}</span>}
        </p>
        <Progress sheet={sheet} />
      </div>
      <p className="text-xs text-graphite max-lg:hidden">
        <Moment at={sheet.updatedAt} className="relative block truncate" />
        <span className="block truncate">{sheet.updatedBy.name}</span>
      </p>
      <div className="relative justify-self-end max-lg:col-start-2 max-lg:row-start-1">
        {mayWrite && <SheetMenu sheet={sheet} />}
      </div>
    </li>
  );
}

function Status({ sheet }: { readonly sheet: CutSheet }) {
  if (sheet.archived) return <StatusMark status="archived" />;
  const { latest, releasedNumber } = sheet;
  return (
    <>
      <StatusMark status={latest.status} />
      {releasedNumber !== null && releasedNumber !== latest.number && (
        <span className="inline-flex items-center gap-1.5 text-spruce">
          <StatusGlyph status="released" />v{releasedNumber} released
        </span>
      )}
    </>
  );
}

function Findings({ latest }: { readonly latest: CutSheet['latest'] }) {
  const { errors, warnings } = latest;
  const counted = (count: number, word: string) => `${String(count)} ${word}${count === 1 ? '' : 's'}`;
  return (
    <>
      {errors > 0 && <span className="text-brick">{counted(errors, 'error')}</span>}
      {warnings > 0 && <span className="text-amber">{counted(warnings, 'warning')}</span>}
    </>
  );
}

function Panel({ latest }: { readonly latest: CutSheet['latest'] }) {
  const units = useUnits();
  const length = (mm: number) => formatLength(mm, units, 1);
  return (
    <>
      {length(latest.rootChordMm)} → {length(latest.tipChordMm)}, span {length(latest.spanMm)},{' '}
      {latest.quantity} wanted
    </>
  );
}

function Stale({ latest }: { readonly latest: CutSheet['latest'] }) {
  return (
    <p className="text-amber">
      {staleSources(latest)
        .map(({ sectionName, versionNumber, status }) =>
          status === 'draft'
            ? `${sectionName} v${String(versionNumber)} is not released`
            : `${sectionName} v${String(versionNumber)} is ${status}`,
        )
        .join('; ')}
    </p>
  );
}

function Progress({ sheet }: { readonly sheet: CutSheet }) {
  if (sheet.releasedNumber === null) return <p className="text-graphite">not at the machines</p>;
  return (
    <p className="flex flex-wrap gap-x-3 text-graphite">
      {sheet.progress.map(({ part, wanted, done, scrapped }) => (
        <span key={part} className="whitespace-nowrap">
          {part} {done} of {wanted}
          {scrapped > 0 && `, ${String(scrapped)} scrapped`}
        </span>
      ))}
    </p>
  );
}
