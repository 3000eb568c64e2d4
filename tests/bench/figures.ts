/** One measured number. */
export interface Figure {
  /** What was measured, with its unit of work: “contour of 400 points”. */
  readonly what: string;
  readonly value: number;
  readonly unit: string;
  /** The largest value that satisfies, in the same unit; absent where there is no goal. */
  readonly goal?: number;
}

/** What a file tests/bench/*.bench.ts exports by default. */
export interface Bench {
  readonly name: string;
  run(): Promise<Figure[]>;
}

function digits(value: number): string {
  return value >= 100 ? value.toFixed(0) : value.toPrecision(3);
}

/** The figures as lines of a table with aligned columns. */
export function table(figures: readonly Figure[]): string[] {
  const rows = figures.map(({ what, value, unit, goal }) => [
    what,
    `${digits(value)} ${unit}`,
    goal === undefined ? '' : `${value <= goal ? 'within' : 'OVER'} ${digits(goal)} ${unit}`,
  ]);
  const widths = [0, 1].map((column) => Math.max(...rows.map((row) => (row[column] ?? '').length)));
  return rows.map(([what = '', value = '', goal = '']) =>
    `  ${what.padEnd(widths[0] ?? 0)}  ${value.padStart(widths[1] ?? 0)}  ${goal}`.trimEnd(),
  );
}
