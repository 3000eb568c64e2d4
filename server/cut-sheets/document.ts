import { type Plan } from '#geometry/cutting/plan.ts';
import { shortCodeOf } from '#server/contracts/sheet-plan.ts';
import { type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { sha256 } from '#server/sections/described.ts';

/** What a version keeps: the plan as people made it, and the same with shapes, machine and material in place of their ids. */
export interface SheetDocument {
  readonly plan: SheetPlan;
  readonly pinned: Plan;
}

/** A document as the database keeps it. */
interface DescribedDocument {
  /** Canonical JSON, and the SHA-256 of it. */
  readonly text: string;
  readonly checksum: string;
  readonly shortCode: string;
}

/** JSON with the keys of every object in order: equal values give equal text. */
export function canonicalText(value: unknown): string {
  return JSON.stringify(value, (_, inner: unknown) =>
    typeof inner === 'object' && inner !== null && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
}

/** The text names its sheet and number, so that checksum and short code belong to one version and no other. */
export function describeDocument(
  { plan, pinned }: SheetDocument,
  version: { readonly sheetId: string; readonly number: number },
): DescribedDocument {
  const { sheetId, number } = version;
  const text = canonicalText({ number, pinned, plan, sheetId });
  const checksum = sha256(text);
  return { text, checksum, shortCode: shortCodeOf(checksum) };
}

export function isSameDocument(a: SheetDocument, b: SheetDocument): boolean {
  const textOf = ({ plan, pinned }: SheetDocument) => canonicalText({ pinned, plan });
  return textOf(a) === textOf(b);
}

/** A plan with its ids in the one way in which they are stored: in small letters. */
export function withPlainIds(plan: SheetPlan): SheetPlan {
  const plain = (id: string | null) => id?.toLowerCase() ?? null;
  const { panel } = plan;
  return {
    ...plan,
    panel: {
      ...panel,
      root: { ...panel.root, sectionId: panel.root.sectionId.toLowerCase() },
      tip: { ...panel.tip, sectionId: panel.tip.sectionId.toLowerCase() },
    },
    machineId: plain(plan.machineId),
    materialId: plain(plan.materialId),
    ribMachineId: plain(plan.ribMachineId),
    ribMaterialId: plain(plan.ribMaterialId),
  };
}
