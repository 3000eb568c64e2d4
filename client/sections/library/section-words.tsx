import { StatusGlyph, StatusMark } from '#client/ui/status-mark.tsx';
import { type Section } from '#server/contracts/sections.ts';

/** Where a reader of the library goes: the sheet, or for who works from released files, the released version itself. */
export function sectionPath(section: Section, toReleased: boolean): string {
  const sheet = `/sections/${section.id}`;
  return toReleased ? `${sheet}/versions/${String(section.latest.number)}` : sheet;
}

/** The latest version's status, and the released version where that is an older one; `brief` fits one line. */
export function SectionStatus({ section, brief = false }: { section: Section; brief?: boolean }) {
  if (section.archived) return <StatusMark status="archived" />;
  const { latest, releasedNumber } = section;
  return (
    <>
      <StatusMark status={latest.status} />
      {releasedNumber !== null && releasedNumber !== latest.number && (
        <span className="flex items-center gap-1.5 text-xs whitespace-nowrap text-spruce">
          <StatusGlyph status="released" />v{releasedNumber}{' '}
          <span className={brief ? 'sr-only' : ''}>released</span>
        </span>
      )}
    </>
  );
}
