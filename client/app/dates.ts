const YEAR = new Intl.DateTimeFormat(undefined, { day: 'numeric', month: 'short', year: 'numeric' });
const DAY = new Intl.DateTimeFormat(undefined, { day: 'numeric', month: 'short' });
const TIME = new Intl.DateTimeFormat(undefined, { hour: '2-digit', minute: '2-digit' });

/** Local and short: the time today, day and month this year, with the year before that. */
export function shortDate(iso: string, now: Date = new Date()): string {
  const at = new Date(iso);
  if (at.toDateString() === now.toDateString()) return TIME.format(at);
  return (at.getFullYear() === now.getFullYear() ? DAY : YEAR).format(at);
}
