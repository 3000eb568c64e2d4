import { type ReactNode, useId } from 'react';

/** A titled part of the column beside the sheet. */
export function Part({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="flex flex-col gap-2">
      <h2
        id={id}
        className="border-b border-rule pb-1 text-xs font-semibold tracking-wide text-graphite uppercase"
      >
        {title}
      </h2>
      {children}
    </section>
  );
}
