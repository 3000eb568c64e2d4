import { Link } from 'react-router';
import { type FileCheck } from '#server/contracts/cutting-list.ts';
import { shortDate } from '#client/app/dates.ts';
import { sheetVersionPath } from '#client/cut-sheets/paths.ts';
import { versionPath } from '#client/versions/standing.tsx';

const TONES: Readonly<Record<FileCheck['verdict'], string>> = {
  current: 'border-spruce text-spruce',
  superseded: 'border-brick text-brick',
  withdrawn: 'border-brick text-brick',
  draft: 'border-brick text-brick',
  unknown: 'border-amber text-amber',
};

/** The answer in one large line, and what to do. */
export function FileVerdict({ what, verdict }: { readonly what: string; readonly verdict: FileCheck }) {
  const of = verdict.what;
  const pathOf = (number: number) => {
    if (!of) return '';
    return of.kind === 'section' ? versionPath(of.id, number) : sheetVersionPath(of.id, number);
  };
  return (
    <div className={`flex flex-col gap-1 border-l-4 py-1 pl-3 ${TONES[verdict.verdict]}`}>
      <p className="text-xl font-semibold">{headlineOf(verdict)}</p>
      <p className="text-base text-ink">
        {of ? `${what}: ${of.fileName ?? of.name}, version ${String(of.versionNumber)} of ${of.name}.` : what}{' '}
        {verdict.reason}
      </p>
      {verdict.verdict !== 'current' && verdict.inForce !== null && of && (
        <p className="text-base text-ink">
          <Link
            className="inline-flex min-h-12 items-center font-semibold underline underline-offset-4"
            to={pathOf(verdict.inForce)}
          >
            Take version {verdict.inForce}, which is in force
          </Link>
        </p>
      )}
      {verdict.stale.map((source) => (
        <p key={source.sectionId} className="text-base text-amber">
          {source.sectionName} v{source.versionNumber}, which it is made from, is {source.status} now: ask the
          builder first.
        </p>
      ))}
    </div>
  );
}

function headlineOf({ verdict, inForce, since }: FileCheck): string {
  const from = since === null ? '' : ` since ${shortDate(since)}`;
  switch (verdict) {
    case 'current':
      return 'Current: this is the one to cut.';
    case 'superseded':
      return inForce === null
        ? `Superseded${from}: do not cut it.`
        : `Superseded by version ${String(inForce)}${from}: do not cut it.`;
    case 'withdrawn':
      return `Withdrawn${from}: do not cut it.`;
    case 'draft':
      return 'A draft: do not cut it.';
    case 'unknown':
      return 'Unknown here: this file was changed, or never came from this workshop.';
  }
}
