import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router';
import { type Draft, type Section } from '#server/contracts/sections.ts';
import { draftQuery, sectionQuery, versionQuery } from '#client/api/sections.ts';
import { useMay } from '#client/app/session.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { type ChosenDraft, chooseDraft } from './draft-mirror.ts';
import { EditorSkeleton } from './editor-skeleton.tsx';
import { EditorWorkspace } from './editor-workspace.tsx';
import { FIRST_CHORD_MM, hasEqualNose, sameShape } from './present.ts';
import { ReadOnlySheet } from './read-only-sheet.tsx';
import { useDraftMirror } from './use-draft-keeper.ts';

/** One section: its editor for who may write, its sheet for everybody else. */
export function Component() {
  const { sectionId = '' } = useParams();
  return <SectionScreen key={sectionId} sectionId={sectionId} />;
}

function SectionScreen({ sectionId }: { sectionId: string }) {
  const section = useQuery(sectionQuery(sectionId));
  const mayWrite = useMay('sections.write');
  if (section.data) {
    return mayWrite ? <WriterScreen section={section.data} /> : <ReaderScreen section={section.data} />;
  }
  if (section.isError) return <ErrorState error={section.error} retry={() => void section.refetch()} />;
  return <EditorSkeleton />;
}

function ReaderScreen({ section }: { section: Section }) {
  const version = useQuery(versionQuery(section.id, section.latest.number));
  if (version.data)
    return <ReadOnlySheet key={version.data.number} section={section} version={version.data} />;
  if (version.isError) return <ErrorState error={version.error} retry={() => void version.refetch()} />;
  return <EditorSkeleton />;
}

/** Fetches the person's draft once; what happens to it afterwards is the editor's own. */
function WriterScreen({ section }: { section: Section }) {
  const draft = useQuery({ ...draftQuery(section.id), staleTime: Infinity, gcTime: 0 });
  if (draft.data !== undefined) return <OpenedSection section={section} serverDraft={draft.data} />;
  if (draft.isError) return <ErrorState error={draft.error} retry={() => void draft.refetch()} />;
  return <EditorSkeleton />;
}

function OpenedSection({ section, serverDraft }: { section: Section; serverDraft: Draft | null }) {
  const mirror = useDraftMirror(section.id);
  const [chosen] = useState(() => chooseDraft(serverDraft, mirror.read()));
  const [number] = useState(() => standingOn(chosen.draft, section));
  const base = useQuery(versionQuery(section.id, number));
  if (base.isError && !base.data) return <ErrorState error={base.error} retry={() => void base.refetch()} />;
  if (!base.data) return <EditorSkeleton />;
  const shape = chosen.draft?.shape ?? base.data.shape;
  return (
    <EditorWorkspace
      section={section}
      base={base.data}
      start={{ shape, chordMm: chosen.draft?.chordMm ?? FIRST_CHORD_MM, equalNose: hasEqualNose(shape) }}
      from={chosen.from}
      mirror={mirror}
    />
  );
}

/** A draft that is the newest version itself (its save and its last keeping crossed) stands on that version. */
function standingOn(draft: ChosenDraft['draft'], { latest }: Section): number {
  return draft === null || sameShape(draft.shape, latest.shape) ? latest.number : draft.basedOn;
}
