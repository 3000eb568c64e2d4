import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useRef, useState } from 'react';
import { v4 } from 'uuid';
import { type SectionVersion, versionConflictSchema } from '#server/contracts/sections.ts';
import { fieldErrors, ProblemError } from '#client/api/request.ts';
import { dropDraft, useSaveVersion, versionQuery } from '#client/api/sections.ts';
import { shapeSentence } from '#client/app/shape-words.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { type DraftKeeper } from './draft-keeper.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type EditorAction } from './editor-state.ts';
import { closeForm } from './present.ts';

type SaveStep =
  | { readonly step: 'closed' }
  | { readonly step: 'asking'; readonly refusal: string | null }
  | { readonly step: 'conflict'; readonly latest: SectionVersion };

interface SaveOptions {
  readonly sectionId: string;
  /** What is saved, and the version it stands on. */
  readonly shape: Shape;
  readonly basedOn: number;
  readonly dispatch: (action: EditorAction) => void;
  readonly keeper: DraftKeeper;
}

/** Saving as a version: asking for a note, the save itself, and what to do when another version came in between. */
export function useSave({ sectionId, shape, basedOn, dispatch, keeper }: SaveOptions) {
  const [save, setSave] = useState<SaveStep>({ step: 'closed' });
  const [note, setNote] = useState('');
  const mutation = useSaveVersion(sectionId);
  const announce = useAnnounce();
  const client = useQueryClient();
  const intent = useRef<{ readonly of: string; readonly key: string } | null>(null);

  /** One key for one intended version: trying the same again after a lost answer does not save it twice. */
  const keyOf = (body: object): string => {
    const of = JSON.stringify(body);
    if (intent.current?.of !== of) intent.current = { of, key: v4() };
    return intent.current.key;
  };
  const run = async (on: number, typed: string) => {
    setNote(typed);
    const body = { basedOn: on, shape: closeForm(shape), note: typed };
    try {
      const version = await mutation.mutateAsync({ ...body, key: keyOf(body) });
      intent.current = null;
      keeper.settle();
      client.setQueryData(versionQuery(sectionId, version.number).queryKey, version);
      dispatch({ type: 'saved', number: version.number });
      void dropDraft(sectionId).catch(() => undefined);
      setNote('');
      setSave({ step: 'closed' });
      announce(`Saved as version ${version.number}.`);
    } catch (error) {
      const latest = conflictOf(error);
      setSave(latest ? { step: 'conflict', latest } : { step: 'asking', refusal: refusalOf(error) });
    }
  };
  return {
    save,
    note,
    busy: mutation.isPending,
    ask: useCallback(() => {
      setSave({ step: 'asking', refusal: null });
    }, []),
    close: (typed: string) => {
      setNote(typed);
      setSave({ step: 'closed' });
    },
    run: (typed: string) => void run(basedOn, typed),
    /** After looking at both: the work stands on the newer version from now on, and is saved as the one after it. */
    saveOnTop: (latest: SectionVersion) => {
      dispatch({ type: 'rebase', number: latest.number });
      void run(latest.number, note);
    },
  };
}

function conflictOf(error: unknown): SectionVersion | null {
  if (!(error instanceof ProblemError) || error.status !== 409) return null;
  const conflict = versionConflictSchema.safeParse(error.body);
  return conflict.success ? conflict.data.latest : null;
}

function refusalOf(error: unknown): string {
  const [field] = fieldErrors(error).values();
  if (field !== undefined) return shapeSentence(field);
  return error instanceof Error ? shapeSentence(error.message) : 'The reason is not known.';
}
