import { useInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { type Section } from '#server/contracts/sections.ts';
import { sectionsQuery, versionsQuery } from '#client/api/sections.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { SearchField } from '#client/ui/search-field.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { includes, type VersionRef } from './choice.ts';

interface ChooseDialogProps {
  readonly chosen: readonly VersionRef[];
  readonly onChoose: (ref: VersionRef) => void;
  readonly onClose: () => void;
}

/** First the section, found by name, then one of its versions. */
export function ChooseDialog({ chosen, onChoose, onClose }: ChooseDialogProps) {
  const [section, setSection] = useState<Section | null>(null);
  return (
    <Dialog
      title={section ? `A version of ${section.name}` : 'Add a version'}
      onClose={onClose}
      actions={section ? <Button onClick={() => setSection(null)}>Another section</Button> : undefined}
    >
      <div className="min-h-96">
        {section ? (
          <Versions section={section} chosen={chosen} onChoose={onChoose} />
        ) : (
          <Sections onSection={setSection} />
        )}
      </div>
    </Dialog>
  );
}

const line =
  'flex min-h-12 w-full items-center gap-3 px-2 py-1 text-left hover:bg-sheet disabled:cursor-not-allowed disabled:text-graphite';

function Sections({ onSection }: { readonly onSection: (section: Section) => void }) {
  const [search, setSearch] = useState('');
  const query = useInfiniteQuery(sectionsQuery({ sort: 'name', ...(search === '' ? {} : { search }) }));
  const sections = query.data?.pages.flatMap(({ items }) => items) ?? [];
  return (
    <div className="flex flex-col gap-3">
      <SearchField label="Search sections" value={search} onSearch={setSearch} />
      <Waiting query={query} />
      {query.data && sections.length === 0 && <p className="text-graphite">No section is found.</p>}
      <ul className="divide-y divide-rule">
        {sections.map((section) => (
          <li key={section.id}>
            <button type="button" className={line} onClick={() => onSection(section)}>
              <Thumbnail shape={section.latest.shape} width={88} height={24} />
              <span className="min-w-0 flex-1">
                <span className="block truncate font-semibold">{section.name}</span>
                <span className="block truncate text-xs text-graphite">{section.latest.description}</span>
              </span>
            </button>
          </li>
        ))}
      </ul>
      <More query={query} />
    </div>
  );
}

interface VersionsProps {
  readonly section: Section;
  readonly chosen: readonly VersionRef[];
  readonly onChoose: (ref: VersionRef) => void;
}

function Versions({ section, chosen, onChoose }: VersionsProps) {
  const query = useInfiniteQuery(versionsQuery(section.id));
  const versions = query.data?.pages.flatMap(({ items }) => items) ?? [];
  return (
    <div className="flex flex-col gap-3">
      <Waiting query={query} />
      <ul className="divide-y divide-rule">
        {versions.map((version) => {
          const there = includes(chosen, version);
          return (
            <li key={version.id}>
              <button type="button" className={line} disabled={there} onClick={() => onChoose(version)}>
                <Thumbnail shape={version.shape} width={88} height={24} />
                <span className="min-w-0 flex-1">
                  <span className="flex flex-wrap items-baseline gap-x-3">
                    <span className="font-extrabold">v{version.number}</span>
                    <StatusMark status={version.status} />
                    {there && <span className="text-xs">in the comparison</span>}
                  </span>
                  <span className="block truncate text-xs text-graphite">
                    {version.note || version.description}
                  </span>
                </span>
              </button>
            </li>
          );
        })}
      </ul>
      <More query={query} />
    </div>
  );
}

interface PagedQuery {
  readonly isPending: boolean;
  readonly isError: boolean;
  readonly error: unknown;
  readonly hasNextPage: boolean;
  readonly isFetchingNextPage: boolean;
  readonly refetch: () => unknown;
  readonly fetchNextPage: () => unknown;
}

function Waiting({ query }: { readonly query: PagedQuery }) {
  if (query.isPending) return <Skeleton className="h-72 w-full" />;
  return query.isError ? <ErrorState error={query.error} retry={() => void query.refetch()} /> : null;
}

function More({ query }: { readonly query: PagedQuery }) {
  if (!query.hasNextPage) return null;
  return (
    <Button busy={query.isFetchingNextPage} onClick={() => void query.fetchNextPage()}>
      Show more
    </Button>
  );
}
