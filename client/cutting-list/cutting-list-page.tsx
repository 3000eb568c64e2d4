import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { cuttingListQuery } from '#client/api/cutting-list.ts';
import { useMe } from '#client/app/session.tsx';
import { buttonClass } from '#client/ui/button.tsx';
import { Caution } from '#client/ui/caution.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { ErrorState, sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { FileCheckPanel } from './file-check-panel.tsx';
import { groupsOf, withPending } from './grouping.ts';
import { JobRow } from './job-row.tsx';
import { OutboxNotice } from './outbox-notice.tsx';
import { useOutbox } from './use-outbox.ts';

/** What waits at the machines, in type that is read at arm's length. */
export function Component() {
  const { outbox, entries } = useOutbox();
  return (
    <div data-page="flowing" className="mx-auto flex w-full max-w-[80rem] flex-col gap-5 px-4 pt-4 pb-12">
      <title>Cutting list · Ribwright</title>
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
        <h1 className="text-xl font-extrabold">Cutting list</h1>
        <Link className={buttonClass('plain', 'large')} to="/inspections">
          Inspections
        </Link>
      </div>
      <FileCheckPanel />
      <Caution className="text-sm">
        Hot wire burns and its fumes harm: ventilate, keep an extinguisher at hand. Run each program once with
        a cold wire, check units and origin, keep the emergency stop in reach.
      </Caution>
      <OutboxNotice entries={entries} onDismiss={(key) => outbox.dismiss(key)} />
      <Jobs entries={entries} onLog={(log) => void outbox.add(log)} />
    </div>
  );
}

interface JobsProps {
  readonly entries: ReturnType<typeof useOutbox>['entries'];
  readonly onLog: (log: Parameters<ReturnType<typeof useOutbox>['outbox']['add']>[0]) => void;
}

function Jobs({ entries, onLog }: JobsProps) {
  const { id, name } = useMe();
  const list = useQuery(cuttingListQuery());
  const retry = () => void list.refetch();
  if (list.isPending) {
    return (
      <ul aria-busy="true" aria-label="Loading the cutting list" className="flex flex-col gap-2.5">
        {Array.from({ length: 4 }, (_, row) => (
          <li key={row} className="h-32 rounded border border-rule bg-sheet" />
        ))}
      </ul>
    );
  }
  if (!list.data) {
    return <ErrorState title="The cutting list could not be loaded." error={list.error} retry={retry} />;
  }
  const groups = groupsOf(withPending(list.data, entries, { id, name }));
  return (
    <>
      {list.isError && (
        <Notice tone="error">{sentenceOf(list.error)} What is shown was loaded before.</Notice>
      )}
      {groups.length === 0 && (
        <EmptyState title="Nothing waits.">
          As soon as a builder releases a cut sheet, its parts stand here by machine and material.
        </EmptyState>
      )}
      {groups.map(({ key, title, items }) => (
        <section key={key} aria-label={title} className="flex flex-col gap-2.5">
          <h2 className="text-lg font-semibold">{title}</h2>
          <ul className="flex flex-col gap-2.5">
            {items.map((item) => (
              <JobRow
                key={`${item.sheetId} ${String(item.versionNumber)} ${item.part}`}
                item={item}
                onLog={onLog}
              />
            ))}
          </ul>
        </section>
      ))}
    </>
  );
}
