import { shortDate } from '#client/app/dates.ts';

/** A point in time, local and short; the full ISO 8601 time is in its title. */
export function Moment({ at, className }: { at: string; className?: string | undefined }) {
  return (
    <time dateTime={at} title={at} className={className}>
      {shortDate(at)}
    </time>
  );
}
