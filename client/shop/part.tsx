import { type ReactNode, useEffect, useRef } from 'react';
import { Button } from '#client/ui/button.tsx';

/** A titled part of the screen. */
export function Part({
  title,
  action,
  children,
}: {
  title: string;
  action?: ReactNode;
  children: ReactNode;
}) {
  return (
    <section aria-label={title} className="mt-6">
      <div className="mb-1 flex min-h-8 flex-wrap items-end justify-between gap-2">
        <h2 className="text-base font-semibold">{title}</h2>
        {action}
      </div>
      {children}
    </section>
  );
}

export interface SideProps {
  title: string;
  /** A line under the title. */
  under?: ReactNode;
  onClose: () => void;
  /** The id of what gets the focus when the side is left. */
  returnTo: string;
  children: ReactNode;
}

/** What stands at the side: takes the focus when it opens, and gives it back to where it was opened. */
export function Side({ title, under, onClose, returnTo, children }: SideProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    heading.current?.focus();
    return () => document.getElementById(returnTo)?.focus();
  }, [returnTo]);
  return (
    <section aria-label={title} className="flex flex-col gap-4">
      <header className="flex items-start justify-between gap-3">
        <div className="min-w-0">
          <h2 ref={heading} tabIndex={-1} className="text-lg font-extrabold wrap-break-word outline-none">
            {title}
          </h2>
          {under !== undefined && <p className="text-xs text-graphite">{under}</p>}
        </div>
        <Button onClick={onClose}>Close</Button>
      </header>
      {children}
    </section>
  );
}
