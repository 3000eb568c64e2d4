import { useState } from 'react';
import { Notice } from '#client/ui/notice.tsx';

/** Says that the work on the sheet came from this browser, because the server did not have it yet. */
export function OpenedNote() {
  const [read, setRead] = useState(false);
  if (read) return null;
  return (
    <Notice tone="caution" className="flex flex-wrap items-baseline gap-x-3 bg-sheet py-1 pr-3">
      This computer had newer work than the server; it is on the sheet and is being kept.
      <button
        type="button"
        className="text-ink underline underline-offset-4"
        onClick={() => {
          setRead(true);
        }}
      >
        Understood
      </button>
    </Notice>
  );
}
