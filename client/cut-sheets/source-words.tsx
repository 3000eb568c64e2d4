import { Link } from 'react-router';
import { isStale, type SheetPart, type SheetSource } from '#server/contracts/cut-sheets.ts';
import { shortDate } from '#client/app/dates.ts';
import { versionPath } from '#client/versions/standing.tsx';

const PARTS: Readonly<Record<SheetPart, string>> = { core: 'core', ribs: 'ribs', templates: 'templates' };

/** "core, ribs, templates" */
export function partsText(parts: readonly SheetPart[]): string {
  return parts.map((part) => PARTS[part]).join(', ');
}

interface Ends {
  readonly root: SheetSource;
  readonly tip: SheetSource;
}

/** "Marsh 2412 v3", or both where root and tip differ. */
export function sourcesText({ root, tip }: Ends): string {
  const name = (source: SheetSource) => `${source.sectionName} v${String(source.versionNumber)}`;
  return name(root) === name(tip) ? name(root) : `${name(root)} to ${name(tip)}`;
}

/** The sources that are no longer in force, each once. */
export function staleSources({ root, tip }: Ends): readonly SheetSource[] {
  const stale = [root, tip].filter(({ status }) => status !== 'released');
  return stale.filter(
    (source, i) =>
      stale.findIndex(
        (other) => other.sectionId === source.sectionId && other.versionNumber === source.versionNumber,
      ) === i,
  );
}

/** Says of each section version that is no longer in force what became of it, and which one is. Nothing when all are. */
export function StaleNotice({ ends, large = false }: { readonly ends: Ends; readonly large?: boolean }) {
  if (!isStale(ends)) return null;
  return (
    <ul className={`border-l-[3px] border-amber py-1 pl-3 text-amber ${large ? 'text-base' : ''}`}>
      {staleSources(ends).map((source) => (
        <li key={`${source.sectionId} ${String(source.versionNumber)}`}>
          <StaleSource source={source} />
        </li>
      ))}
    </ul>
  );
}

function StaleSource({ source }: { readonly source: SheetSource }) {
  const { sectionId, sectionName, versionNumber, status, statusAt, inForce } = source;
  const since = statusAt === null ? '' : ` since ${shortDate(statusAt)}`;
  const what = status === 'draft' ? 'is not released' : `is ${status}${since}`;
  return (
    <>
      {sectionName} v{versionNumber} {what}.{' '}
      {inForce === null ? (
        'No version of it is in force.'
      ) : (
        <>
          <Link className="font-semibold underline underline-offset-4" to={versionPath(sectionId, inForce)}>
            Version {inForce}
          </Link>{' '}
          is in force.
        </>
      )}
    </>
  );
}
