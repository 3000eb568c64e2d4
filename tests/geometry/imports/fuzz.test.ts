import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readCoordinates } from '#geometry/imports/coordinates.ts';
import { readDxfOutline } from '#geometry/imports/dxf-outline.ts';
import { type ImportedContour } from '#geometry/imports/imported.ts';
import { IMPORT_LIMITS, ImportRefusal, type ImportRefusalCode } from '#geometry/imports/refusal.ts';
import { OPEN, SHARP, bytesOf, dxf, lightPolyline, listed } from './files.ts';

/** Every code, so that a new one must be named here as well. */
const CODES: Readonly<Record<ImportRefusalCode, true>> = {
  empty: true,
  'too-large': true,
  binary: true,
  'wrong-type': true,
  markup: true,
  formula: true,
  'not-numbers': true,
  'too-few-points': true,
  'too-many-points': true,
  'several-contours': true,
  crossing: true,
  'not-a-section': true,
  'no-outline': true,
  'broken-drawing': true,
};

const few = [...SHARP.filter((_, i) => i % 3 === 0 || i === 19), SHARP.at(-1)!];
const mm = few.map(({ x, y }) => ({ x: 250 * x, y: 250 * y }));
const knots = [0, 0, 0, 0, 1, 1, 1, 1].flatMap((knot) => [40, knot]);
const bezier = (side: number) => [0, 'SPLINE', 71, 3, ...knots, ...[[0, 0], [0, 12 * side], [50, 12 * side], [100, 0]].flatMap(([x, y]) => [10, x!, 20, y!])]; // prettier-ignore

/** Files that are read as they are. */
const GOOD_LISTS = [
  listed(few),
  `Marsh\n14. 14.\n\n${listed(few.slice(0, 8).reverse())}\n\n${listed(few.slice(7))}`,
  listed(mm).replaceAll('.', ',').replaceAll(' ', ';'),
  `# comment\nx,y,z\n${listed(OPEN).replaceAll(' ', ',').replaceAll('\n', ',0\n')},0`,
];
const GOOD_DRAWINGS = [
  dxf([lightPolyline(mm.slice(0, -1), true)], ['9', '$INSUNITS', '70', '4']),
  dxf(few.slice(1).map(({ x, y }, i) => [0, 'LINE', 8, '0', 10, few[i]!.x, 20, few[i]!.y, 11, x, 21, y])),
  dxf([bezier(1), bezier(-1)]),
  dxf([[0, 'ARC', 10, 20, 20, 20, 40, 20, 50, 180, 51, 270], [0, 'LINE', 10, 20, 20, 0, 11, 250, 21, 0], [0, 'LWPOLYLINE', 70, 0, 10, 250, 20, 0, 42, 0.15, 10, 0, 20, 20]]), // prettier-ignore
];

/** What is put into a file to break it. */
const SCRAPS = [
  '\n', '\r', ' ', '\t', ',', ';', '.', '-', '0', '9', '1e9', '1e-320', '1e999', 'NaN', 'Infinity', '\u2212', '#', '//', '\u0000', '\u00ff', '\ufeff',
  '=1+1', '@x', '<a>', '{', '999 999', '1 1', '0 0', '-5 3', '0.5 0.5 0.5', '  0\nSECTION\n', '0\nLINE\n', '0\nSPLINE\n', '42\n1\n', '10\n1e300\n', '71\n9\n',
  '40\n-1\n', '70\n-1\n', '0\nEOF\n', '230\n-1\n', '\u{1d11e}', 'x'.repeat(70), '7'.repeat(70),
]; // prettier-ignore

const edit = fc.record({
  kind: fc.constantFrom('insert', 'delete', 'repeat', 'replace', 'swap'),
  at: fc.double({ min: 0, max: 1, noNaN: true }),
  length: fc.nat({ max: 40 }),
  scrap: fc.constantFrom(...SCRAPS),
});
type Edit = typeof edit extends fc.Arbitrary<infer T> ? T : never;

function edited(text: string, { kind, at, length, scrap }: Edit): string {
  const from = Math.floor(at * text.length);
  const [before, piece, after] = [
    text.slice(0, from),
    text.slice(from, from + length),
    text.slice(from + length),
  ];
  if (kind === 'insert') return before + scrap + piece + after;
  if (kind === 'delete') return before + after;
  if (kind === 'repeat') return before + piece.repeat(3) + after;
  if (kind === 'replace') return before + scrap + after;
  return after + piece + before;
}

const mutated = (good: readonly string[]) =>
  fc
    .tuple(fc.constantFrom(...good), fc.array(edit, { minLength: 1, maxLength: 6 }))
    .map(([text, edits]) => bytesOf(edits.reduce(edited, text)));

