import { type SheetPlan } from './cut-sheets.ts';
import { type MachineSettings, type MaterialSettings } from './shop.ts';

interface Chosen<Settings> {
  readonly id: string;
  readonly settings: Settings;
}

export interface BeginningChoices {
  readonly root: { readonly sectionId: string; readonly versionNumber: number };
  readonly tip: { readonly sectionId: string; readonly versionNumber: number };
  readonly machine: Chosen<MachineSettings> | null;
  readonly material: Chosen<MaterialSettings> | null;
  /** Kerf of the machine in the material; a default of common practice when nobody measured it. */
  readonly kerfMm: number | null;
}

/** Common practice for a hot wire at moderate heat. */
const USUAL_KERF_MM = 0.8;

/** A plan to begin with: a tapered panel of the sections chosen, cut from a block of the material on the machine. */
export function beginningPlan({ root, tip, machine, material, kerfMm }: BeginningChoices): SheetPlan {
  const kerf = kerfMm ?? USUAL_KERF_MM;
  const foam = material?.settings.kind === 'foam' ? material.settings : null;
  return {
    panel: {
      root: { ...root, chordMm: 220 },
      tip: { ...tip, chordMm: 180 },
      spanMm: 600,
      sweepMm: 10,
      washoutDeg: 0,
      washoutStation: 0.25,
      verticalOffsetMm: 0,
    },
    allowances: { upperMm: 0, lowerMm: 0 },
    kerfMm: { root: kerf, tip: kerf },
    stock: { leadingEdgeStation: null, trailingEdgeStation: null },
    features: [],
    block: {
      lengthMm: foam ? Math.min(foam.blockLengthMm, 300) : 300,
      heightMm: foam?.blockHeightMm ?? 60,
      spanMm: 600,
      marginMm: 5,
      coreXMm: null,
      coreYMm: null,
      tiltDeg: 0,
      pair: false,
    },
    cut: { order: 'round', toleranceMm: 0.02, pointsPerSurface: 60, clearanceMm: 10, warmUpS: 3 },
    ribs: null,
    template: null,
    limits: { minimumWebMm: 2, minimumTrailingEdgeMm: 0.8, speedRatio: 2 },
    inspection: { stations: [0.15, 0.3, 0.5, 0.7], toleranceMm: 0.3, measured: 'core' },
    machineId: machine?.id ?? null,
    materialId: material?.id ?? null,
    ribMachineId: null,
    ribMaterialId: null,
    quantity: 2,
    paper: 'A4',
  };
}
