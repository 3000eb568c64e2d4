import { CHECKSUM_DIGITS } from '../../formats/identity.ts';
import { singleLine } from '../../formats/text.ts';
import { type PlacedFeature } from '../features.ts';
import { mm } from '../findings.ts';
import { type CorePlan } from '../planner.ts';
import { type End } from '../plan.ts';
import { type Rib } from '../ribs.ts';
import { type EndIdentity, type SheetIdentity } from './identity.ts';

/** Short forms of what must be minded where the file is used. */
const CAUTION = {
  wire: 'Caution: hot wire burns, fumes harm: ventilate, dry run with a cold wire first',
  cutter: 'Caution: ventilate, wear eye protection, never leave a laser alone',
} as const;

/** The sheet's name and version, on one line. */
export function sheetTitle({ sheetName, versionNumber }: SheetIdentity): string {
  return `${singleLine(sheetName) || 'Cut sheet'} v${versionNumber}`;
}

/** The first digits of a checksum, on one line. */
function shortChecksum(checksum: string): string {
  return singleLine(checksum).slice(0, CHECKSUM_DIGITS);
}

function sheetCodes({ checksum, shortCode }: SheetIdentity): string {
  return `Sheet checksum ${shortChecksum(checksum)}, code ${singleLine(shortCode)}`;
}

function sectionLine({ sectionName, versionNumber, designation, checksum }: EndIdentity): string {
  const name = singleLine(`Section ${sectionName}`);
  return `${name} v${versionNumber}, ${singleLine(designation)}, checksum ${shortChecksum(checksum)}`;
}

/** ` of EPS 20 on Long bench`, as far as both are known. */
function stuffAndMachine(material: string | null, machine: string | null): string {
  const of = material === null ? '' : ` of ${singleLine(material)}`;
  return machine === null ? of : `${of} on ${singleLine(machine)}`;
}

/** What the drawing of an end of the core says about itself, a short line each. */
export function endLines({ plan, fit }: CorePlan, identity: SheetIdentity, end: End): readonly string[] {
  const { materialName, machineName } = identity;
  return [
    `${sheetTitle(identity)}, ${singleLine(identity.status)}`,
    `Part: core, ${end}, chord ${mm(plan.panel[end].chordMm, 3)}, unit mm`,
    sectionLine(identity[end]),
    ...(materialName === null && machineName === null
      ? []
      : [`Core${stuffAndMachine(materialName, machineName)}`]),
    sheetCodes(identity),
    `CUT is the finished foam, skins taken off, without the kerf (planned ${mm(plan.kerfMm[end], 3)})`,
    'Root and tip in step, one origin: root leading edge, x aft, y up',
    ...(fit && fit.places.length > 1 ? ['Pair: the second core in the block is mirrored'] : []),
    CAUTION.wire,
  ];
}

/** The features by number, as they follow each other on layer SLOT. */
export function featureLines(features: readonly PlacedFeature[]): readonly string[] {
  return features.map(({ index, feature }) => {
    const name = singleLine(feature.name);
    return `SLOT ${index + 1}: ${feature.kind}${name ? `, ${name}` : ''}`;
  });
}

/** What a sheet of ribs says about itself. */
export function ribLines(
  { plan }: CorePlan,
  identity: SheetIdentity,
  sheet: { readonly number: number; readonly count: number; readonly ribs: readonly Rib[] },
): readonly string[] {
  const { root, tip } = plan.panel;
  const numbers = sheet.ribs.map(({ number }) => number).join(', ');
  const thickness = mm(plan.ribs?.materialThicknessMm ?? 0, 3);
  return [
    `${sheetTitle(identity)}, ${singleLine(identity.status)}`,
    `Part: ribs ${numbers}, sheet ${sheet.number} of ${sheet.count}, unit mm`,
    `Chords: root ${mm(root.chordMm, 3)}, tip ${mm(tip.chordMm, 3)}; material ${thickness}${stuffAndMachine(identity.ribMaterialName, null)}`,
    sheetCodes(identity),
    'CUT is the finished edge: the width of the cut is not in it',
    CAUTION.cutter,
  ];
}

/** Where each rib stands in the panel. */
export function ribStationLines(ribs: readonly Rib[]): readonly string[] {
  return ribs.map(({ number, spanMm }) => `Rib ${number}: outline at ${mm(spanMm, 3)} from the root face`);
}

/** The name line of a section's coordinates. */
export function coordinatesTitle(
  { plan }: CorePlan,
  identity: SheetIdentity,
  end: End,
  toleranceMm: number,
): string {
  const { chordMm } = plan.panel[end];
  return [
    `${sheetTitle(identity)} ${end}, ${singleLine(identity.status)}`,
    sectionLine(identity[end]),
    `chord ${mm(chordMm, 3)}, unit mm, tolerance ${mm(toleranceMm, 4)}`,
    sheetCodes(identity),
  ].join(', ');
}
