/** A DXF file taken apart without knowing what its codes mean. */
export interface Pair {
  readonly code: number;
  readonly value: string;
}

/** The pairs of a DXF file; throws when a line that should hold a group code does not. */
export function pairsOf(text: string): readonly Pair[] {
  const lines = text.split('\r\n');
  if (lines.pop() !== '') throw new Error('The file does not end with a line end.');
  if (lines.length % 2 !== 0) throw new Error('A group code without a value.');
  return Array.from({ length: lines.length / 2 }, (_, i) => {
    const code = lines[2 * i]!;
    if (!/^ {0,2}\d{1,3}$/.test(code)) throw new Error(`Not a group code on line ${2 * i + 1}: "${code}"`);
    return { code: Number(code), value: lines[2 * i + 1]! };
  });
}

/** Groups of pairs, each beginning with code 0: sections, tables, records, entities. */
export function recordsOf(pairs: readonly Pair[]): readonly (readonly Pair[])[] {
  const records: Pair[][] = [];
  for (const pair of pairs) {
    if (pair.code === 0) records.push([]);
    records.at(-1)?.push(pair);
  }
  return records;
}

export function valuesOf(record: readonly Pair[], code: number): readonly string[] {
  return record.filter((pair) => pair.code === code).map(({ value }) => value);
}
