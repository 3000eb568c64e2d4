import { Skeleton } from '#client/ui/skeleton.tsx';
import { PlannerFrame, SHEET_PLACE } from './planner-frame.tsx';

/** The planner's places at their true sizes, while the sheet is fetched. */
export function PlannerSkeleton() {
  return (
    <PlannerFrame
      title="Cut sheet"
      header={
        <div
          role="status"
          aria-label="Loading the cut sheet"
          className="flex h-12 items-center xl:h-8 justify-between gap-4"
        >
          <Skeleton className="h-6 w-64" />
          <Skeleton className="hidden h-8 w-96 sm:block" />
        </div>
      }
      form={
        <div className="flex flex-col gap-6">
          <Skeleton className="h-72 w-full" />
          <Skeleton className="h-40 w-full" />
          <Skeleton className="h-64 w-full" />
        </div>
      }
      stage={
        <>
          <Skeleton className="h-7 w-full pointer-coarse:h-11" />
          <div data-place="sheet" className={SHEET_PLACE} />
          <Skeleton className="h-24 w-full" />
        </>
      }
      side={
        <>
          <Skeleton className="h-60 w-full" />
          <Skeleton className="h-40 w-full" />
        </>
      }
    />
  );
}
