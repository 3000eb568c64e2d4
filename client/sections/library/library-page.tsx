import { keepPreviousData, useInfiniteQuery } from '@tanstack/react-query';
import { lazy, Suspense, useState } from 'react';
import { sectionsQuery } from '#client/api/sections.ts';
import { type KeyGroup, useHotkey, useKeys } from '#client/app/keys.tsx';
import { useMedia } from '#client/app/media.ts';
import { useMay } from '#client/app/session.tsx';
import { Button } from '#client/ui/button.tsx';
import { ErrorState, sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { LibraryNotice, LibraryNoticeContext, type LibraryEvent } from './library-notice.tsx';
import { filterOf, type ListAddress, useListAddress } from './list-address.ts';
import { NoSections } from './no-sections.tsx';
import { ReleasedList, SectionList } from './section-list.tsx';
import { SectionTable } from './section-table.tsx';
import { type Layout, Toolbar } from './toolbar.tsx';

const NewSectionDialog = lazy(() => import('./new-section-dialog.tsx'));

const KEYS: KeyGroup = {
  title: 'Sections',
  entries: [
    { keys: ['/'], does: 'Search' },
    { keys: ['N'], does: 'New section' },
  ],
};
/** From here on the table has room for all its columns (rem, so that larger type counts). */
const WIDE = '(min-width: 64rem)';

export function Component() {
  const [address, change] = useListAddress();
  const [event, setEvent] = useState<LibraryEvent | null>(null);
  const [makes, setMakes] = useState(false);
  const wide = useMedia(WIDE);
  const readsAll = useMay('sections.read');
  const mayWrite = useMay('sections.write');
  const layout = readsAll ? (wide ? 'table' : 'list') : 'released';
  const make = () => {
    setMakes(true);
  };
  useKeys(KEYS);
  useHotkey('n', () => {
    if (mayWrite) make();
  });
  return (
    <LibraryNoticeContext value={setEvent}>
      <div data-page="flowing" className="mx-auto flex w-full max-w-[100rem] flex-col gap-3 px-4 pt-4 pb-10">
        <title>Sections · Ribwright</title>
        <div className="flex min-h-8 flex-wrap items-center gap-x-6 gap-y-2">
          <h1 className="text-xl font-extrabold">{readsAll ? 'Sections' : 'Released sections'}</h1>
          {event && <LibraryNotice event={event} />}
        </div>
        <Toolbar address={address} onChange={change} layout={layout} onNew={mayWrite ? make : undefined} />
        <Sections address={address} onChange={change} layout={layout} onNew={mayWrite ? make : undefined} />
        {makes && (
          <Suspense>
            <NewSectionDialog
              onClose={() => {
                setMakes(false);
              }}
            />
          </Suspense>
        )}
      </div>
    </LibraryNoticeContext>
  );
}

interface SectionsProps {
  address: ListAddress;
  onChange: (change: Partial<ListAddress>) => void;
  layout: Layout;
  onNew: (() => void) | undefined;
}

function Sections({ address, onChange, layout, onNew }: SectionsProps) {
  const list = useInfiniteQuery({ ...sectionsQuery(filterOf(address)), placeholderData: keepPreviousData });
  if (list.isError && !list.data) {
    return (
      <ErrorState
        title="The sections could not be loaded."
        error={list.error}
        retry={() => void list.refetch()}
      />
    );
  }
  const sections = list.data?.pages.flatMap((page) => page.items) ?? null;
  if (sections?.length === 0) return <NoSections address={address} onChange={onChange} onNew={onNew} />;
  const rows = { sections, stale: list.isPlaceholderData, mayWrite: onNew !== undefined };
  return (
    <>
      {layout === 'table' && <SectionTable {...rows} address={address} onSort={onChange} />}
      {layout === 'list' && <SectionList {...rows} />}
      {layout === 'released' && <ReleasedList {...rows} />}
      <div className="flex min-h-11 flex-wrap items-center gap-4 text-xs text-graphite">
        <p role="status">{sections !== null && countOf(sections.length, list.hasNextPage)}</p>
        {list.hasNextPage && (
          <Button busy={list.isFetchingNextPage} onClick={() => void list.fetchNextPage()}>
            Show more
          </Button>
        )}
        {list.isError && (
          <Notice tone="error">{sentenceOf(list.error)} What is shown was loaded before.</Notice>
        )}
      </div>
    </>
  );
}

function countOf(count: number, more: boolean): string {
  if (more) return `The first ${String(count)} sections`;
  return count === 1 ? '1 section' : `${String(count)} sections`;
}
