import { type UseQueryResult } from '@tanstack/react-query';
import { Link } from 'react-router';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { ProblemError } from '#client/api/request.ts';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { versionPath } from '#client/versions/standing.tsx';
import { keyOf, type VersionRef } from './choice.ts';

/** A chosen version and what came of asking for it. */
export interface Entry {
  readonly ref: VersionRef;
  readonly tag: number;
  readonly query: Pick<UseQueryResult<SectionVersion>, 'data' | 'error' | 'isPending' | 'refetch'>;
}

interface ChosenListProps {
  readonly entries: readonly Entry[];
  readonly onRemove: (ref: VersionRef) => void;
  readonly onReference: (ref: VersionRef) => void;
}

/** The versions of the comparison, the reference first. */
export function ChosenList({ entries, onRemove, onReference }: ChosenListProps) {
  // The first that has arrived: one that cannot be seen is no reference.
  const reference = entries.find(({ query }) => query.data)?.tag;
  return (
    <ol className="divide-y divide-rule border-y border-rule">
      {entries.map(({ ref, tag, query }) => {
        const name = query.data ? `${query.data.sectionName} v${ref.number}` : `entry ${tag}, v${ref.number}`;
        return (
          <li key={keyOf(ref)} className="flex min-h-20 gap-3 py-2">
            <span className="font-extrabold">{tag}</span>
            <div className="min-w-0 flex-1">
              <EntryWords entry={{ ref, tag, query }} />
              <div className="mt-1 flex flex-wrap gap-2">
                {tag === reference && (
                  <span className="flex h-7 items-center text-xs text-graphite">reference</span>
                )}
                {tag !== reference && query.data && (
                  <Button
                    size="small"
                    className="pointer-coarse:h-11"
                    aria-label={`Make ${name} the reference`}
                    onClick={() => onReference(ref)}
                  >
                    {entries.length === 2 ? 'Swap' : 'Make reference'}
                  </Button>
                )}
                <Button
                  size="small"
                  variant="quiet"
                  className="pointer-coarse:h-11"
                  aria-label={`Remove ${name}`}
                  onClick={() => onRemove(ref)}
                >
                  Remove
                </Button>
              </div>
            </div>
          </li>
        );
      })}
    </ol>
  );
}

function EntryWords({ entry: { ref, query } }: { readonly entry: Entry }) {
  if (query.data) {
    return (
      <p className="flex flex-wrap items-baseline gap-x-3">
        <Link
          className="font-semibold break-words hover:underline"
          to={versionPath(ref.sectionId, ref.number)}
        >
          {query.data.sectionName} v{ref.number}
        </Link>
        <StatusMark status={query.data.status} />
      </p>
    );
  }
  if (query.isPending) return <p className="text-graphite">Version {ref.number} is being fetched.</p>;
  if (query.error instanceof ProblemError && query.error.status === 404) {
    return (
      <p className="text-brick">Version {ref.number}: not found, or not for you to see. The others stay.</p>
    );
  }
  return (
    <div className="text-brick">
      <p>
        Version {ref.number}: {sentenceOf(query.error)}
      </p>
      <Button size="small" className="mt-1" onClick={() => void query.refetch()}>
        Try again
      </Button>
    </div>
  );
}
