import { Skeleton } from '#client/ui/skeleton.tsx';
import { Mark } from './mark.tsx';

/** Holds the place of the shell while the session is read. */
export function ShellSkeleton() {
  return (
    <div
      className="flex h-11 items-center gap-5 border-b border-rule px-4 pointer-coarse:h-13"
      aria-busy="true"
    >
      <Mark />
      <span className="sr-only">Loading</span>
      <Skeleton className="ml-auto h-8 w-32" />
    </div>
  );
}
