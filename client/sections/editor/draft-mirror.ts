import { z } from 'zod';
import { type Draft, draftInputSchema } from '#server/contracts/sections.ts';
import { type DraftInput } from '#client/api/sections.ts';
import { sameShape } from './present.ts';

const mirroredSchema = draftInputSchema.extend({ at: z.number() });
type MirroredDraft = z.infer<typeof mirroredSchema>;

/** The copy in the browser of work that the server does not have yet, one for each person and thing. */
export interface Mirror<Draft, Kept> {
  read(): Kept | null;
  write(draft: Draft, at: number): void;
  clear(): void;
}
export type DraftMirror = Mirror<DraftInput, MirroredDraft>;

type Store = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;

/** The mirror of a person's work on a section. */
export function draftMirror(store: Store, personId: string, sectionId: string): DraftMirror {
  return mirrorIn(store, `ribwright.draft.${personId}.${sectionId}`, mirroredSchema);
}

/** A full or forbidden store is no reason to stop: the server keeps the draft too. */
export function mirrorIn<Draft extends object, Kept>(
  store: Store,
  key: string,
  schema: z.ZodType<Kept>,
): Mirror<Draft, Kept> {
  return {
    read: () => attempt(() => parse(store.getItem(key), schema)),
    write: (draft, at) => {
      attempt(() => {
        store.setItem(key, JSON.stringify({ ...draft, at }));
      });
    },
    clear: () => {
      attempt(() => {
        store.removeItem(key);
      });
    },
  };
}

function attempt<Result>(action: () => Result): Result | null {
  try {
    return action();
  } catch {
    return null;
  }
}

function parse<Kept>(text: string | null, schema: z.ZodType<Kept>): Kept | null {
  if (text === null) return null;
  const read = schema.safeParse(JSON.parse(text));
  return read.success ? read.data : null;
}

export type ChosenDraft =
  | { readonly from: 'server' | 'browser'; readonly draft: DraftInput }
  | { readonly from: 'none'; readonly draft: null };

/**
 * Which unsaved work to open: the newer of the server's draft and the copy in this browser. A copy is there only
 * when the server had not confirmed it.
 */
export function chooseDraft(server: Draft | null, copy: MirroredDraft | null): ChosenDraft {
  if (copy === null)
    return server ? { from: 'server', draft: inputOf(server) } : { from: 'none', draft: null };
  if (server === null) return { from: 'browser', draft: inputOf(copy) };
  const same =
    server.basedOn === copy.basedOn && server.chordMm === copy.chordMm && sameShape(server.shape, copy.shape);
  if (same || Date.parse(server.updatedAt) >= copy.at) return { from: 'server', draft: inputOf(server) };
  return { from: 'browser', draft: inputOf(copy) };
}

function inputOf({ basedOn, shape, chordMm }: DraftInput): DraftInput {
  return { basedOn, shape, chordMm };
}
