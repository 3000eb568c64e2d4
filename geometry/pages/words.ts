import { type EndIdentity, type SheetIdentity } from '../cutting/files/identity.ts';
import { type End } from '../cutting/plan.ts';
import { singleLine } from '../formats/text.ts';

/** The identity with all free text on single lines. */
export function cleanIdentity(identity: SheetIdentity): SheetIdentity {
  const end = (of: EndIdentity): EndIdentity => ({
    ...of,
    sectionName: singleLine(of.sectionName) || 'Section',
    designation: singleLine(of.designation),
  });
  const optional = (of: string | null) => (of === null ? null : singleLine(of));
  return {
    ...identity,
    sheetName: singleLine(identity.sheetName) || 'Cut sheet',
    status: singleLine(identity.status),
    checksum: singleLine(identity.checksum),
    shortCode: singleLine(identity.shortCode),
    address: singleLine(identity.address),
    root: end(identity.root),
    tip: end(identity.tip),
    author: singleLine(identity.author),
    releasedBy: optional(identity.releasedBy),
    machineName: optional(identity.machineName),
    materialName: optional(identity.materialName),
    ribMaterialName: optional(identity.ribMaterialName),
  };
}

/** "Marsh v3, NACA 2412" */
export function sectionLine(identity: SheetIdentity, end: End): string {
  const { sectionName, versionNumber, designation } = identity[end];
  const name = `${sectionName} v${versionNumber}`;
  return designation && designation !== sectionName ? `${name}, ${designation}` : name;
}

/** The day of an ISO 8601 time. */
export function dayOf(time: string | null): string {
  return time === null ? '' : singleLine(time).slice(0, 10);
}

/** The first twelve digits of a checksum in groups of four, as all files carry them. */
export function checksumText(checksum: string): string {
  return (checksum.slice(0, 12).match(/.{1,4}/gu) ?? []).join(' ');
}

/** "released 2026-03-04", or that the version is not for cutting. */
export function statusLine({ status, releasedAt }: SheetIdentity): string {
  return status === 'released' ? `released ${dayOf(releasedAt)}`.trim() : `${status}: not for cutting`;
}

/** A number as short as it can be said: at most three decimals. */
export function plainText(value: number): string {
  return String(Number(value.toFixed(3)));
}

/** Minutes and seconds. */
export function timeText(seconds: number): string {
  const whole = Math.round(seconds);
  return whole < 60 ? `${whole} s` : `${Math.floor(whole / 60)} min ${whole % 60} s`;
}
