import { textWidth } from '#client/drawing/line-types.ts';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';

const SIZE = 12;
const HEIGHT = 22;

/** The value of the handle in hand, beside the pointer. */
export function ValueTag({
  x,
  y,
  text,
  layout,
}: {
  x: number;
  y: number;
  text: string;
  layout: SheetLayout;
}) {
  const width = textWidth(text, SIZE) + 16;
  const { frame } = layout;
  const right = x + 22 + width <= frame.x + frame.width - 6;
  const left = Math.max(frame.x + 6, right ? x + 22 : x - 22 - width);
  const above = y - 30 - HEIGHT >= frame.y + 6;
  const top = above ? y - 30 - HEIGHT : y + 30;
  return (
    <g aria-hidden="true" className="pointer-events-none">
      <path
        d={`M${x} ${y}L${right ? left : left + width} ${above ? top + HEIGHT : top}`}
        className="stroke-wire"
        strokeWidth={0.95}
      />
      <rect
        x={left}
        y={top}
        width={width}
        height={HEIGHT}
        className="fill-sheet stroke-wire"
        strokeWidth={1}
      />
      <text
        x={left + 8}
        y={top + HEIGHT / 2 + SIZE * 0.35}
        fontSize={SIZE}
        className="fill-wire font-semibold"
      >
        {text}
      </text>
    </g>
  );
}
