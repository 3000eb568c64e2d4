import { type CutAction } from '#server/contracts/cutting-list.ts';
import { type SheetPart } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { refuseField } from '#server/refusal.ts';

/** How far the clock of a tablet may be ahead of ours, ms. */
const AHEAD_MS = 5 * 60_000;

/**
 * Whether something can have happened at that moment.
 * @throws Refusal naming `at` for a moment still to come
 */
export function checkMoment(at: Date, now: Date): void {
  if (at.getTime() <= now.getTime() + AHEAD_MS) return;
  throw refuseField('at', 'This moment has not come yet; look at the clock of this device.');
}

/** @throws Refusal naming `part` when the version does not make it */
export function checkPart(part: SheetPart, parts: readonly SheetPart[]): void {
  if (!parts.includes(part)) throw refuseField('part', `This version makes no ${part}.`);
}

/** One entry of the log of a part. */
export interface PartEntry {
  readonly id: string;
  readonly action: CutAction;
  readonly quantity: number;
  readonly machineId: string | null;
}

/** What the entries of a part come to. */
export interface PartCount {
  /** Good parts: those done, less those scrapped afterwards. */
  readonly done: number;
  readonly scrapped: number;
  /** Begun and neither done nor scrapped. */
  readonly open: number;
  /** The last start that is still open. */
  readonly openEntry: string | null;
}

interface OpenStart {
  readonly id: string;
  readonly machineId: string | null;
  left: number;
}

/** Ends as many open starts as it can, those at the same machine first, then the oldest. Returns how many were ended. */
function end(starts: OpenStart[], quantity: number, machineId: string | null): number {
  const isHere = (start: OpenStart) => machineId !== null && start.machineId === machineId;
  const inTurn = [...starts.filter(isHere), ...starts.filter((start) => !isHere(start))];
  let left = quantity;
  for (const start of inTurn) {
    const ended = Math.min(left, start.left);
    start.left -= ended;
    left -= ended;
  }
  return quantity - left;
}

/**
 * Counts the parts of one sheet version by its log. A part may be done without a start. What is scrapped is a part that was begun; when none
 * is open it is one that was done, as after an inspection, and another is wanted in its place.
 *
 * @param entries in the order in which they happened
 */
export function countParts(entries: readonly PartEntry[]): PartCount {
  const starts: OpenStart[] = [];
  let done = 0;
  let scrapped = 0;
  for (const { id, action, quantity, machineId } of entries) {
    if (action === 'started') {
      starts.push({ id, machineId, left: quantity });
      continue;
    }
    const ended = end(starts, quantity, machineId);
    if (action === 'done') done += quantity;
    else {
      scrapped += quantity;
      done = Math.max(0, done - (quantity - ended));
    }
  }
  const open = starts.filter(({ left }) => left > 0);
  return {
    done,
    scrapped,
    open: open.reduce((sum, { left }) => sum + left, 0),
    openEntry: open.at(-1)?.id ?? null,
  };
}

/** What decides whether a part stands in the cutting list. */
interface PartStanding {
  readonly status: VersionStatus;
  readonly archived: boolean;
  readonly wanted: number;
  readonly done: number;
  readonly open: number;
}

/**
 * Whether a part stands in the cutting list: what is begun stays until it is done or scrapped, whatever became of its version; what is
 * not begun waits while its version is in force and parts are wanted.
 */
export function isInList({ status, archived, wanted, done, open }: PartStanding): boolean {
  if (status === 'draft') return false;
  if (open > 0) return true;
  return status === 'released' && !archived && done < wanted;
}
