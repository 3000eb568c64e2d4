import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import { type Inspection } from '#server/contracts/cutting-list.ts';
import { inspectionQuery } from '#client/api/cutting-list.ts';
import { useMay } from '#client/app/session.tsx';
import { formatLength, formatPercent, useUnits } from '#client/app/units.ts';
import { sheetVersionPath } from '#client/cut-sheets/paths.ts';
import { buttonClass } from '#client/ui/button.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { AnswerForm } from './answer-form.tsx';
import { deviationText } from './deviation-text.ts';
import { Photos } from './photos.tsx';
import { VerdictGlyph } from './verdict.tsx';

/** One measured part: its readings, photographs, and what was decided when it is out of tolerance. */
export function Component() {
  const { inspectionId = '' } = useParams();
  const inspection = useQuery(inspectionQuery(inspectionId));
  const retry = () => void inspection.refetch();
  return (
    <div data-page="flowing" className="mx-auto flex w-full max-w-[80rem] flex-col gap-5 px-4 pt-4 pb-12">
      <title>Inspection · Ribwright</title>
      {inspection.isPending && <Skeleton className="h-96 w-full" />}
      {inspection.isError && !inspection.data && (
        <ErrorState title="The inspection could not be loaded." error={inspection.error} retry={retry} />
      )}
      {inspection.data && <InspectionView inspection={inspection.data} />}
    </div>
  );
}

function InspectionView({ inspection }: { readonly inspection: Inspection }) {
  const mayAnswer = useMay('inspections.answer');
  const { sheetId, sheetName, versionNumber, mark, person, at, machine, note, within, answer } = inspection;
  return (
    <>
      <header className="flex flex-wrap items-start justify-between gap-x-4 gap-y-2">
        <div>
          <h1 className="text-xl font-extrabold">
            <Link className="hover:underline" to={sheetVersionPath(sheetId, versionNumber)}>
              {sheetName} v{versionNumber}
            </Link>
            {mark !== '' && `, ${mark}`}
          </h1>
          <p className="text-graphite">
            measured by {person.name}, <Moment at={at} />
            {machine !== null && `, cut on ${machine.name}`}
          </p>
        </div>
        <Link
          className={buttonClass('plain', 'large')}
          to={`/cutting-list/inspect/${sheetId}/${String(versionNumber)}`}
        >
          Measure the next part
        </Link>
      </header>
      <p
        className={`flex items-center gap-2 border-l-4 py-1 pl-3 text-lg font-semibold ${within ? 'border-spruce text-spruce' : 'border-brick text-brick'}`}
      >
        <VerdictGlyph within={within} />
        {within ? 'Within tolerance at every station.' : outSentence(answer)}
      </p>
      {note !== '' && <p className="max-w-[60rem] break-words">{note}</p>}
      <MeasurementTable inspection={inspection} />
      {answer !== null && (
        <p className="border-l-[3px] border-rule py-1 pl-3">
          <strong>{answer.decision}</strong> by {answer.by.name}, <Moment at={answer.at} />: {answer.note}
        </p>
      )}
      {answer === null && !within && mayAnswer && <AnswerForm inspectionId={inspection.id} />}
      <Photos inspection={inspection} />
    </>
  );
}

function outSentence(answer: Inspection['answer']): string {
  if (answer !== null) return `Out of tolerance, ${answer.decision}.`;
  return 'Out of tolerance: it stands on the builder’s and designer’s desk.';
}

function MeasurementTable({ inspection }: { readonly inspection: Inspection }) {
  const units = useUnits();
  const length = (mm: number) => formatLength(mm, units);
  return (
    <table className="w-full max-w-[56rem] border-collapse max-sm:text-xs">
      <caption className="sr-only">
        Readings of the {inspection.measured === 'core' ? 'bare core' : 'part with its skins'}
      </caption>
      <thead>
        <tr className="border-b border-edge text-graphite">
          {['Station', 'Nominal', 'Measured', 'Deviation', 'Verdict'].map((head, i) => (
            <th
              key={head}
              scope="col"
              className={`h-9 px-2 max-sm:px-1 font-normal ${i === 0 || i === 4 ? 'text-left' : 'text-right'} ${head === 'Nominal' ? 'max-sm:hidden' : ''}`}
            >
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {inspection.measurements.map((one) => (
          <tr key={`${one.end} ${String(one.station)}`} className="h-10 border-b border-rule">
            <th scope="row" className="px-2 max-sm:px-1 text-left font-semibold">
              {one.end} {formatPercent(one.station, 0)}
            </th>
            <td className="px-2 text-right max-sm:hidden">{length(one.nominalMm)}</td>
            <td className="px-2 max-sm:px-1 text-right">{length(one.measuredMm)}</td>
            <td className="px-2 max-sm:px-1 text-right">{deviationText(one.deviationMm, units)}</td>
            <td className={`px-2 max-sm:px-1 ${one.within ? 'text-spruce' : 'font-semibold text-brick'}`}>
              <span className="inline-flex items-center gap-2">
                <VerdictGlyph within={one.within} />
                {one.within ? 'within' : `out of ± ${length(one.toleranceMm)}`}
              </span>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
