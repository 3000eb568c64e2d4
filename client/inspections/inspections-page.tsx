import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';
import { type Inspection, type InspectionStatistics } from '#server/contracts/cutting-list.ts';
import { inspectionsQuery, inspectionStatisticsQuery } from '#client/api/cutting-list.ts';
import { formatLength, useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { deviationText } from './deviation-text.ts';
import { VerdictGlyph } from './verdict.tsx';

const OUTCOMES = [
  { value: '', label: 'All parts' },
  { value: 'within', label: 'Within tolerance' },
  { value: 'out', label: 'Out of tolerance' },
  { value: 'unanswered', label: 'Out, not decided yet' },
] as const;
type Outcome = 'within' | 'out' | 'unanswered';

/** What was measured, newest first, and how each section comes out on each machine. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const outcome = OUTCOMES.find(({ value }) => value === search.get('outcome'))?.value ?? '';
  return (
    <div data-page="flowing" className="mx-auto flex w-full max-w-[80rem] flex-col gap-6 px-4 pt-4 pb-12">
      <title>Inspections · Ribwright</title>
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
        <h1 className="text-xl font-extrabold">Inspections</h1>
        <SelectField
          label="Outcome"
          hideLabel
          options={OUTCOMES}
          value={outcome}
          onChange={(event) =>
            setSearch(event.target.value === '' ? {} : { outcome: event.target.value }, { replace: true })
          }
          className="w-60"
        />
      </div>
      <Inspections outcome={outcome === '' ? undefined : outcome} />
      <Statistics />
    </div>
  );
}

function Inspections({ outcome }: { readonly outcome: Outcome | undefined }) {
  const list = useInfiniteQuery(inspectionsQuery(outcome === undefined ? {} : { outcome }));
  const retry = () => void list.refetch();
  if (list.isPending) return <Skeleton className="h-60 w-full" />;
  if (!list.data) {
    return <ErrorState title="The inspections could not be loaded." error={list.error} retry={retry} />;
  }
  const inspections = list.data.pages.flatMap((page) => page.items);
  if (inspections.length === 0) {
    return (
      <EmptyState title={outcome === undefined ? 'Nothing was measured yet.' : 'No part is of this kind.'}>
        Measure a part from the cutting list.
      </EmptyState>
    );
  }
  return (
    <>
      <ul className="border-t border-rule" aria-label="Inspections">
        {inspections.map((inspection) => (
          <Row key={inspection.id} inspection={inspection} />
        ))}
      </ul>
      {list.hasNextPage && (
        <Button
          busy={list.isFetchingNextPage}
          onClick={() => void list.fetchNextPage()}
          className="self-start"
        >
          Show more
        </Button>
      )}
    </>
  );
}

function Row({ inspection }: { readonly inspection: Inspection }) {
  const { within, measurements, answer } = inspection;
  const out = measurements.filter((one) => !one.within).length;
  return (
    <li className="relative flex min-h-14 flex-wrap items-center gap-x-4 gap-y-1 border-b border-rule py-2 focus-within:bg-sheet hover:bg-sheet">
      <span className={`inline-flex w-44 items-center gap-2 ${within ? 'text-spruce' : 'text-brick'}`}>
        <VerdictGlyph within={within} />
        {within ? 'within' : `${String(out)} out of tolerance`}
      </span>
      <Link
        to={`/inspections/${inspection.id}`}
        className="min-w-0 flex-1 basis-60 font-semibold after:absolute after:inset-0"
      >
        {inspection.sheetName} v{inspection.versionNumber}
        {inspection.mark !== '' && `, ${inspection.mark}`}
      </Link>
      {answer !== null && <span className="text-graphite">{answer.decision}</span>}
      <span className="text-graphite">
        {inspection.person.name}, <Moment at={inspection.at} />
      </span>
    </li>
  );
}

function Statistics() {
  const statistics = useQuery(inspectionStatisticsQuery());
  if (!statistics.data || statistics.data.length === 0) return null;
  return (
    <section
      aria-label="Deviation by section and machine"
      tabIndex={0}
      className="flex flex-col gap-2 overflow-x-auto"
    >
      <h2 className="text-lg font-semibold">Deviation by section and machine</h2>
      <table className="w-full max-w-[64rem] min-w-[40rem] border-collapse">
        <thead>
          <tr className="border-b border-edge text-graphite">
            {['Section', 'Machine', 'Parts', 'Readings', 'Out', 'Mean deviation', 'Spread (1σ)'].map(
              (head, i) => (
                <th
                  key={head}
                  scope="col"
                  className={`h-9 px-2 font-normal ${i < 2 ? 'text-left' : 'text-right'}`}
                >
                  {head}
                </th>
              ),
            )}
          </tr>
        </thead>
        <tbody>
          {statistics.data.map((row) => (
            <StatisticsRow key={`${row.sectionId} ${row.machine?.id ?? ''}`} row={row} />
          ))}
        </tbody>
      </table>
    </section>
  );
}

function StatisticsRow({ row }: { readonly row: InspectionStatistics['items'][number] }) {
  const units = useUnits();
  return (
    <tr className="h-10 border-b border-rule">
      <th scope="row" className="px-2 text-left font-semibold">
        {row.sectionName}
      </th>
      <td className="px-2">{row.machine?.name ?? 'by hand'}</td>
      <td className="px-2 text-right">{row.parts}</td>
      <td className="px-2 text-right">{row.readings}</td>
      <td className={`px-2 text-right ${row.outOfTolerance > 0 ? 'text-brick' : ''}`}>
        {row.outOfTolerance}
      </td>
      <td className="px-2 text-right">{deviationText(row.meanMm, units)}</td>
      <td className="px-2 text-right">
        {row.spreadMm === null ? 'one reading' : formatLength(row.spreadMm, units)}
      </td>
    </tr>
  );
}
