import { lazy, Suspense, useState } from 'react';
import { useNavigate } from 'react-router';
import { itemNameSchema } from '#server/contracts/common.ts';
import { type CutSheet } from '#server/contracts/cut-sheets.ts';
import { useChangeCutSheet } from '#client/api/cut-sheets.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Menu, MenuItem, MenuRule } from '#client/ui/menu.tsx';
import { sheetPath, sheetVersionPath } from '../paths.ts';

const NameDialog = lazy(() => import('#client/ui/name-dialog.tsx'));

/** What can be done with a cut sheet of the list, besides opening it. */
export function SheetMenu({ sheet }: { readonly sheet: CutSheet }) {
  const navigate = useNavigate();
  const announce = useAnnounce();
  const change = useChangeCutSheet(sheet.id);
  const rename = useChangeCutSheet(sheet.id);
  const [renames, setRenames] = useState(false);
  const setArchived = (archived: boolean) =>
    change.mutate(
      { archived },
      {
        onSuccess: () => announce(`"${sheet.name}" ${archived ? 'is archived.' : 'is back in the list.'}`),
        onError: (error) => announce(`"${sheet.name}" is as it was. ${sentenceOf(error)}`),
      },
    );
  return (
    <>
      <Menu
        label={`Actions for ${sheet.name}`}
        trigger={
          <svg viewBox="0 0 16 4" className="w-4 fill-current" aria-hidden="true">
            <circle cx="2" cy="2" r="1.5" />
            <circle cx="8" cy="2" r="1.5" />
            <circle cx="14" cy="2" r="1.5" />
          </svg>
        }
        className="inline-flex size-8 items-center justify-center rounded text-graphite hover:text-ink aria-expanded:bg-sheet pointer-coarse:size-12"
      >
        <MenuItem onSelect={() => void navigate(sheetPath(sheet.id))}>Open the plan</MenuItem>
        <MenuItem onSelect={() => void navigate(sheetVersionPath(sheet.id, sheet.latest.number))}>
          Version {sheet.latest.number} and files
        </MenuItem>
        <MenuItem onSelect={() => setRenames(true)}>Name and purpose…</MenuItem>
        <MenuRule />
        <MenuItem onSelect={() => setArchived(!sheet.archived)}>
          {sheet.archived ? 'Take back from the archive' : 'Archive'}
        </MenuItem>
      </Menu>
      {renames && (
        <Suspense>
          <NameDialog
            named={sheet}
            nameSchema={itemNameSchema}
            change={rename}
            onClose={() => setRenames(false)}
          />
        </Suspense>
      )}
    </>
  );
}
