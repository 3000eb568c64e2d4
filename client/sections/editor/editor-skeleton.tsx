import { Skeleton } from '#client/ui/skeleton.tsx';
import { EditorFrame } from './editor-frame.tsx';

/** The editor's places at their true sizes, while the section is fetched. */
export function EditorSkeleton() {
  return (
    <EditorFrame
      title="Section"
      header={
        <div
          role="status"
          aria-label="Loading the section"
          className="flex h-12 items-center justify-between gap-4 max-sm:h-27 max-sm:items-start pointer-coarse:max-sm:h-30"
        >
          <Skeleton className="h-6 w-64" />
          <Skeleton className="hidden h-8 w-96 sm:block" />
        </div>
      }
      stage={
        <>
          <Skeleton className="h-8 w-full max-sm:h-7 pointer-coarse:h-11" />
          <div
            data-place="sheet"
            className="h-[min(34rem,150vw)] min-h-110 border border-rule bg-sheet lg:h-auto lg:flex-1"
          />
        </>
      }
      strip={<div className="h-40 border-t border-rule pointer-coarse:h-44" />}
      side={
        <>
          <Skeleton className="h-56 w-full" />
          <Skeleton className="h-52 w-full" />
        </>
      }
      print={null}
    />
  );
}
