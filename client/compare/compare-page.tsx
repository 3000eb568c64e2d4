import { useQueries } from '@tanstack/react-query';
import { useMemo, useRef, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { versionQuery } from '#client/api/sections.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { useMe } from '#client/app/session.tsx';
import { useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import {
  type Choice,
  choiceOf,
  keyOf,
  MOST_VERSIONS,
  searchOf,
  type VersionRef,
  withReference,
} from './choice.ts';
import { ChooseDialog } from './choose-dialog.tsx';
import { ChosenList, type Entry } from './chosen-list.tsx';
import { CompareSheet } from './compare-sheet.tsx';
import { compare } from './comparison.ts';
import { Controls } from './controls.tsx';
import { ValueTables } from './value-tables.tsx';

/** The route of a comparison: up to six versions laid on each other. The address carries the whole choice. */
export function Component() {
  const { choice, dropped, change } = useChoice();
  const entries = useEntries(choice.versions);
  const [choosing, setChoosing] = useState(false);
  const add = useRef<HTMLButtonElement>(null);
  const { choose, remove, makeReference } = useChanges(choice.versions, change);
  const full = choice.versions.length === MOST_VERSIONS;
  const chooseHere = (ref: VersionRef) => {
    choose(ref);
    setChoosing(false);
  };
  const removeHere = (ref: VersionRef) => {
    remove(ref);
    // The pressed button is gone with its version.
    add.current?.focus();
  };
  return (
    <div data-page="flowing" className="grid flex-1 lg:grid-cols-[minmax(0,1fr)_22rem] print:block">
      <title>Compare · Ribwright</title>
      <div className="flex min-w-0 flex-col gap-4 p-4 print:p-0">
        <header className="flex min-h-8 flex-wrap items-center justify-between gap-2 print:hidden">
          <h1 className="text-xl font-extrabold">Compare</h1>
          {entries.length > 0 && <Button onClick={() => window.print()}>Print</Button>}
        </header>
        {dropped.length > 0 && (
          <Notice tone="caution" className="print:hidden">
            {dropped.map((sentence, index) => (
              <p key={`${index} ${sentence}`}>{sentence}</p>
            ))}
          </Notice>
        )}
        <Comparison entries={entries} choice={choice} onAdd={() => setChoosing(true)} />
      </div>
      <aside
        aria-label="What is compared"
        className="flex flex-col gap-4 border-t border-rule p-4 lg:border-t-0 lg:border-l print:hidden"
      >
        <h2 className="font-semibold">Versions</h2>
        {entries.length > 0 && (
          <ChosenList entries={entries} onRemove={removeHere} onReference={makeReference} />
        )}
        <Button ref={add} aria-disabled={full} onClick={() => !full && setChoosing(true)}>
          Add a version…
        </Button>
        {full && (
          <p className="text-xs text-graphite">Six versions are the most. Remove one to add another.</p>
        )}
        <Controls choice={choice} onChange={change} />
      </aside>
      {choosing && (
        <ChooseDialog chosen={choice.versions} onChoose={chooseHere} onClose={() => setChoosing(false)} />
      )}
    </div>
  );
}

/** The choice as the address has it; a change is a new address. */
function useChoice() {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const { choice, dropped } = useMemo(() => choiceOf(search), [search]);
  const change = (part: Partial<Choice>) => {
    void navigate({ search: searchOf({ ...choice, ...part }) }, { replace: true });
  };
  return { choice, dropped, change };
}

/** What can be done with the list of versions; each is said to screen readers. */
function useChanges(versions: readonly VersionRef[], change: (part: Partial<Choice>) => void) {
  const announce = useAnnounce();
  const choose = ({ sectionId, number }: VersionRef) => {
    change({ versions: [...versions, { sectionId, number }] });
    announce(`Version ${number} added as number ${versions.length + 1}.`);
  };
  const remove = (ref: VersionRef) => {
    change({ versions: versions.filter((one) => keyOf(one) !== keyOf(ref)) });
    announce(`Version ${ref.number} removed.`);
  };
  const makeReference = (ref: VersionRef) => {
    change({ versions: withReference(versions, ref) });
    announce(`Version ${ref.number} is the reference now.`);
  };
  return { choose, remove, makeReference };
}

function useEntries(versions: readonly VersionRef[]): Entry[] {
  const queries = useQueries({ queries: versions.map((ref) => versionQuery(ref.sectionId, ref.number)) });
  return versions.flatMap((ref, index): Entry[] => {
    const query = queries[index];
    return query ? [{ ref, tag: index + 1, query }] : [];
  });
}

interface ComparisonProps {
  readonly entries: readonly Entry[];
  readonly choice: Choice;
  readonly onAdd: () => void;
}

function Comparison({ entries, choice, onAdd }: ComparisonProps) {
  const owner = useMe().workshop.name;
  const units = useUnits();
  const { alignment, chordMm } = choice;
  const loaded = entries.flatMap(({ tag, query }) => (query.data ? [{ tag, version: query.data }] : []));
  const compared = useCompared(loaded, alignment);
  if (entries.length === 0) {
    return (
      <EmptyState title="Choose two versions." action={<Button onClick={onAdd}>Choose the first…</Button>}>
        Versions of any sections are laid on each other, and what lies between them is measured. The first is
        the reference.
      </EmptyState>
    );
  }
  if (entries.some(({ query }) => query.isPending)) return <ComparisonSkeleton />;
  if (loaded.length === 0) {
    return (
      <EmptyState
        title="None of these versions can be shown."
        action={<Button onClick={onAdd}>Add another…</Button>}
      >
        The list says why for each of them.
      </EmptyState>
    );
  }
  return (
    <>
      {loaded.length === 1 && (
        <p className="print:hidden">Only one version is here. Add another to lay it on this one.</p>
      )}
      <div className="lg:max-w-[calc((100dvh-9rem)*1.5)] print:max-w-none">
        <CompareSheet compared={compared} choice={choice} owner={owner} />
      </div>
      <ValueTables compared={compared} chordMm={chordMm} units={units} />
    </>
  );
}

/** Laid and measured again only when a version or the alignment is another. */
function useCompared(
  loaded: readonly { readonly tag: number; readonly version: SectionVersion }[],
  alignment: Choice['alignment'],
) {
  const key = loaded.map(({ tag, version }) => `${tag} ${version.id} ${version.status}`).join();
  // eslint-disable-next-line react-hooks/exhaustive-deps -- the key stands for the versions, which never change
  return useMemo(() => compare(loaded, alignment), [key, alignment]);
}

function ComparisonSkeleton() {
  return (
    <div aria-busy="true" aria-label="Loading the versions" role="status" className="flex flex-col gap-4">
      <div className="lg:max-w-[calc((100dvh-9rem)*1.5)]">
        <Skeleton className="aspect-[5/8] w-full sm:aspect-[3/2]" />
      </div>
      <Skeleton className="h-96 w-full" />
    </div>
  );
}
