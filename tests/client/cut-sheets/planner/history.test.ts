// @vitest-environment node
import { expect, test } from 'vitest';
import { type History, reduceHistory, startHistory } from '#client/cut-sheets/planner/history.ts';

const change = (history: History, span: number, run: string | null = null) =>
  reduceHistory(history, { type: 'change', values: { span }, run });

test('each change is a step that can be taken back and done again', () => {
  const changed = change(change(startHistory({ span: 1 }), 2), 3);
  const undone = reduceHistory(changed, { type: 'undo' });
  expect(undone.present).toEqual({ span: 2 });
  expect(reduceHistory(undone, { type: 'redo' }).present).toEqual({ span: 3 });
  expect(reduceHistory(reduceHistory(undone, { type: 'undo' }), { type: 'undo' }).present).toEqual({
    span: 1,
  });
});

test('typing in one field is one step, until the field is left', () => {
  const typed = change(change(change(startHistory({ span: 1 }), 6, 'span'), 60, 'span'), 600, 'span');
  expect(typed.past).toEqual([{ span: 1 }]);
  const again = change(reduceHistory(typed, { type: 'settle' }), 610, 'span');
  expect(again.past).toEqual([{ span: 1 }, { span: 600 }]);
});

test('another field begins a step of its own', () => {
  const both = change(change(startHistory({ span: 1 }), 2, 'span'), 3, 'sweep');
  expect(both.past).toHaveLength(2);
});

test('a change to the same values is none, and a new change drops what was undone', () => {
  const start = startHistory({ span: 1 });
  expect(change(start, 1)).toBe(start);
  const undone = reduceHistory(change(start, 2), { type: 'undo' });
  expect(undone.future).toHaveLength(1);
  expect(change(undone, 3).future).toEqual([]);
});

test('nothing to undo or redo leaves all as it is', () => {
  const start = startHistory({ span: 1 });
  expect(reduceHistory(start, { type: 'undo' })).toBe(start);
  expect(reduceHistory(start, { type: 'redo' })).toBe(start);
});
