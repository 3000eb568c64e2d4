import { type Plan } from '#geometry/cutting/plan.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type SheetPart, type SheetPlan } from './cut-sheets.ts';
import { type MachineSettings, type MaterialSettings } from './shop.ts';

interface Named<Settings> {
  readonly name: string;
  readonly settings: Settings;
}

/** What the ids of a plan stand for. */
export interface PlanSources {
  readonly root: Shape;
  readonly tip: Shape;
  readonly machine: Named<MachineSettings> | null;
  readonly material: Named<MaterialSettings> | null;
}

/** The plan with shapes, machine and material in the place of their ids: what geometry/cutting works out. A hand bow needs no program. */
export function resolvePlan(plan: SheetPlan, { root, tip, machine, material }: PlanSources): Plan {
  const {
    machineId: _machine,
    materialId: _material,
    ribMachineId: _ribs,
    ribMaterialId: _sheet,
    ...rest
  } = plan;
  const { quantity: _quantity, paper: _paper, panel, ...values } = rest;
  return {
    ...values,
    panel: {
      ...panel,
      root: { shape: root, chordMm: panel.root.chordMm },
      tip: { shape: tip, chordMm: panel.tip.chordMm },
    },
    machine: wireMachineOf(machine),
    material: foamOf(material),
  };
}

function wireMachineOf(machine: PlanSources['machine']): Plan['machine'] {
  if (machine?.settings.kind !== 'wire') return null;
  const { kind: _, ...settings } = machine.settings;
  return { name: machine.name, ...settings };
}

function foamOf(material: PlanSources['material']): Plan['material'] {
  if (material?.settings.kind !== 'foam') return null;
  const { densityKgM3, feedMmMin, maxFeedMmMin } = material.settings;
  return { name: material.name, densityKgM3, feedMmMin, maxFeedMmMin };
}

/** What a plan makes. */
export function partsOf(plan: Pick<Plan, 'block' | 'ribs' | 'template'>): SheetPart[] {
  const parts: (SheetPart | false)[] = [
    plan.block !== null && 'core',
    plan.ribs !== null && 'ribs',
    plan.template !== null && 'templates',
  ];
  return parts.filter((part) => part !== false);
}

/** Signs that are not taken for one another when read from paper: no I, L, O, U (after Crockford's base 32). */
const SIGNS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const CODE_SIGNS = 8;

/** The first 40 bits of a checksum as eight signs, "7K3M-Q9XD". */
export function shortCodeOf(checksum: string): string {
  const bits = BigInt(`0x${checksum.slice(0, 10)}`);
  const signs = Array.from({ length: CODE_SIGNS }, (_, i) =>
    SIGNS.charAt(Number((bits >> BigInt(5 * (CODE_SIGNS - 1 - i))) & 31n)),
  ).join('');
  return `${signs.slice(0, 4)}-${signs.slice(4)}`;
}

/** A code as somebody typed it: small letters, missing dash, O for 0, I or L for 1. Null when it can be none. */
export function parseShortCode(text: string): string | null {
  const signs = text.toUpperCase().replace(/[\s-]/g, '').replaceAll('O', '0').replace(/[IL]/g, '1');
  const isCode = signs.length === CODE_SIGNS && [...signs].every((sign) => SIGNS.includes(sign));
  return isCode ? `${signs.slice(0, 4)}-${signs.slice(4)}` : null;
}
