import { Link } from 'react-router';
import { formatPercent } from '#client/app/units.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { buttonClass } from '#client/ui/button.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { type Section } from '#server/contracts/sections.ts';
import { SectionMenu } from './section-menu.tsx';
import { sectionPath, SectionStatus } from './section-words.tsx';

interface SectionListProps {
  /** Null while the first page is on its way. */
  sections: readonly Section[] | null;
  stale: boolean;
  mayWrite: boolean;
}

/** The library on narrow screens: two lines a section. */
export function SectionList({ sections, stale, mayWrite }: SectionListProps) {
  return (
    <ul
      className={`border-t border-rule ${stale ? 'opacity-60' : ''}`}
      aria-label="Sections"
      aria-busy={stale || sections === null}
    >
      {sections === null
        ? Array.from({ length: 8 }, (_, row) => (
            <li key={row} className="flex h-18 items-center gap-3 border-b border-rule">
              <Skeleton className="h-3 w-16" />
              <Skeleton className="h-8 flex-1" />
            </li>
          ))
        : sections.map((section) => (
            <li
              key={section.id}
              className="relative flex h-18 items-center gap-3 border-b border-rule focus-within:bg-sheet"
            >
              <Thumbnail shape={section.latest.shape} width={64} height={20} className="shrink-0" />
              <div className="min-w-0 flex-1">
                <Link
                  to={sectionPath(section, false)}
                  className="block truncate text-base font-semibold after:absolute after:inset-0"
                >
                  {section.name}
                </Link>
                <p className="flex items-center gap-x-2 truncate text-xs text-graphite">
                  <span>v{section.latest.number}</span>
                  <SectionStatus section={section} brief />
                  <span className="ml-auto max-[22rem]:hidden">
                    {formatPercent(section.latest.maxThickness, 1)}
                  </span>
                  <Moment at={section.updatedAt} className="w-14 text-right max-sm:hidden" />
                </p>
              </div>
              {mayWrite && (
                <div className="relative">
                  <SectionMenu section={section} />
                </div>
              )}
            </li>
          ))}
    </ul>
  );
}

/** The library at the machines, read at arm's length: large rows, one press to the released files. */
export function ReleasedList({ sections, stale }: Omit<SectionListProps, 'mayWrite'>) {
  return (
    <ul
      className={`flex flex-col gap-2.5 ${stale ? 'opacity-60' : ''}`}
      aria-label="Released sections"
      aria-busy={stale || sections === null}
    >
      {sections === null
        ? Array.from({ length: 5 }, (_, row) => (
            <li key={row} className="h-24 rounded border border-rule bg-sheet" />
          ))
        : sections.map((section) => <ReleasedRow key={section.id} section={section} />)}
    </ul>
  );
}

function ReleasedRow({ section }: { section: Section }) {
  const { latest } = section;
  const path = sectionPath(section, true);
  return (
    <li className="relative flex min-h-24 items-center gap-5 rounded border border-rule bg-sheet px-4 py-3 max-sm:flex-wrap max-sm:gap-x-4 max-sm:gap-y-2">
      <Thumbnail shape={latest.shape} width={176} height={44} className="shrink-0 max-md:h-7 max-md:w-28" />
      <div className="min-w-0 flex-1 max-sm:basis-full max-sm:order-first">
        <Link
          to={path}
          className="block text-xl leading-tight font-semibold wrap-break-word after:absolute after:inset-0"
        >
          {section.name}
        </Link>
        <p className="flex flex-wrap items-center gap-x-3 text-lg">
          v{latest.number} <StatusMark status={latest.status} />
        </p>
        <p className="text-sm text-graphite">
          {latest.description}
          {section.purpose !== '' && <> · {section.purpose}</>}
        </p>
      </div>
      <span aria-hidden="true" className={`${buttonClass('plain', 'large')} max-sm:ml-auto`}>
        Files
      </span>
    </li>
  );
}
