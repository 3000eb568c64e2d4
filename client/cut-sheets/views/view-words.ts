import { formatAngle, formatLength, formatNumber, MM_PER_INCH, type Units } from '#client/app/units.ts';
import { PIXELS_PER_MM } from '#client/drawing/sheet-view.ts';
import { type End } from '#geometry/cutting/plan.ts';
import { type PlanModel } from './plan-model.ts';

/** The scale of a view after ISO 5455, true where a CSS millimetre is one: "1 : 2.5". */
export function viewScale(pixelsPerMm: number): string {
  const ratio = pixelsPerMm / PIXELS_PER_MM;
  const number = (value: number) => String(Number(value.toPrecision(2)));
  if (Math.abs(ratio - 1) < 0.005) return '1 : 1';
  return ratio > 1 ? `${number(ratio)} : 1` : `1 : ${number(1 / ratio)}`;
}

/** A length for a dimension: the sheet says the unit once. */
export function dimensionText(mm: number, units: Units, decimals = 1): string {
  return units === 'mm' ? formatNumber(mm, decimals) : formatNumber(mm / MM_PER_INCH, decimals + 1);
}

/** What stands over a face: where it is, its chord, kerf and, at the tip, washout. */
export function faceWords({ plan }: PlanModel, end: End, units: Units): string {
  const { washoutDeg } = plan.panel;
  return [
    `${end === 'root' ? 'Root' : 'Tip'} face${plan.block ? ' in the block' : ''}`,
    `chord ${formatLength(plan.panel[end].chordMm, units, 1)}`,
    ...(end === 'tip' && washoutDeg !== 0 ? [`washout ${formatAngle(washoutDeg, 2)}`] : []),
    ...(plan.block ? [`kerf ${formatLength(plan.kerfMm[end], units)}`] : []),
  ].join(', ');
}

/** "2 min 51 s", "1 h 04 min". */
export function duration(seconds: number): string {
  const whole = Math.round(seconds);
  const [hours, minutes] = [Math.floor(whole / 3600), Math.floor(whole / 60) % 60];
  if (hours > 0) return `${hours} h ${String(minutes).padStart(2, '0')} min`;
  return minutes > 0 ? `${minutes} min ${String(whole % 60).padStart(2, '0')} s` : `${whole} s`;
}
