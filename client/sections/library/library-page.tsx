import {
  type InfiniteData,
  keepPreviousData,
  useInfiniteQuery,
  type UseInfiniteQueryResult,
} from '@tanstack/react-query';
import { lazy, Suspense, useState } from 'react';
import { type sectionEndpoints } from '#server/contracts/section-endpoints.ts';
import { type Reply } from '#client/api/request.ts';
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

const KEYS: KeyGroup = { title: 'Sections', entries: [{ keys: ['/'], does: 'Search' }] };
const WRITER_KEYS: KeyGroup = {
  title: 'Sections',
  entries: [...KEYS.entries, { keys: ['N'], does: 'New section' }],
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
  const list = useInfiniteQuery({ ...sectionsQuery(filterOf(address)), placeholderData: keepPreviousData });
  const count = list.data?.pages.reduce((sum, page) => sum + page.items.length, 0);
  const layout = readsAll ? (wide ? 'table' : 'list') : 'released';
  const make = () => {
    setMakes(true);
  };
  const onNew = mayWrite ? make : undefined;
  useKeys(mayWrite ? WRITER_KEYS : KEYS);
  useHotkey('n', () => onNew?.());
  return (
    <LibraryNoticeContext value={setEvent}>
      <div data-page="flowing" className="mx-auto flex w-full max-w-[100rem] flex-col gap-3 px-4 pt-4 pb-10">
        <title>Sections · Ribwright</title>
        <div className="flex min-h-8 flex-wrap items-center gap-x-4 gap-y-2">
          <h1 className="text-xl font-extrabold">{readsAll ? 'Sections' : 'Released sections'}</h1>
          <p role="status" className="text-graphite">
            {count !== undefined && countOf(count, list.hasNextPage)}
          </p>
          {event && <LibraryNotice event={event} />}
        </div>
        <Toolbar address={address} onChange={change} layout={layout} onNew={onNew} />
        <Sections list={list} address={address} onChange={change} layout={layout} onNew={onNew} />
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
  list: UseInfiniteQueryResult<InfiniteData<Reply<typeof sectionEndpoints.listSections>>>;
  address: ListAddress;
  onChange: (change: Partial<ListAddress>) => void;
  layout: Layout;
  onNew: (() => void) | undefined;
}

function Sections({ list, address, onChange, layout, onNew }: SectionsProps) {
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
      {list.isError && (
        <Notice tone="error">{sentenceOf(list.error)} What is shown was loaded before.</Notice>
      )}
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

function countOf(count: number, more: boolean): string {
  if (more) return `${String(count)} shown, there are more`;
  if (count === 0) return 'none';
  return `${String(count)} shown`;
}
