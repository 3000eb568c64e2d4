import { type ReactNode } from 'react';

/** A sentence about harm, where the action is: an amber rule at the left. */
export function Caution({
  children,
  className = '',
}: {
  children: ReactNode;
  className?: string | undefined;
}) {
  return <div className={`border-l-2 border-amber pl-3 text-xs text-graphite ${className}`}>{children}</div>;
}
