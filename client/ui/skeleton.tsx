/** A grey bar of the size of what will stand there; give the size by class. */
export function Skeleton({ className = 'h-4 w-full' }: { className?: string | undefined }) {
  return <span aria-hidden="true" className={`block animate-pulse rounded bg-hair ${className}`} />;
}
