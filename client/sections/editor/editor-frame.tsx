import { type ReactNode } from 'react';

interface EditorFrameProps {
  /** Name of the section, for the window. */
  readonly title: string;
  readonly header: ReactNode;
  readonly note?: ReactNode;
  readonly stage: ReactNode;
  readonly strip: ReactNode;
  readonly side: ReactNode;
  readonly print: ReactNode;
  /** Dialogs. */
  readonly children?: ReactNode;
}

/** Places of the editor: the sheet is the largest; the list stands beside it, or below it on a narrow screen. */
export function EditorFrame({ title, header, note, stage, strip, side, print, children }: EditorFrameProps) {
  return (
    <div className="grid flex-1 lg:h-[calc(100dvh-2.75rem)] lg:min-h-190 lg:flex-none lg:grid-cols-[minmax(0,1fr)_20rem] xl:grid-cols-[minmax(0,1fr)_24rem] lg:grid-rows-[minmax(0,1fr)_auto] print:block print:h-auto print:min-h-0">
      <title>{`${title} · Ribwright`}</title>
      <div className="flex min-h-0 min-w-0 flex-col gap-2 p-3 lg:pr-4 print:hidden">
        {header}
        {note}
        {stage}
      </div>
      <aside
        aria-label="Values of the section"
        className="flex min-w-0 flex-col gap-5 md:max-lg:grid md:max-lg:grid-cols-2 md:max-lg:gap-8 border-t border-rule p-4 lg:row-span-2 lg:overflow-y-auto lg:border-t-0 lg:border-l print:hidden"
      >
        {side}
      </aside>
      <div className="min-w-0 print:hidden">{strip}</div>
      {print}
      {children}
    </div>
  );
}
