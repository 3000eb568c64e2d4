import { createContext, useContext } from 'react';
import { useChangeSection } from '#client/api/sections.ts';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { type Section } from '#server/contracts/sections.ts';

/** What came of the last action on a row; it stands above the list, because the row may have left it. */
export type LibraryEvent =
  | { readonly kind: 'archived'; readonly section: Section; readonly archived: boolean }
  | { readonly kind: 'failed'; readonly sentence: string };

export const LibraryNoticeContext = createContext<(event: LibraryEvent | null) => void>(() => undefined);

export function useLibraryNotice() {
  return useContext(LibraryNoticeContext);
}

export function LibraryNotice({ event }: { event: LibraryEvent }) {
  if (event.kind === 'failed') return <Notice tone="error">{event.sentence}</Notice>;
  return <ArchivedNotice section={event.section} archived={event.archived} />;
}

function ArchivedNotice({ section, archived }: { section: Section; archived: boolean }) {
  const notify = useLibraryNotice();
  const change = useChangeSection(section.id);
  return (
    <Notice tone={change.isError ? 'error' : 'good'} className="flex flex-wrap items-center gap-x-3 gap-y-1">
      {change.isError
        ? sentenceOf(change.error)
        : `"${section.name}" ${archived ? 'is archived.' : 'is back in the library.'}`}
      <Button
        size="small"
        busy={change.isPending}
        onClick={() => {
          change.mutate(
            { archived: !archived },
            {
              onSuccess: () => {
                notify(null);
              },
            },
          );
        }}
      >
        Undo
      </Button>
    </Notice>
  );
}
