import { useQuery } from '@tanstack/react-query';
import { type ReactNode } from 'react';
import { Link } from 'react-router';
import { type CutSheet } from '#server/contracts/cut-sheets.ts';
import { type Desk, type Inspection } from '#server/contracts/cutting-list.ts';
import { type Section } from '#server/contracts/sections.ts';
import { deskQuery } from '#client/api/cutting-list.ts';
import { useMay, useMe } from '#client/app/session.tsx';
import { formatPercent } from '#client/app/units.ts';
import { sheetPath } from '#client/cut-sheets/paths.ts';
import { sourcesText, StaleNotice } from '#client/cut-sheets/source-words.tsx';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { versionPath } from '#client/versions/standing.tsx';

/** What waits for the one who is signed in, the most pressing first. */
export function Component() {
  const me = useMe();
  const desk = useQuery(deskQuery());
  const retry = () => void desk.refetch();
  return (
    <div data-page="flowing" className="mx-auto flex w-full max-w-[100rem] flex-col gap-6 px-4 pt-4 pb-12">
      <title>Desk · Ribwright</title>
      <h1 className="text-xl font-extrabold">Desk of {me.name}</h1>
      {desk.isPending && <Skeleton className="h-96 w-full" />}
      {desk.isError && !desk.data && (
        <ErrorState title="The desk could not be loaded." error={desk.error} retry={retry} />
      )}
      {desk.data && <DeskLists desk={desk.data} />}
    </div>
  );
}

function DeskLists({ desk }: { readonly desk: Desk }) {
  const mayPlan = useMay('cut-sheets.write');
  const mayShape = useMay('sections.write');
  return (
    <div className="gap-x-10 lg:columns-2">
      <DeskList title="Out of tolerance" none="Every measured part is within tolerance or decided.">
        {desk.outOfTolerance.map((inspection) => (
          <Measured key={inspection.id} inspection={inspection} />
        ))}
      </DeskList>
      <DeskList title="Unsaved work" none="Nothing of yours is unsaved.">
        {desk.drafts.map(({ kind, id, name, updatedAt }) => (
          <Line key={id} to={kind === 'section' ? `/sections/${id}` : sheetPath(id)} name={name}>
            {kind === 'section' ? 'section' : 'cut sheet'}, <Moment at={updatedAt} />
          </Line>
        ))}
      </DeskList>
      <DeskList
        title="Cut sheets on sections out of force"
        none="Every cut sheet stands on sections in force."
      >
        {desk.staleSheets.map((sheet) => (
          <Stale key={sheet.id} sheet={sheet} />
        ))}
      </DeskList>
      <DeskList title="Cut sheets in work" none="No cut sheet is being planned or cut.">
        {desk.sheetsInWork.map((sheet) => (
          <SheetInWork key={sheet.id} sheet={sheet} />
        ))}
      </DeskList>
      {mayPlan && (
        <DeskList title="Released, without a cut sheet" none="Every released section has a cut sheet.">
          {desk.unplanned.map((section) => (
            <Shape key={section.id} section={section} />
          ))}
        </DeskList>
      )}
      {mayShape && (
        <DeskList title="Sections changed last" none="No section yet.">
          {desk.recentSections.map((section) => (
            <Shape key={section.id} section={section} />
          ))}
        </DeskList>
      )}
    </div>
  );
}

function SheetInWork({ sheet }: { readonly sheet: CutSheet }) {
  const { number, status, errors } = sheet.latest;
  return (
    <Line to={sheetPath(sheet.id)} name={sheet.name}>
      <span>v{number}</span>
      <StatusMark status={status} />
      {errors > 0 && <span className="text-brick">{errors} to mend</span>}
      <span>{sourcesText(sheet.latest)}</span>
      {status === 'released' &&
        sheet.progress.map(({ part, wanted, done }) => (
          <span key={part}>
            {part} {done} of {wanted}
          </span>
        ))}
    </Line>
  );
}

interface DeskListProps {
  readonly title: string;
  readonly none: string;
  readonly children: readonly ReactNode[];
}

function DeskList({ title, none, children }: DeskListProps) {
  return (
    <section aria-label={title} className="mb-7 flex min-w-0 break-inside-avoid flex-col gap-1">
      <h2 className="flex items-baseline justify-between border-b border-edge pb-1 text-base font-semibold">
        {title}
        <span className="font-normal text-graphite">{children.length}</span>
      </h2>
      {children.length === 0 ? <p className="py-2 text-graphite">{none}</p> : <ul>{children}</ul>}
    </section>
  );
}

interface LineProps {
  readonly to: string;
  readonly name: string;
  readonly picture?: ReactNode;
  readonly children: ReactNode;
}

function Line({ to, name, picture, children }: LineProps) {
  return (
    <li className="relative flex min-h-13 items-center gap-4 border-b border-rule py-1.5 focus-within:bg-sheet hover:bg-sheet">
      {picture}
      <div className="min-w-0 flex-1">
        <Link to={to} className="block truncate font-semibold after:absolute after:inset-0">
          {name}
        </Link>
        <p className="flex flex-wrap items-center gap-x-2 text-xs text-graphite">{children}</p>
      </div>
    </li>
  );
}

function Measured({ inspection }: { readonly inspection: Inspection }) {
  const out = inspection.measurements.filter(({ within }) => !within);
  const mark = inspection.mark === '' ? '' : `, ${inspection.mark}`;
  return (
    <Line
      to={`/inspections/${inspection.id}`}
      name={`${inspection.sheetName} v${String(inspection.versionNumber)}${mark}`}
    >
      <span className="text-brick">
        out at {out.map(({ end, station }) => `${end} ${formatPercent(station, 0)}`).join(', ')}
      </span>
      <span>
        {inspection.person.name}, <Moment at={inspection.at} />
      </span>
    </Line>
  );
}

function Stale({ sheet }: { readonly sheet: CutSheet }) {
  return (
    <li className="border-b border-rule py-2">
      <Link to={sheetPath(sheet.id)} className="font-semibold hover:underline">
        {sheet.name} v{sheet.latest.number}
      </Link>
      <StaleNotice ends={sheet.latest} />
    </li>
  );
}

function Shape({ section }: { readonly section: Section }) {
  const { latest } = section;
  const mayWrite = useMay('sections.write');
  const to = mayWrite ? `/sections/${section.id}` : versionPath(section.id, latest.number);
  return (
    <Line to={to} name={section.name} picture={<Thumbnail shape={latest.shape} width={88} height={24} />}>
      v{latest.number} <StatusMark status={latest.status} /> {latest.description}
    </Line>
  );
}
