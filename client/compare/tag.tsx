interface TagProps {
  readonly x: number;
  readonly y: number;
  readonly tag: number;
  /** On a narrow sheet. */
  readonly small: boolean;
}

/** A version's number in a ring, on the drawing. */
export function Tag({ x, y, tag, small }: TagProps) {
  return (
    <g>
      <circle cx={x} cy={y} r={tagRadius(small)} className="fill-sheet stroke-ink" strokeWidth={0.95} />
      <text
        x={x}
        y={y + (small ? 3 : 3.5)}
        fontSize={small ? 8 : 10}
        textAnchor="middle"
        className="fill-ink font-semibold"
      >
        {tag}
      </text>
    </g>
  );
}

export function tagRadius(small: boolean): number {
  return small ? 5.5 : 7;
}
