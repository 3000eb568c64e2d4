import { describe, expect, test } from 'vitest';
import { blocksOf } from '#geometry/imports/coordinate-blocks.ts';
import { readRows } from '#geometry/imports/coordinate-rows.ts';
import { refusalOf } from './files.ts';

const read = (text: string) => {
  const { blocks, notes } = blocksOf(readRows(text));
  return { blocks: blocks.map((block) => block.map(({ x, y }) => [x, y])), notes };
};

describe('points in groups', () => {
  test('blank lines part surfaces, but not single points', () => {
    expect(read('1 0\n0 0\n\n0 0\n1 -1').blocks).toEqual([[[1, 0], [0, 0]], [[0, 0], [1, -1]]]); // prettier-ignore
    expect(read('1 0\n\n0 0\n\n0 1\n\n').blocks).toEqual([[[1, 0], [0, 0], [0, 1]]]); // prettier-ignore
  });

  test('groups that go on where the last one ended are one list', () => {
    const { blocks } = read('1 0\n.8 0\n\n.6 0\n.4 0\n\n.2 0\n0 0\n\n9 9\n8 9');
    expect(blocks.map((block) => block.length)).toEqual([6, 2]);
  });

  test('lines that count the points are passed over', () => {
    expect(read('3. 3.\n0 0\n.5 .1\n1 0\n0 0\n.6 -.1\n1 -.1')).toEqual({
      blocks: [[[0, 0], [0.5, 0.1], [1, 0]], [[0, 0], [0.6, -0.1], [1, -0.1]]], // prettier-ignore
      notes: ['passed over the number of points: 3 and 3 in line 1'],
    });
    const wrong = read('35 36\n\n0 0\n1 .1\n\n0 0\n1 -.1');
    expect(wrong.blocks.map((block) => block.length)).toEqual([2, 2]);
    expect(read('2\n0 0\n1 .1\n2\n0 0\n1 -.1')).toEqual({
      blocks: [[[0, 0], [1, 0.1]], [[0, 0], [1, -0.1]]], // prettier-ignore
      notes: ['passed over the number of points: 2 in line 1, 2 in line 4'],
    });
    expect(read('250 10\n0 0\n1 3').blocks[0]).toHaveLength(3);
  });

  test('a third column that says nothing is dropped', () => {
    expect(read('1 0 0\n.5 .1 0')).toEqual({
      blocks: [[[1, 0], [0.5, 0.1]]], // prettier-ignore
      notes: ['dropped column 3, 0 all along'],
    });
    expect(read('1 1 0\n2 .5 .1').notes).toEqual(['dropped column 1, which counts the points']);
    expect(read('1 7 0\n.5 7 .1').blocks).toEqual([[[1, 0], [0.5, 0.1]]]); // prettier-ignore
  });

  test('tables with both surfaces on a line', () => {
    expect(read('0 0 0\n.5 .1 -.05\n1 .01 -.01')).toEqual({
      blocks: [[[0, 0], [0.5, 0.1], [1, 0.01]], [[0, 0], [0.5, -0.05], [1, -0.01]]], // prettier-ignore
      notes: ['read the columns as station, upper and lower ordinate'],
    });
    expect(read('0 0 0 0\n.5 .1 .52 -.05')).toEqual({
      blocks: [[[0, 0], [0.5, 0.1]], [[0, 0], [0.52, -0.05]]], // prettier-ignore
      notes: ['read the columns as x and y of the upper, then of the lower surface'],
    });
  });

  test('the mark between elements parts them', () => {
    expect(read('1 0\n0 0\n999 999\n2 0\n1 0').blocks).toHaveLength(2);
  });
});

test.each([
  ['only words', 'not-numbers', null, 'No line of the file holds two numbers.'],
  ['1 0\n.5', 'not-numbers', 2, 'Line 2 holds one number, not two.'],
  ['5\n'.repeat(5) + '1 0', 'not-numbers', 1, 'Line 1 holds one number, not two.'],
  ['1 0\n1 2 3 4', 'not-numbers', 2, 'Line 2 holds more than three numbers, not 2.'],
  ['1 0\n2 0\n1 2 3', 'not-numbers', 3, 'Line 3 holds 3 numbers, not 2.'],
  ['4 5 6\n1 2 3\n4 5 7', 'not-numbers', 1, 'Line 1 holds three numbers, not two.'],
])('refused: %j', (text, code, line, message) => {
  const refusal = refusalOf(() => read(text));
  expect([refusal.code, refusal.line, refusal.message]).toEqual([code, line, message]);
});
