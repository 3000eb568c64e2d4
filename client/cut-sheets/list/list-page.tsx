import { keepPreviousData, useInfiniteQuery } from '@tanstack/react-query';
import { lazy, Suspense, useState } from 'react';
import { cutSheetsQuery } from '#client/api/cut-sheets.ts';
import { type KeyGroup, useHotkey, useKeys } from '#client/app/keys.tsx';
import { useMay } from '#client/app/session.tsx';
import { Button } from '#client/ui/button.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { ErrorState, sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { SearchField } from '#client/ui/search-field.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { type SheetListAddress, useSheetListAddress } from './list-address.ts';
import { SheetRows } from './sheet-rows.tsx';

const NewSheetDialog = lazy(() => import('./new-sheet-dialog.tsx'));

const STATUSES = [
  { value: '', label: 'Any status' },
  { value: 'draft', label: 'Draft' },
  { value: 'released', label: 'Released' },
  { value: 'withdrawn', label: 'Withdrawn' },
  { value: 'stale', label: 'Section out of force' },
  { value: 'archived', label: 'Archived' },
] as const;
const SORTS = [
  { value: 'updated', label: 'Last changed' },
  { value: 'name', label: 'Name' },
] as const;
const KEYS: KeyGroup = {
  title: 'Cut sheets',
  entries: [
    { keys: ['/'], does: 'Search' },
    { keys: ['N'], does: 'New cut sheet' },
  ],
};
const PAGE_SIZE = 50;

type Change = (part: Partial<SheetListAddress>) => void;

/** The cut sheets of the workshop. */
export function Component() {
  const [address, change] = useSheetListAddress();
  const [makes, setMakes] = useState(false);
  const mayWrite = useMay('cut-sheets.write');
  const onNew = mayWrite ? () => setMakes(true) : undefined;
  useKeys(KEYS);
  useHotkey('n', () => onNew?.());
  return (
    <div data-page="flowing" className="mx-auto flex w-full max-w-[100rem] flex-col gap-3 px-4 pt-4 pb-10">
      <title>Cut sheets · Ribwright</title>
      <h1 className="text-xl font-extrabold">Cut sheets</h1>
      <Toolbar address={address} onChange={change} onNew={onNew} />
      <Sheets address={address} onChange={change} onNew={onNew} />
      {makes && (
        <Suspense>
          <NewSheetDialog onClose={() => setMakes(false)} />
        </Suspense>
      )}
    </div>
  );
}

interface ListProps {
  readonly address: SheetListAddress;
  readonly onChange: Change;
  readonly onNew: (() => void) | undefined;
}

function Toolbar({ address, onChange, onNew }: ListProps) {
  const seesDrafts = useMay('cut-sheets.read');
  return (
    <div role="search" className="flex flex-wrap items-center gap-2 max-sm:grid max-sm:grid-cols-2">
      <SearchField
        label="Search name, purpose, section"
        value={address.search ?? ''}
        onSearch={(search) => onChange({ search })}
        className="max-sm:col-span-2 sm:max-w-90"
      />
      {seesDrafts && (
        <SelectField
          label="Status"
          hideLabel
          options={STATUSES}
          value={address.status ?? ''}
          onChange={(event) =>
            onChange({ status: (event.target.value || undefined) as SheetListAddress['status'] })
          }
          className="sm:w-52"
        />
      )}
      <SelectField
        label="Order"
        hideLabel
        options={SORTS}
        value={address.sort}
        onChange={(event) => onChange({ sort: event.target.value as SheetListAddress['sort'] })}
        className="sm:w-40"
      />
      {onNew && (
        <Button variant="primary" onClick={onNew} className="ml-auto max-sm:col-span-2 max-sm:w-full">
          New cut sheet
        </Button>
      )}
    </div>
  );
}

function Sheets({ address, onChange, onNew }: ListProps) {
  const { search, status, sort } = address;
  const filter = { ...(search ? { search } : {}), ...(status ? { status } : {}), sort, limit: PAGE_SIZE };
  const list = useInfiniteQuery({ ...cutSheetsQuery(filter), placeholderData: keepPreviousData });
  const retry = () => void list.refetch();
  if (list.isError && !list.data) {
    return <ErrorState title="The cut sheets could not be loaded." error={list.error} retry={retry} />;
  }
  const sheets = list.data?.pages.flatMap((page) => page.items) ?? null;
  if (sheets?.length === 0) return <NoSheets address={address} onChange={onChange} onNew={onNew} />;
  return (
    <>
      <SheetRows sheets={sheets} stale={list.isPlaceholderData} />
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

function NoSheets({ address, onChange, onNew }: ListProps) {
  if (address.search || address.status) {
    return (
      <EmptyState
        title={
          address.search ? `No cut sheet matches "${address.search}".` : 'No cut sheet is of this status.'
        }
        action={
          <Button onClick={() => onChange({ search: undefined, status: undefined })}>
            Clear search and filter
          </Button>
        }
      >
        The search looks at the name, the purpose and the sections of the sheet.
      </EmptyState>
    );
  }
  return (
    <EmptyState
      title="No cut sheet yet."
      action={
        onNew && (
          <Button variant="primary" onClick={onNew}>
            New cut sheet
          </Button>
        )
      }
    >
      A cut sheet turns released sections into a foam core, ribs or templates, with the files to cut them.
    </EmptyState>
  );
}
