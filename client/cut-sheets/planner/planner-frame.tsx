import { type ReactNode } from 'react';

interface PlannerFrameProps {
  /** Name of the sheet, for the window. */
  readonly title: string;
  readonly header: ReactNode;
  readonly form: ReactNode;
  readonly stage: ReactNode;
  readonly side: ReactNode;
  /** What prints, and dialogs. */
  readonly children?: ReactNode;
}

/**
 * Places of the planner: form, sheet, and what is to be known, beside each other where there is room; on a narrow screen the sheet comes
 * first and the form last.
 */
export function PlannerFrame({ title, header, form, stage, side, children }: PlannerFrameProps) {
  return (
    <div className="flex flex-1 flex-col xl:h-[calc(100dvh-2.75rem)] xl:min-h-180 xl:flex-none print:block print:h-auto print:min-h-0">
      <title>{`${title} · Ribwright`}</title>
      <div className="border-b border-rule px-4 py-2 print:hidden">{header}</div>
      <div className="grid min-h-0 flex-1 lg:grid-cols-[20rem_minmax(0,1fr)] lg:grid-rows-[auto_1fr] xl:grid-cols-[19.5rem_minmax(0,1fr)_17.5rem] xl:grid-rows-[minmax(0,1fr)] print:hidden">
        <div className="flex min-h-0 min-w-0 flex-col gap-2 p-3 lg:col-start-2 lg:row-start-1">{stage}</div>
        <aside
          aria-label="Findings and figures"
          className="flex min-w-0 flex-col gap-6 border-t border-rule p-4 md:max-xl:grid md:max-xl:grid-cols-2 md:max-xl:items-start md:max-xl:gap-8 lg:col-start-2 lg:row-start-2 xl:col-start-3 xl:row-start-1 xl:overflow-y-auto xl:border-t-0 xl:border-l"
        >
          {side}
        </aside>
        <div className="min-w-0 border-t border-rule p-4 lg:col-start-1 lg:row-span-2 lg:row-start-1 lg:border-t-0 lg:border-r xl:row-span-1 xl:overflow-y-auto">
          {form}
        </div>
      </div>
      {children}
    </div>
  );
}

/** The place of the sheet, at its true size from the first paint. */
export const SHEET_PLACE =
  'relative h-190 w-full shrink-0 overflow-hidden border border-rule bg-sheet md:h-160 xl:h-auto xl:min-h-100 xl:flex-1';
