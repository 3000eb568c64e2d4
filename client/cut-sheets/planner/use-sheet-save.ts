import { useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { v4 } from 'uuid';
import { sheetConflictSchema, type SheetPlan, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import {
  dropSheetDraft,
  type SheetDraftInput,
  sheetVersionQuery,
  useSaveSheetVersion,
} from '#client/api/cut-sheets.ts';
import { fieldErrors, ProblemError } from '#client/api/request.ts';
import { type DraftKeeper } from '#client/sections/editor/draft-keeper.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';

type SaveStep =
  | { readonly step: 'closed' }
  | { readonly step: 'asking'; readonly refusal: string | null }
  | { readonly step: 'conflict'; readonly latest: SheetVersion };

interface SaveOptions {
  readonly sheetId: string;
  /** Null while the form does not hold a plan. */
  readonly plan: SheetPlan | null;
  readonly basedOn: number;
  readonly keeper: DraftKeeper<SheetDraftInput>;
  readonly onSaved: (version: SheetVersion) => void;
}

/** Saving a plan as a version: asking for a note, the save, and what to do when another version came in between. */
export function useSheetSave({ sheetId, plan, basedOn, keeper, onSaved }: SaveOptions) {
  const [save, setSave] = useState<SaveStep>({ step: 'closed' });
  const [note, setNote] = useState('');
  const mutation = useSaveSheetVersion(sheetId);
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
    if (!plan) return;
    setNote(typed);
    const body = { basedOn: on, plan, note: typed };
    try {
      const version = await mutation.mutateAsync({ ...body, key: keyOf(body) });
      intent.current = null;
      keeper.settle();
      client.setQueryData(sheetVersionQuery(sheetId, version.number).queryKey, version);
      onSaved(version);
      void dropSheetDraft(sheetId).catch(() => undefined);
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
    ask: () => setSave({ step: 'asking', refusal: null }),
    close: (typed: string) => {
      setNote(typed);
      setSave({ step: 'closed' });
    },
    run: (typed: string) => void run(basedOn, typed),
    /** After looking at both: the plan stands on the newer version and is saved as the one after it. */
    saveOnTop: (latest: SheetVersion) => void run(latest.number, note),
  };
}

function conflictOf(error: unknown): SheetVersion | null {
  if (!(error instanceof ProblemError) || error.status !== 409) return null;
  const conflict = sheetConflictSchema.safeParse(error.body);
  return conflict.success ? conflict.data.latest : null;
}

function refusalOf(error: unknown): string {
  const [field] = fieldErrors(error).values();
  return field ?? sentenceOf(error);
}
