import { type ReactNode } from 'react';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { shortDate } from '#client/app/dates.ts';

const thumbnail = { width: 148, height: 40 };
const frame = 'flex h-full w-44 shrink-0 flex-col border-t-2 px-2 pt-2';
const action =
  'my-1 h-6 rounded px-1 text-xs text-graphite underline decoration-rule underline-offset-4 hover:text-ink aria-pressed:bg-ink aria-pressed:text-sheet aria-pressed:no-underline pointer-coarse:my-0 pointer-coarse:h-11';

interface VersionCardProps {
  readonly version: SectionVersion;
  /** The one on the sheet now; marked by the rule above the card. */
  readonly current: boolean;
  readonly reachable: boolean;
  readonly ghost: boolean;
  readonly mayRestore: boolean;
  readonly onOpen: () => void;
  readonly onGhost: () => void;
  readonly onRestore: () => void;
}

/** One version in the strip: what it looks like, what was noted, and what can be done with it. */
export function VersionCard({
  version,
  current,
  reachable,
  ghost,
  mayRestore,
  ...actions
}: VersionCardProps) {
  const tabIndex = reachable ? 0 : -1;
  return (
    <li
      className={`${frame} ${current ? 'border-ink' : 'border-transparent'}`}
      aria-current={current || undefined}
    >
      <button
        type="button"
        className="flex w-full flex-col items-start text-left hover:bg-sheet"
        data-control="open"
        data-number={version.number}
        tabIndex={tabIndex}
        onClick={actions.onOpen}
      >
        <CardHead title={`v${version.number}`}>
          <StatusMark status={version.status} />
        </CardHead>
        <Thumbnail shape={version.shape} {...thumbnail} />
        <span className="h-4 w-full truncate text-xs" title={version.note || undefined}>
          {version.note || version.description}
        </span>
        <span className="h-4 w-full truncate text-xs text-graphite">
          {version.author.name}, {shortDate(version.createdAt)}
        </span>
      </button>
      <CardActions
        name={`version ${version.number}`}
        tabIndex={tabIndex}
        ghost={ghost}
        mayRestore={mayRestore}
        {...actions}
      />
    </li>
  );
}

interface CardActionsProps extends Pick<VersionCardProps, 'ghost' | 'mayRestore' | 'onGhost' | 'onRestore'> {
  readonly name: string;
  readonly tabIndex: number;
}

function CardActions({ name, tabIndex, ghost, mayRestore, onGhost, onRestore }: CardActionsProps) {
  return (
    <div className="flex gap-3">
      <button
        type="button"
        className={action}
        data-control="overlay"
        tabIndex={tabIndex}
        aria-pressed={ghost}
        aria-label={`overlay ${name}`}
        onClick={onGhost}
      >
        overlay
      </button>
      {mayRestore && (
        <button
          type="button"
          className={action}
          data-control="restore"
          tabIndex={tabIndex}
          aria-label={`restore ${name}`}
          onClick={onRestore}
        >
          restore
        </button>
      )}
    </div>
  );
}

/** The unsaved work at the end of the strip; the accent says that it is live. */
export function DraftCard({ shape, basedOn }: { readonly shape: Shape; readonly basedOn: number }) {
  return (
    <li className={`${frame} border-wire`} aria-current="true">
      <CardHead title="draft">
        <span className="text-graphite">on v{basedOn}</span>
      </CardHead>
      <Thumbnail shape={shape} {...thumbnail} />
      <span className="h-4 text-xs">not saved as a version</span>
    </li>
  );
}

function CardHead({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <span className="flex h-6 w-full items-baseline gap-2 text-xs">
      <span className="font-extrabold">{title}</span> {children}
    </span>
  );
}
