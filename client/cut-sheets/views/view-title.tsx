import { textWidth } from '#client/drawing/line-types.ts';

const SIZE = 11;

/** The name of a view over it; the words after the comma go first where there is no room. */
export function ViewTitle({ x, y, text, room }: { x: number; y: number; text: string; room: number }) {
  return (
    <text x={x} y={y} fontSize={SIZE} className="fill-ink font-semibold">
      {fitted(text, room)}
    </text>
  );
}

function fitted(text: string, room: number): string {
  const parts = text.split(', ');
  while (parts.length > 1 && textWidth(parts.join(', '), SIZE) > room) parts.pop();
  return parts.join(', ');
}
