import { Skeleton } from '#client/ui/skeleton.tsx';

/** The drawing and the column beside it, in their true size. */
export function SheetSkeleton() {
  return (
    <div
      className="grid gap-4 p-4 lg:grid-cols-[minmax(0,1fr)_22rem]"
      aria-busy="true"
      aria-label="Loading the cut sheet"
    >
      <div className="flex flex-col gap-4">
        <Skeleton className="h-8 w-80 max-w-full" />
        <Skeleton className="h-[70dvh] w-full" />
      </div>
      <Skeleton className="h-96 w-full" />
    </div>
  );
}
