import { useMay } from '#client/app/session.tsx';
import { Button } from '#client/ui/button.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { type ListAddress } from './list-address.ts';

interface NoSectionsProps {
  address: ListAddress;
  onChange: (change: Partial<ListAddress>) => void;
  onNew: (() => void) | undefined;
}

/** Nothing to list: because of the filters, or because there is nothing yet. */
export function NoSections({ address, onChange, onNew }: NoSectionsProps) {
  const readsAll = useMay('sections.read');
  const filtered =
    Boolean(address.search) || address.kind !== undefined || (readsAll && address.status !== undefined);
  if (filtered) {
    const clear = { search: undefined, kind: undefined, ...(readsAll ? { status: undefined } : {}) };
    return (
      <EmptyState
        title={address.search ? `No section matches "${address.search}".` : 'No section is of this kind.'}
        action={
          <Button
            onClick={() => {
              onChange(clear);
            }}
          >
            Clear search and filters
          </Button>
        }
      >
        The search looks at name, purpose and designation.
      </EmptyState>
    );
  }
  if (!readsAll) {
    return (
      <EmptyState title="Nothing is released yet.">
        As soon as a designer releases a version, its files stand here.
      </EmptyState>
    );
  }
  return (
    <EmptyState
      title="No section yet."
      action={
        onNew && (
          <Button variant="primary" onClick={onNew}>
            New section
          </Button>
        )
      }
    >
      Begin with a designation such as 2412, or with your own values, and shape it on the sheet.
    </EmptyState>
  );
}
