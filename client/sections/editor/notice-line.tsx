import { useUnits } from '#client/app/units.ts';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { type Notice, noticeText, noticeTone } from './notices.ts';

interface NoticeLineProps {
  readonly notice: Notice | null;
  readonly chordMm: number;
  readonly layout: SheetLayout;
}

const HINT = 'Drag a mark, or press a dimension and type. Arrow keys move the marked point.';

/** What there is to say about the last change: in the free corner of the sheet, or under it where it is narrow. */
export function NoticeLine({ notice, chordMm, layout }: NoticeLineProps) {
  const units = useUnits();
  const { remark, compact, scale } = layout;
  const tone = notice === null ? 'text-graphite' : TONES[noticeTone(notice)];
  const place = compact
    ? undefined
    : {
        left: (remark.x + 14) * scale,
        top: (remark.y + 4) * scale,
        width: (remark.width - 36) * scale,
        height: (remark.height - 44) * scale,
      };
  return (
    <p
      role="status"
      style={place}
      className={`pointer-events-none overflow-hidden text-xs ${compact ? 'min-h-9 pt-1' : 'absolute'} ${tone}`}
    >
      {notice === null ? HINT : noticeText(notice, chordMm, units)}
    </p>
  );
}

const TONES = {
  info: 'border-l-2 border-ink pl-2 text-ink',
  caution: 'border-l-2 border-amber pl-2 text-amber',
} as const;
