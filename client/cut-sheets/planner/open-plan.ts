import { z } from 'zod';
import { type SheetDraft, sheetDraftInputSchema, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { type SheetDraftInput } from '#client/api/cut-sheets.ts';
import { type Mirror, mirrorIn } from '#client/sections/editor/draft-mirror.ts';
import { draftValues, type PlanValues, sameValues, valuesOf } from './plan-values.ts';

const mirroredSchema = sheetDraftInputSchema.extend({ at: z.number() });
export type MirroredPlan = z.infer<typeof mirroredSchema>;
export type PlanMirror = Mirror<SheetDraftInput, MirroredPlan>;

/** The copy in this browser of a person's plan that the server does not have yet. */
export function planMirror(
  store: Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>,
  personId: string,
  sheetId: string,
): PlanMirror {
  return mirrorIn(store, `ribwright.plan.${personId}.${sheetId}`, mirroredSchema);
}

export interface OpenedPlan {
  readonly values: PlanValues;
  readonly basedOn: number;
  /** What comes from this browser is news to the server. */
  readonly from: 'version' | 'server' | 'browser';
}

/** The plan to open: the newer of both drafts, as far as it is one, or else the version's. */
export function openPlan(
  version: SheetVersion,
  draft: SheetDraft | null,
  copy: MirroredPlan | null,
): OpenedPlan {
  const server = draft && draftValues(draft);
  const browser = copy && draftValues(copy);
  if (copy && browser && isNewer(copy, draft))
    return { values: browser, basedOn: copy.basedOn, from: 'browser' };
  if (draft && server) return { values: server, basedOn: draft.basedOn, from: 'server' };
  return { values: valuesOf(version.plan), basedOn: version.number, from: 'version' };
}

function isNewer(copy: MirroredPlan, draft: SheetDraft | null): boolean {
  if (!draft) return true;
  if (draft.basedOn === copy.basedOn && sameValues(draft.values, copy.values)) return false;
  return Date.parse(draft.updatedAt) < copy.at;
}
