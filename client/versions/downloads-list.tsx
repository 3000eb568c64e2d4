import { useInfiniteQuery } from '@tanstack/react-query';
import { downloadsQuery } from '#client/api/sections.ts';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { Moment } from '#client/ui/moment.tsx';

/** Who took which file of this version; for those who answer for what was cut. */
export function DownloadsList({
  sectionId,
  number,
}: {
  readonly sectionId: string;
  readonly number: number;
}) {
  const query = useInfiniteQuery(downloadsQuery(sectionId, number));
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
