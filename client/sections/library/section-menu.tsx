import { lazy, Suspense, useState } from 'react';
import { useNavigate } from 'react-router';
import { useChangeSection } from '#client/api/sections.ts';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Menu, MenuItem, MenuRule } from '#client/ui/menu.tsx';
import { sectionNameSchema } from '#server/contracts/common.ts';
import { type Section } from '#server/contracts/sections.ts';
import { useLibraryNotice } from './library-notice.tsx';
import { sectionPath } from './section-words.tsx';

const NameDialog = lazy(() => import('#client/ui/name-dialog.tsx'));

/** What can be done with a section of the library, besides opening it. */
export function SectionMenu({ section }: { section: Section }) {
  const navigate = useNavigate();
  const notify = useLibraryNotice();
  const change = useChangeSection(section.id);
  const rename = useChangeSection(section.id);
  const [renames, setRenames] = useState(false);

  const setArchived = async (archived: boolean) => {
    try {
      await change.mutateAsync({ archived });
      notify({ kind: 'archived', section, archived });
    } catch (error) {
      notify({ kind: 'failed', sentence: `"${section.name}" is as it was. ${sentenceOf(error)}` });
    }
  };
  return (
    <>
      <Menu
        label={`Actions for ${section.name}`}
        trigger={<Dots />}
        className="inline-flex size-8 items-center justify-center rounded text-graphite hover:text-ink aria-expanded:bg-sheet pointer-coarse:size-12"
      >
        <MenuItem onSelect={() => void navigate(sectionPath(section, false))}>Open the sheet</MenuItem>
        <MenuItem onSelect={() => void navigate(sectionPath(section, true))}>
          Version {section.latest.number} and files
        </MenuItem>
        <MenuItem
          onSelect={() => {
            setRenames(true);
          }}
        >
          Name and purpose…
        </MenuItem>
        <MenuRule />
        <MenuItem onSelect={() => void setArchived(!section.archived)}>
          {section.archived ? 'Take back from the archive' : 'Archive'}
        </MenuItem>
      </Menu>
      {renames && (
        <Suspense>
          <NameDialog
            named={section}
            nameSchema={sectionNameSchema}
            change={rename}
            onClose={() => {
              setRenames(false);
            }}
          />
        </Suspense>
      )}
    </>
  );
}

function Dots() {
  return (
    <svg viewBox="0 0 16 4" className="w-4 fill-current" aria-hidden="true">
      <circle cx="2" cy="2" r="1.5" />
      <circle cx="8" cy="2" r="1.5" />
      <circle cx="14" cy="2" r="1.5" />
    </svg>
  );
}