/** Numbers of every size, in lines of any length, between scraps. */
const invented = fc
  .array(
    fc.oneof(
      fc.tuple(fc.double(), fc.double()).map(([x, y]) => `${x} ${y}`),
      fc.tuple(fc.integer({ min: -3, max: 3 }), fc.integer({ min: -3, max: 3 })).map(([x, y]) => `${x} ${y}`),
      fc.constantFrom(...SCRAPS),
    ),
    { minLength: 8, maxLength: 24 },
  )
  .map((lines) => bytesOf(lines.join('\n')));

const drawn = fc
  .array(
    fc.oneof(
      fc.tuple(fc.constantFrom(10, 20, 11, 21, 40, 41, 42, 50, 51, 70, 71, 73, 210, 230, 30), fc.oneof(fc.integer({ min: -4, max: 9 }), fc.double())).map(([code, value]) => `${code}\n${value}`),
      fc.constantFrom('0\nLINE', '0\nARC', '0\nLWPOLYLINE', '0\nPOLYLINE', '0\nVERTEX', '0\nSPLINE', '0\nENDSEC'),
    ),
    { minLength: 5, maxLength: 60 },
  )
  .map((groups) => bytesOf(`0\nSECTION\n2\nENTITIES\n${groups.join('\n')}\n`)); // prettier-ignore

const random = fc.uint8Array({ minLength: 0, maxLength: 120 });

/** What a read ends in: a contour that holds what it promises, or a refusal by one of the codes. Anything else is thrown on. */
function outcome(read: () => ImportedContour): ImportRefusalCode | 'read' {
  let contour: ImportedContour;
  try {
    contour = read();
  } catch (error) {
    if (!(error instanceof ImportRefusal)) throw error;
    const sound = CODES[error.code] && error.message.length > 10 && error.message.length < 300;
    if (!sound || (error.line !== null && !(error.line >= 1)))
      throw new Error(`${error.code}: ${error.message}`);
    return error.code;
  }
  const { x, y, sourceChordMm, repairs } = contour;
  // The trailing edge of a sharp outline stands twice: one more than is read.
  const counted =
    x.length === y.length && x.length >= IMPORT_LIMITS.points.min && x.length <= IMPORT_LIMITS.points.max + 1;
  const finite = [...x, ...y, sourceChordMm ?? 0].every(Number.isFinite);
  const middle = Math.hypot((x[0]! + x.at(-1)!) / 2 - 1, (y[0]! + y.at(-1)!) / 2);
  if (!counted || !finite || !(middle < 1e-4) || repairs.some((repair) => repair === '')) {
    throw new Error(`${x.length} points, trailing edge off by ${middle}`);
  }
  return 'read';
}

const BAD: readonly (readonly [
  string,
  fc.Arbitrary<Uint8Array>,
  (bytes: Uint8Array) => ImportedContour,
  number,
])[] = [
  ['lists with mistakes', mutated(GOOD_LISTS), (bytes) => readCoordinates(bytes, 'a.txt'), 4000],
  ['drawings with mistakes', mutated(GOOD_DRAWINGS), readDxfOutline, 2500],
  ['invented lists', invented, (bytes) => readCoordinates(bytes, 'a.csv'), 1500],
  ['invented drawings', drawn, readDxfOutline, 1500],
  ['lists read as drawings', mutated(GOOD_LISTS), readDxfOutline, 500],
  ['drawings read as lists', mutated(GOOD_DRAWINGS), (bytes) => readCoordinates(bytes, 'a.dxf'), 300],
  ['random bytes', random, (bytes) => readCoordinates(bytes, 'a'), 1000],
  ['random bytes as drawings', random, readDxfOutline, 500],
];

describe('11 800 bad files: a contour that can be used, or a refusal', () => {
  test.each(BAD)(
    '%s',
    (_, files, read, numRuns) => {
      const outcomes = new Set<string>();
      fc.assert(
        fc.property(files, (bytes) => {
          outcomes.add(outcome(() => read(bytes)));
        }),
        { numRuns },
      );
      expect(outcomes.size).toBeGreaterThan(0);
      expect(BAD.reduce((sum, [, , , runs]) => sum + runs, 0)).toBe(11_800);
    },
    60_000,
  );

  test('mistakes of many kinds are met, and files that are read', () => {
    const outcomes = new Set<string>();
    fc.assert(
      fc.property(mutated(GOOD_LISTS), mutated(GOOD_DRAWINGS), (list, drawing) => {
        outcomes.add(outcome(() => readCoordinates(list, 'a.txt')));
        outcomes.add(outcome(() => readDxfOutline(drawing)));
      }),
      { numRuns: 300 },
    );
    expect([...outcomes]).toEqual(
      expect.arrayContaining([
        'read',
        'not-numbers',
        'crossing',
        'several-contours',
        'broken-drawing',
        'formula',
      ]),
    );
  });

  test('the good files are read before anything is done to them', () => {
    for (const text of GOOD_LISTS)
      expect(outcome(() => readCoordinates(bytesOf(text), 'a.txt'))).toBe('read');
    for (const text of GOOD_DRAWINGS) expect(outcome(() => readDxfOutline(bytesOf(text)))).toBe('read');
  });
});
