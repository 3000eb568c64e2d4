import { type ReactNode } from 'react';

interface EmptyStateProps {
  title: string;
  children?: ReactNode;
  /** The next step, usually one button. */
  action?: ReactNode;
}

/** Nothing here yet: says so and offers the next step. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-center gap-3 px-4 py-12 text-center">
      <svg viewBox="0 0 120 32" className="h-8 w-30 fill-none stroke-edge" aria-hidden="true">
        <path
          d="M6 17C6 9.5 20 7 40 7 68 7 94 12.6 114 17 94 20.4 66 23.4 38 23.4 20 23.4 6 22 6 17Z"
          strokeDasharray="4 3"
        />
        <path d="M0 17H120" strokeDasharray="12 3 2 3" strokeWidth="0.7" />
      </svg>
      <p className="text-base font-semibold">{title}</p>
      {children !== undefined && <div className="max-w-120 text-graphite">{children}</div>}
      {action}
    </div>
  );
}
