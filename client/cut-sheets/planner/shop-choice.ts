import { PLAN_LIMITS } from '#geometry/cutting/plan.ts';
import { type Kerf, type Machine, type Material } from '#server/contracts/shop.ts';
import { type PlanValues, valueAt, withValue } from './plan-values.ts';

interface Shop {
  readonly materials: readonly Material[];
  readonly kerfs: readonly Kerf[];
}

/** The kerf that the shop knows for a machine in a material. */
export function kerfFor(kerfs: readonly Kerf[], machineId: unknown, materialId: unknown): Kerf | null {
  return kerfs.find((kerf) => kerf.machineId === machineId && kerf.materialId === materialId) ?? null;
}

/** Takes a machine or a foam: the kerf of the pair goes to both ends, and a block is no larger than the foam comes in. */
export function withShopChoice(
  values: PlanValues,
  path: 'machineId' | 'materialId',
  id: string | null,
  { materials, kerfs }: Shop,
): PlanValues {
  let next = withValue(values, path, id);
  const kerf = kerfFor(kerfs, next['machineId'], next['materialId']);
  if (kerf && kerf.kerfMm <= PLAN_LIMITS.kerfMm.max)
    next = withValue(next, 'kerfMm', { root: kerf.kerfMm, tip: kerf.kerfMm });
  const foam = materials.find((material) => material.id === id)?.settings;
  if (path !== 'materialId' || foam?.kind !== 'foam' || next['block'] === null) return next;
  const least = (at: string, most: number) => {
    const value = valueAt(next, at);
    return typeof value === 'number' ? Math.min(value, most) : most;
  };
  next = withValue(next, 'block.lengthMm', least('block.lengthMm', foam.blockLengthMm));
  next = withValue(next, 'block.spanMm', least('block.spanMm', foam.blockSpanMm));
  return withValue(next, 'block.heightMm', foam.blockHeightMm);
}

/** Takes a machine or a sheet material for the ribs: thickness and sheet as it comes, no larger than the machine's bed. */
export function withRibChoice(
  values: PlanValues,
  path: 'ribMachineId' | 'ribMaterialId',
  id: string | null,
  { machines, materials }: { readonly machines: readonly Machine[]; readonly materials: readonly Material[] },
): PlanValues {
  let next = withValue(values, path, id);
  if (next['ribs'] === null) return next;
  const sheet = materials.find((material) => material.id === next['ribMaterialId'])?.settings;
  const bed = machines.find((machine) => machine.id === next['ribMachineId'])?.settings;
  const [width, height] =
    bed && 'sheetWidthMm' in bed ? [bed.sheetWidthMm, bed.sheetHeightMm] : [Infinity, Infinity];
  if (sheet?.kind === 'sheet') {
    next = withValue(next, 'ribs.materialThicknessMm', sheet.thicknessMm);
    next = withValue(next, 'ribs.sheet.widthMm', Math.min(sheet.sheetWidthMm, width));
    next = withValue(next, 'ribs.sheet.heightMm', Math.min(sheet.sheetHeightMm, height));
  }
  return next;
}

/** "Kerf measured on 2026-03-01." or that nobody measured it. */
export function kerfWords(kerf: Kerf | null): string {
  if (!kerf) return 'No kerf of this machine in this foam is known: cut a test strip.';
  return kerf.measuredOn === null
    ? 'The shop’s kerf here is a default: a test strip must confirm it.'
    : `The shop’s kerf here was measured on ${kerf.measuredOn}.`;
}
