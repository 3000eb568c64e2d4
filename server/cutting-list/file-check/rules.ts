import { type FileCheck } from '#server/contracts/cutting-list.ts';
import { type SheetSource } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { type Reach } from '#server/sections/rules.ts';

/** The version that a file or a code belongs to, and how it stands. */
export interface Origin {
  readonly kind: 'section' | 'cut-sheet';
  readonly id: string;
  readonly name: string;
  readonly versionNumber: number;
  readonly status: VersionStatus;
  readonly statusReason: string;
  readonly statusAt: Date | null;
  readonly inForce: number | null;
  readonly archived: boolean;
  /** The section versions behind a cut sheet. */
  readonly sources: readonly SheetSource[];
  /** Null for a code. */
  readonly fileName: string | null;
  /** When it was first taken, if that alone is known of it; null for a code and for what was stored at release. */
  readonly takenAt: Date | null;
}

const nothing: Omit<FileCheck, 'verdict' | 'reason'> = { what: null, inForce: null, since: null, stale: [] };
const unknownFile: FileCheck = {
  ...nothing,
  verdict: 'unknown',
  reason: 'No file of this workshop has these bytes: do not cut it. Take the file again.',
};
const unknownCode: FileCheck = {
  ...nothing,
  verdict: 'unknown',
  reason: 'No cut sheet of this workshop bears this code: do not cut by it.',
};
const draft = 'Draft: do not cut.';

/** A file taken while its version was a draft says so in itself, and stays one when the version is released later. */
function wasDraft({ status, statusAt, takenAt }: Origin): boolean {
  if (status === 'draft') return true;
  return status === 'released' && takenAt !== null && statusAt !== null && takenAt < statusAt;
}

const order = ['released', 'superseded', 'withdrawn', 'draft'] as const satisfies VersionStatus[];

/** The origin that speaks for a file: the same bytes may have been taken often. */
function speaking(origins: readonly Origin[]): Origin | undefined {
  return [...origins].sort((a, b) => order.indexOf(a.status) - order.indexOf(b.status))[0];
}

function reasonOf(origin: Origin): string {
  if (origin.status !== 'released') return origin.statusReason;
  return origin.archived ? 'It is in the archive: ask before cutting.' : '';
}

/**
 * What is said of a file or a code. Who sees released versions only learns of a draft that it is one, and nothing else.
 *
 * @param origins everything that has these bytes or this code; none when nothing is known
 */
export function verdictOf(origins: readonly Origin[], by: 'file' | 'code', reach: Reach): FileCheck {
  const origin = speaking(origins);
  if (!origin) return by === 'file' ? unknownFile : unknownCode;
  const isDraft = wasDraft(origin);
  if (isDraft && reach === 'released') return { ...nothing, verdict: 'draft', reason: draft };
  const { kind, id, name, versionNumber, fileName, inForce } = origin;
  const what = { kind, id, name, versionNumber, fileName };
  const stale = origin.sources.filter(({ status }) => status !== 'released');
  if (isDraft) return { verdict: 'draft', what, inForce, since: null, reason: draft, stale };
  return {
    verdict: origin.status === 'released' ? 'current' : (origin.status as 'superseded' | 'withdrawn'),
    what,
    inForce,
    since: origin.statusAt?.toISOString() ?? null,
    reason: reasonOf(origin),
    stale,
  };
}
