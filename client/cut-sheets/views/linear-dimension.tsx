import { ARROW, LINE, textWidth } from '#client/drawing/line-types.ts';

const TEXT = 12;
const GAP = 3;
const BEYOND = 4;

interface LinearDimensionProps {
  /** Where the first and second extension line begin, in pixels. */
  readonly from: { readonly x: number; readonly y: number };
  readonly to: { readonly x: number; readonly y: number };
  /** The level of the dimension line: its y when it lies level, its x when it stands. */
  readonly level: number;
  readonly direction: 'level' | 'upright';
  readonly text: string;
  /** Where the text of a level dimension goes when there is no room between its arrows. */
  readonly textSide?: 'before' | 'after';
}

/**
 * A linear dimension after ISO 129-1: extension lines, a dimension line with closed arrowheads, the text over it, to be read from below or
 * from the right. Where the arrows have no room inside they stand outside.
 */
export function LinearDimension({
  from,
  to,
  level,
  direction,
  text,
  textSide = 'after',
}: LinearDimensionProps) {
  const isLevel = direction === 'level';
  const [a, b] = isLevel ? sorted(from.x, to.x) : sorted(from.y, to.y);
  const width = textWidth(text, TEXT);
  const inside = b - a >= 2 * ARROW.length + 4;
  const roomy = b - a >= width + 2 * ARROW.length + 6;
  const beside = ARROW.length * 2 + width / 2 + 2;
  const middle = roomy || !isLevel ? (a + b) / 2 : textSide === 'after' ? b + beside : a - beside;
  const at = (along: number, across: number) =>
    isLevel ? `${r(along)} ${r(across)}` : `${r(across)} ${r(along)}`;
  const tail = inside ? 0 : ARROW.length * 2;
  const extension = (point: { x: number; y: number }) => {
    const [along, start] = isLevel ? [point.x, point.y] : [point.y, point.x];
    const towards = Math.sign(level - start) || 1;
    return `M${at(along, start + towards * GAP)}L${at(along, level + towards * BEYOND)}`;
  };
  const lines = roomy
    ? `M${at(a, level)}L${at(middle - width / 2 - 3, level)}M${at(middle + width / 2 + 3, level)}L${at(b, level)}`
    : `M${at(a - tail, level)}L${at(b + tail, level)}`;
  const aside = (Math.sign(level - from.x) || 1) * (width / 2 + 6);
  const [x, y] = isLevel ? [middle, level] : [roomy ? level : level + aside, middle];
  return (
    <g aria-hidden="true">
      <path
        d={extension(from) + extension(to) + lines}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.narrow}
      />
      <path
        d={arrow(at, a, level, inside ? -1 : 1) + arrow(at, b, level, inside ? 1 : -1)}
        className="fill-graphite"
      />
      <text
        x={r(x)}
        y={r(y)}
        dy={TEXT * 0.35}
        fontSize={TEXT}
        textAnchor="middle"
        transform={isLevel || !roomy ? undefined : `rotate(-90 ${r(x)} ${r(y)})`}
        paintOrder="stroke"
        strokeWidth={4}
        strokeLinejoin="round"
        className="fill-ink stroke-sheet font-semibold"
      >
        {text}
      </text>
    </g>
  );
}

function sorted(a: number, b: number): readonly [number, number] {
  return a <= b ? [a, b] : [b, a];
}

function r(value: number): number {
  return Math.round(value * 100) / 100;
}

/** An arrowhead whose point stands at a place along the line and looks forward (1) or back (−1). */
function arrow(
  at: (along: number, across: number) => string,
  along: number,
  across: number,
  looks: 1 | -1,
): string {
  const { length, halfWidth } = ARROW;
  const base = along - looks * length;
  return `M${at(along, across)}L${at(base, across - halfWidth)}L${at(base, across + halfWidth)}Z`;
}
