import fc from 'fast-check';
import { expect, test } from 'vitest';
import { singleLine } from '#geometry/formats/text.ts';
import { type Block, setBlocks, tableColumn } from '#geometry/pages/blocks.ts';
import { segment, text } from '#geometry/pages/marks.ts';
import { type Mark } from '#geometry/pages/page.ts';
import { faultsOf, textsOf, wordsOf } from './checking.ts';
import { names } from './samples.ts';

const COLUMNS = [
  { x: 10, y: 10, width: 90, height: 100 },
  { x: 110, y: 10, width: 90, height: 60 },
];
const FRAME = { x: 5, y: 5, width: 200, height: 110 };

function table(rows: number, title = 'Table', byHand = false): Block {
  const columns = [tableColumn('Number', 0.5), tableColumn('Value', 0.5, 'end')];
  const lines = Array.from({ length: rows }, (_, i) => [`row ${i}`, String(i * 10)]);
  return { kind: 'table', title, columns, rows: lines, byHand };
}

test('a table that does not fit goes on in the next column and on the next page, with its heading', () => {
  const pages = setBlocks([[table(60)]], COLUMNS);
  expect(pages.length).toBeGreaterThan(1);
  const words = pages.map(wordsOf);
  expect(words.flat().filter((of) => /^row \d+$/.test(of))).toEqual(
    Array.from({ length: 60 }, (_, i) => `row ${i}`),
  );
  expect(words[1]?.[0]).toBe('Table, continued');
  expect(words[1]).toContain('Number');
});

test('each group begins in a column of its own, and a heading keeps two rows', () => {
  const [page] = setBlocks([[table(2, 'One')], [table(2, 'Two')]], COLUMNS);
  const heading = (title: string) => textsOf(page!).find(({ text }) => text === title)?.at.x;
  expect([heading('One'), heading('Two')]).toEqual([10, 110]);
  // 13 mm of heads and 14 rows of 5.6 mm leave less than 9 mm below the gap: no room for a heading with two rows.
  const crowded = setBlocks([[table(14, 'One'), table(3, 'Two', true)]], COLUMNS)[0]!;
  expect(textsOf(crowded).find(({ text }) => text === 'Two')?.at.x).toBe(110);
});

test('sentences are broken into lines behind their word', () => {
  const words = 'One sentence that is long enough to need several lines in a narrow column of a page.';
  const [page] = setBlocks(
    [[{ kind: 'notes', title: 'Notes', sentences: [{ before: 'Warning', words }] }]],
    COLUMNS,
  );
  const [title, before, ...lines] = textsOf(page!);
  expect([title?.text, before?.text]).toEqual(['Notes', 'Warning']);
  expect(lines.map(({ text }) => text).join(' ')).toBe(words);
  expect(lines.length).toBeGreaterThan(1);
  expect(new Set(lines.map(({ at }) => at.x)).size).toBe(1);
});

test('nothing without blocks or columns', () => {
  expect(setBlocks([], COLUMNS)).toEqual([]);
  expect(setBlocks([[table(1)]], [])).toEqual([]);
});

test('whatever stands in the cells, nothing overlaps and nothing leaves the columns', () => {
  fc.assert(
    fc.property(fc.array(names, { minLength: 1, maxLength: 30 }), fc.boolean(), (given, byHand) => {
      const words = given.map(singleLine);
      const columns = [tableColumn(words[0]!, 0.3), tableColumn('x', 0.7, 'end')];
      const rows = words.map((of) => [of, of]);
      const blocks: Block[] = [
        { kind: 'table', title: words[0]!, columns, rows, byHand },
        {
          kind: 'notes',
          title: 'Notes',
          sentences: words.slice(0, 3).map((of) => ({ before: '', words: of })),
        },
      ];
      for (const marks of setBlocks([blocks], COLUMNS))
        expect(faultsOf({ widthMm: 210, heightMm: 120, frame: FRAME, marks })).toEqual([]);
    }),
    { numRuns: 15 },
  );
});

test('the check of pages finds what it looks for', () => {
  const at = (x: number, words: string) => text({ x, y: 50 }, words, 2.5);
  const page = (...marks: Mark[]) => ({ widthMm: 210, heightMm: 120, frame: FRAME, marks });
  expect(faultsOf(page(at(10, 'one'), at(20, 'two')))).toEqual([]);
  expect(faultsOf(page(at(10, 'one'), at(12, 'two')))).toEqual(['overlap: one and two']);
  expect(faultsOf(page(at(204, 'beyond')))).toEqual(['outside the frame: beyond']);
  expect(faultsOf(page(segment(10, 10, NaN, 10)))[0]).toMatch(/^not finite/);
  expect(faultsOf(page(at(10, 'a\u0000b')))[0]).toMatch(/^not one line/);
});
