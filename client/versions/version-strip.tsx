import { useInfiniteQuery } from '@tanstack/react-query';
import { useLayoutEffect, useRef, useState } from 'react';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { versionsQuery } from '#client/api/sections.ts';
import { useMay } from '#client/app/session.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { moveFocus } from './strip-keys.ts';
import { DraftCard, VersionCard } from './version-card.tsx';

interface VersionStripProps {
  readonly sectionId: string;
  /** The unsaved shape, or null when the sheet shows version `basedOn` unchanged. */
  readonly draftShape: Shape | null;
  readonly basedOn: number;
  /** Version drawn as the ghost behind the sheet. */
  readonly ghost: number | null;
  readonly onGhost: (number: number | null) => void;
  readonly onOpen: (number: number) => void;
  readonly onRestore: (version: SectionVersion) => void;
}

/** The versions of a section below its sheet, oldest first, with the unsaved work at the end. */
export function VersionStrip({ sectionId, ...strip }: VersionStripProps) {
  const query = useInfiniteQuery(versionsQuery(sectionId));
  return (
    <section aria-label="Versions" className="h-40 border-t border-rule pointer-coarse:h-44 print:hidden">
      {query.isPending && <StripSkeleton />}
      {query.isError && !query.data && <ErrorState error={query.error} retry={() => void query.refetch()} />}
      {query.data && (
        <Cards
          {...strip}
          versions={query.data.pages.flatMap((page) => page.items).reverse()}
          older={{
            more: query.hasNextPage,
            busy: query.isFetchingNextPage,
            failed: query.isFetchNextPageError,
            load: () => void query.fetchNextPage(),
          }}
        />
      )}
    </section>
  );
}

interface CardsProps extends Omit<VersionStripProps, 'sectionId'> {
  readonly versions: readonly SectionVersion[];
  readonly older: {
    readonly more: boolean;
    readonly busy: boolean;
    readonly failed: boolean;
    readonly load: () => void;
  };
}

function Cards({ versions, older, draftShape, basedOn, ghost, onGhost, onOpen, onRestore }: CardsProps) {
  const mayRestore = useMay('sections.write');
  const [active, setActive] = useState<number | null>(null);
  const list = useEndInSight(versions[0]?.number, versions.length);
  const reachable = versions.some((version) => version.number === active)
    ? active
    : (versions.at(-1)?.number ?? null);
  const loadOlder = () => {
    if (older.more && !older.busy) older.load();
  };
  return (
    <ol
      ref={list}
      className="relative flex h-full list-none overflow-x-auto px-1"
      onKeyDown={(event) => setActive((before) => moveFocus(event, loadOlder) ?? before)}
    >
      {older.more && <OlderVersions {...older} />}
      {versions.map((version) => (
        <VersionCard
          key={version.number}
          version={version}
          current={draftShape === null && version.number === basedOn}
          reachable={version.number === reachable}
          ghost={version.number === ghost}
          mayRestore={mayRestore}
          onOpen={() => onOpen(version.number)}
          onGhost={() => onGhost(version.number === ghost ? null : version.number)}
          onRestore={() => onRestore(version)}
        />
      ))}
      {versions.length === 0 && <li className="p-3 text-graphite">No version to show yet.</li>}
      {draftShape && <DraftCard shape={draftShape} basedOn={basedOn} />}
    </ol>
  );
}

function OlderVersions({ busy, failed, load }: Omit<CardsProps['older'], 'more'>) {
  return (
    <li className="flex w-36 shrink-0 flex-col items-start justify-center gap-1 px-2">
      <button
        type="button"
        className="min-h-11 text-left text-xs underline underline-offset-4"
        onClick={load}
      >
        {busy ? 'Fetching older versions…' : 'Older versions'}
      </button>
      {failed && <span className="text-xs text-brick">They did not arrive. Try again.</span>}
    </li>
  );
}

/** Keeps the newest end in sight at first, and the same cards in place when older ones are put in before them. */
function useEndInSight(oldest: number | undefined, count: number) {
  const list = useRef<HTMLOListElement>(null);
  const fromEnd = useRef(0);
  useLayoutEffect(() => {
    const element = list.current;
    if (!element) return;
    element.scrollLeft = element.scrollWidth - fromEnd.current - element.clientWidth;
    const remember = () => {
      fromEnd.current = element.scrollWidth - element.scrollLeft - element.clientWidth;
    };
    element.addEventListener('scroll', remember, { passive: true });
    return () => element.removeEventListener('scroll', remember);
  }, [oldest, count]);
  return list;
}

function StripSkeleton() {
  return (
    <div className="flex h-full gap-4 p-3" role="status" aria-label="Loading versions">
      {[0, 1, 2, 3].map((index) => (
        <Skeleton key={index} className="h-24 w-40 shrink-0" />
      ))}
    </div>
  );
}
