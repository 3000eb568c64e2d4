import { describe, expect, test } from 'vitest';
import { readRows } from '#geometry/imports/coordinate-rows.ts';
import { refusalOf } from './files.ts';

const values = (text: string) =>
  readRows(text).rows.map((row) => (row.kind === 'numbers' ? row.values : row.kind));

describe('rows of a coordinate file', () => {
  test('title, comments, words and blank lines', () => {
    const text = [
      '# made in mm, millimetres that is',
      'Marsh 12 wing',
      'x y',
      '1.0 0.1 # first',
      '! note',
      '0.5 0.2 // second',
      '',
      '',
      'LOWER SURFACE',
      '0.0 0.0',
      '',
    ].join('\n');
    const { name, namesMm, notes } = readRows(text);
    expect(values(text)).toEqual([[1, 0.1], [0.5, 0.2], 'break', [0, 0], 'break']);
    expect([name, namesMm]).toEqual(['Marsh 12 wing', true]);
    expect(notes).toEqual(['passed over 1 line of words between the points']);
  });

  test('lines are numbered as in the file, and headings of columns are no name', () => {
    const { rows, name, namesMm } = readRows('x,y\r\n\r\n1,0\r\n');
    expect(rows[0]).toEqual({ kind: 'numbers', values: [1, 0], line: 3 });
    expect([name, namesMm]).toEqual([null, false]);
  });

  test('decimal commas are read when they make more pairs', () => {
    expect(values('0,5;0,1\n0,25 -0,1\n1 0')).toEqual([[0.5, 0.1], [0.25, -0.1], [1, 0]]); // prettier-ignore
    expect(readRows('0,5;0,1').notes).toEqual(['read decimal commas']);
    expect(values('250,10\n200,12')).toEqual([[250, 10], [200, 12]]); // prettier-ignore
    expect(values('1,0\n0.95,0.01')).toEqual([[1, 0], [0.95, 0.01]]); // prettier-ignore
  });
});

describe('refused, with the line', () => {
  test.each([
    ['1 0\n0.5 abc', 'not-numbers', 2, 'Line 2 should hold two numbers, but holds “0.5 abc”.'],
    ['1 0\nnan 0.5', 'not-numbers', 2, '“nan 0.5”'],
    ['1 0\nx 0.5 y 0.25', 'not-numbers', 2, '“x 0.5 y 0.25”'],
    ['1 0\n=SUM(A1:A9),2', 'formula', 2, 'Line 2 holds a formula, “=SUM(A1:A9)”: write the values instead.'],
    ['1 0\n0.5,"=1+1"', 'formula', 2, 'holds a formula'],
    ['@SUM(1),2', 'formula', 1, 'holds a formula'],
    ['title\n+HYPERLINK(x),2', 'formula', 2, 'holds a formula'],
    ['1 0\n<b>0.5</b> 0', 'markup', 2, 'Line 2 is HTML or XML, not coordinates.'],
    [`1 0\n${'0'.repeat(1001)}`, 'not-numbers', 2, 'Line 2 is longer than 1000 characters'],
    ['words\n'.repeat(51), 'not-numbers', 51, 'Line 51 should hold two numbers, but holds “words”.'],
    ['1 0\n' + 'upper\n'.repeat(21), 'not-numbers', 22, '“upper”'],
    ['\n'.repeat(100_001), 'too-large', null, 'The file has more than 100000 lines.'],
    ['1 0\n'.repeat(10_011), 'too-many-points', null, 'The file has more than 10000 points.'],
  ])('%.40j', (text, code, line, message) => {
    const refusal = refusalOf(() => readRows(text));
    expect([refusal.code, refusal.line]).toEqual([code, line]);
    expect(refusal.message).toContain(message);
  });

  test('a rule of signs above a list is words, not a formula', () => {
    expect(values('======\n------\n1 0')).toEqual([[1, 0]]);
  });
});
