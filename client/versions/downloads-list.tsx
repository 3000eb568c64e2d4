import { type InfiniteData, type UseInfiniteQueryResult } from '@tanstack/react-query';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';

interface TakenFile {
  readonly id: string;
  readonly fileName: string;
  readonly checksum: string;
  readonly at: string;
  readonly person: { readonly name: string };
}

/** Who took which file of a version; for those who answer for what was cut. */
export function DownloadsList({
  query,
}: {
  readonly query: UseInfiniteQueryResult<InfiniteData<{ readonly items: readonly TakenFile[] }>>;
}) {
  if (query.isPending) return <Skeleton className="h-16 w-full" />;
  if (query.isError && !query.data)
    return <ErrorState error={query.error} retry={() => void query.refetch()} />;
  const downloads = query.data.pages.flatMap((page) => page.items);
  if (downloads.length === 0)
    return <p className="text-graphite">Nobody has taken a file of this version yet.</p>;
  return (
    <>
      <ul className="divide-y divide-hair">
        {downloads.map((download) => (
          <li key={download.id} className="py-1.5">
            <p className="break-all font-semibold">{download.fileName}</p>
            <p className="text-xs text-graphite">
              {download.person.name}, <Moment at={download.at} />, {download.checksum.slice(0, 12)}
            </p>
          </li>
        ))}
      </ul>
      {query.hasNextPage && (
        <button
          type="button"
          className="min-h-8 text-xs underline underline-offset-4 pointer-coarse:min-h-11"
          onClick={() => void query.fetchNextPage()}
        >
          {query.isFetchingNextPage ? 'Fetching earlier downloads…' : 'Earlier downloads'}
        </button>
      )}
    </>
  );
}
