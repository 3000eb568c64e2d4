import { type VersionStatus } from '#server/contracts/sections.ts';

type Status = VersionStatus | 'archived';

const COLOURS: Readonly<Record<Status, string>> = {
  released: 'text-spruce',
  draft: 'text-amber',
  superseded: 'text-graphite',
  withdrawn: 'text-brick',
  archived: 'text-graphite',
};

/** The status by shape and word: released ●, draft ◌, superseded ◐, withdrawn ⊘. Colour only helps. */
export function StatusMark({ status, className = '' }: { status: Status; className?: string | undefined }) {
  return (
    <span className={`inline-flex items-center gap-1.5 whitespace-nowrap ${COLOURS[status]} ${className}`}>
      <StatusGlyph status={status} />
      {status}
    </span>
  );
}

/** Drawn, not typed: the signs are missing in the type and would come from any font at any width. */
export function StatusGlyph({
  status,
  className = 'size-[0.8em]',
}: {
  status: Status;
  className?: string | undefined;
}) {
  return (
    <svg
      viewBox="0 0 12 12"
      className={`shrink-0 fill-none stroke-current stroke-[1.4] ${className}`}
      aria-hidden="true"
    >
      {status === 'released' && <circle cx="6" cy="6" r="5" className="fill-current stroke-none" />}
      {status === 'draft' && <circle cx="6" cy="6" r="5" strokeDasharray="1.9 2.02" />}
      {status === 'superseded' && (
        <>
          <circle cx="6" cy="6" r="5" />
          <path d="M6 1A5 5 0 0 0 6 11Z" className="fill-current" />
        </>
      )}
      {status === 'withdrawn' && (
        <>
          <circle cx="6" cy="6" r="5" />
          <path d="M2.5 9.5 9.5 2.5" />
        </>
      )}
      {status === 'archived' && <path d="M1.2 2.2H10.8V4.8H1.2ZM2.2 4.8V10.4H9.8V4.8M4.5 7H7.5" />}
    </svg>
  );
}
