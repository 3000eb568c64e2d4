import { type ReactNode } from 'react';
import { Link } from 'react-router';
import { formatPercent } from '#client/app/units.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { type Section } from '#server/contracts/sections.ts';
import { directionOf, type ListAddress, type Sort, sortedBy } from './list-address.ts';
import { SectionMenu } from './section-menu.tsx';
import { sectionPath, SectionStatus } from './section-words.tsx';

const THUMBNAIL = { width: 112, height: 28 } as const;

interface SectionTableProps {
  /** Null while the first page is on its way: skeleton rows of the true size stand in. */
  sections: readonly Section[] | null;
  address: ListAddress;
  onSort: (change: Partial<ListAddress>) => void;
  /** The rows are of the question before; the new answer is on its way. */
  stale: boolean;
  mayWrite: boolean;
}

/** The library on wide screens. Column widths are fixed, so that nothing moves when rows come in. */
export function SectionTable({ sections, address, onSort, stale, mayWrite }: SectionTableProps) {
  const head = (sort: Sort, label: string, end = false) => (
    <SortHead address={address} sort={sort} label={label} end={end} onSort={onSort} />
  );
  return (
    <table className="w-full table-fixed border-collapse text-xs" aria-busy={stale || sections === null}>
      <caption className="sr-only">Sections</caption>
      <colgroup>
        <col className="w-34" />
        <col />
        <col className={`w-44 ${ROOMY}`} />
        <col className="w-20" />
        <col className="w-22" />
        <col className="w-36" />
        <col className="w-20" />
        <col className="w-44" />
        <col className="w-12" />
      </colgroup>
      <thead className="sticky top-11 z-10 bg-paper pointer-coarse:top-13">
        <tr className="border-b border-edge text-graphite">
          <PlainHead>
            <span className="sr-only">Shape</span>
          </PlainHead>
          {head('name', 'Name')}
          <PlainHead className={`text-left ${ROOMY}`}>Designation</PlainHead>
          {head('thickness', 't/c', true)}
          {head('camber', 'Camber', true)}
          <PlainHead className="pl-5 text-left">Status</PlainHead>
          <PlainHead className="text-right">Version</PlainHead>
          {head('updated', 'Changed')}
          <PlainHead>
            <span className="sr-only">Actions</span>
          </PlainHead>
        </tr>
      </thead>
      <tbody className={stale ? 'opacity-60' : ''}>
        {sections === null
          ? Array.from({ length: 8 }, (_, row) => <SkeletonRow key={row} />)
          : sections.map((section) => <Row key={section.id} section={section} mayWrite={mayWrite} />)}
      </tbody>
    </table>
  );
}

/** A column that gives way to the name where both have no room. */
const ROOMY = 'max-[76rem]:hidden';
const CELL = 'h-14 px-2 align-middle';

function Row({ section, mayWrite }: { section: Section; mayWrite: boolean }) {
  const { latest } = section;
  return (
    <tr className="relative border-b border-rule hover:bg-sheet focus-within:bg-sheet">
      <td className={CELL}>
        <Thumbnail shape={latest.shape} {...THUMBNAIL} />
      </td>
      <th scope="row" className={`${CELL} text-left font-normal`}>
        <Link
          to={sectionPath(section, false)}
          className="block truncate text-sm font-semibold after:absolute after:inset-0"
          title={section.name}
        >
          {section.name}
        </Link>
        <span className="block truncate text-graphite" title={section.purpose}>
          {section.purpose}
        </span>
      </th>
      <td className={`${CELL} ${ROOMY}`}>
        <span className="line-clamp-2">{latest.description}</span>
      </td>
      <td className={`${CELL} text-right text-sm`}>{formatPercent(latest.maxThickness, 1)}</td>
      <td className={`${CELL} text-right text-sm`}>{formatPercent(latest.maxCamber, 2)}</td>
      <td className={`${CELL} pl-5`}>
        <SectionStatus section={section} />
      </td>
      <td className={`${CELL} text-right text-sm`}>v{latest.number}</td>
      <td className={`${CELL} pl-5`}>
        <Moment at={section.updatedAt} className="relative block truncate" />
        <span className="block truncate text-graphite" title={section.updatedBy.name}>
          {section.updatedBy.name}
        </span>
      </td>
      <td className={`${CELL} relative text-right`}>{mayWrite && <SectionMenu section={section} />}</td>
    </tr>
  );
}

function SkeletonRow() {
  return (
    <tr className="border-b border-rule">
      <td className={CELL}>
        <Skeleton className="h-3 w-28" />
      </td>
      <td className={CELL}>
        <Skeleton className="h-4 w-2/5" />
        <Skeleton className="mt-1 h-3 w-3/5" />
      </td>
      {['w-24', 'ml-auto w-12', 'ml-auto w-12', 'ml-3 w-20', 'ml-auto w-6', 'ml-3 w-24'].map(
        (width, column) => (
          <td key={column} className={CELL}>
            <Skeleton className={`h-3 ${width}`} />
          </td>
        ),
      )}
      <td className={CELL} />
    </tr>
  );
}

function PlainHead({ children, className = 'text-left' }: { children: ReactNode; className?: string }) {
  return (
    <th scope="col" className={`h-9 px-2 font-normal ${className}`}>
      {children}
    </th>
  );
}

interface SortHeadProps {
  address: ListAddress;
  sort: Sort;
  label: string;
  end: boolean;
  onSort: (change: Partial<ListAddress>) => void;
}

function SortHead({ address, sort, label, end, onSort }: SortHeadProps) {
  const active = address.sort === sort;
  const direction = directionOf(address);
  return (
    <th
      scope="col"
      aria-sort={active ? direction : undefined}
      className={`h-9 px-2 font-normal ${end ? 'text-right' : 'text-left nth-8:pl-5'}`}
    >
      <button
        type="button"
        onClick={() => {
          onSort(sortedBy(address, sort));
        }}
        className={`inline-flex h-9 items-center gap-1 hover:text-ink ${end ? 'flex-row-reverse' : ''} ${active ? 'font-semibold text-ink' : ''}`}
      >
        {label}
        <svg viewBox="0 0 8 8" className="size-2 fill-current" aria-hidden="true">
          {active && <path d={direction === 'ascending' ? 'M4 1 8 7H0Z' : 'M4 7 0 1H8Z'} />}
        </svg>
      </button>
    </th>
  );
}
