import { formatLength, formatPercent, type Units } from '#client/app/units.ts';

/** What the editor has to say about the last change; the words are made when it is shown. */
export type Notice =
  | { readonly code: 'limit'; readonly quantity: string; readonly limit: string }
  | { readonly code: 'refused'; readonly reason: string }
  | { readonly code: 'nose-follows-thickness'; readonly maxThickness: number }
  | {
      readonly code: 'converted';
      readonly order: number;
      readonly residual: number;
      readonly rotationDeg: number;
    }
  | { readonly code: 'order-lowered'; readonly order: number; readonly residual: number }
  | { readonly code: 'order-raised'; readonly order: number }
  | { readonly code: 'digits-taken'; readonly deviation: number }
  | { readonly code: 'restored'; readonly number: number };

type NoticeTone = 'info' | 'caution';

/** The sentence for a notice, with lengths at the chord in use. */
export function noticeText(notice: Notice, chordMm: number, units: Units): string {
  const length = (fraction: number) => formatLength(fraction * chordMm, units, 3);
  switch (notice.code) {
    case 'limit':
      return `${notice.quantity} stops at its limit, ${notice.limit}.`;
    case 'refused':
      return `Not applied. ${notice.reason}`;
    case 'nose-follows-thickness':
      return `In a 4-digit section the nose radius follows the thickness, now ${formatPercent(notice.maxThickness, 2)}.`;
    case 'converted':
      return (
        `Free-form of order ${notice.order}: at most ${length(notice.residual)} from the 4-digit outline, ` +
        `${turned(notice.rotationDeg)}.`
      );
    case 'order-lowered':
      return `Order ${notice.order}: the outline moved by at most ${length(notice.residual)}.`;
    case 'order-raised':
      return `Order ${notice.order}: the outline is unchanged.`;
    case 'digits-taken':
      return `Nearest 4-digit section: the outline moved by up to ${length(notice.deviation)}. Undo brings the free form back.`;
    case 'restored':
      return `Version ${notice.number} is on the sheet as a draft. Save it to make it the newest version.`;
  }
}

export function noticeTone(notice: Notice): NoticeTone {
  return notice.code === 'limit' || notice.code === 'refused' ? 'caution' : 'info';
}

function turned(rotationDeg: number): string {
  const size = Math.abs(rotationDeg);
  return size < 0.0005
    ? 'chord line not turned'
    : `chord line turned by ${size.toFixed(3)}° to run from the true nose`;
}
