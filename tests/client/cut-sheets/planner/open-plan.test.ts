// @vitest-environment node
import { expect, test } from 'vitest';
import { openPlan, planMirror } from '#client/cut-sheets/planner/open-plan.ts';
import { valuesOf, withValue } from '#client/cut-sheets/planner/plan-values.ts';
import { PLAN, versionOf } from './samples.ts';

const version = versionOf(2);
const span = (spanMm: number) => ({ ...withValue(valuesOf(PLAN), 'panel.spanMm', spanMm) });
const draft = { basedOn: 2, values: span(500), updatedAt: '2024-03-02T10:00:00.000Z' };
const before = Date.parse('2024-03-02T09:59:00.000Z');
const after = Date.parse('2024-03-02T10:01:00.000Z');

test('without a draft the version is opened', () => {
  expect(openPlan(version, null, null)).toEqual({ values: PLAN, basedOn: 2, from: 'version' });
});

test('the newer of both drafts is opened', () => {
  const copy = { basedOn: 1, values: span(400) };
  expect(openPlan(version, draft, null)).toMatchObject({ from: 'server', basedOn: 2, values: span(500) });
  expect(openPlan(version, draft, { ...copy, at: before }).from).toBe('server');
  expect(openPlan(version, draft, { ...copy, at: after })).toMatchObject({
    from: 'browser',
    basedOn: 1,
    values: span(400),
  });
  expect(openPlan(version, null, { ...copy, at: before }).from).toBe('browser');
});

test('a copy that the server has already is no news', () => {
  expect(openPlan(version, draft, { basedOn: 2, values: span(500), at: after }).from).toBe('server');
});

test('what is no plan is not opened', () => {
  expect(openPlan(version, { ...draft, values: { note: 'x' } }, null)).toMatchObject({ from: 'version' });
  expect(openPlan(version, draft, { basedOn: 2, values: {}, at: after }).from).toBe('server');
});

test('the copy in the browser is one for each person and sheet', () => {
  const store = new Map<string, string>();
  const storage = {
    getItem: (key: string) => store.get(key) ?? null,
    setItem: (key: string, text: string) => void store.set(key, text),
    removeItem: (key: string) => void store.delete(key),
  };
  const mine = planMirror(storage, 'me', 'sheet');
  mine.write({ basedOn: 2, values: span(400) }, after);
  expect(mine.read()).toEqual({ basedOn: 2, values: span(400), at: after });
  expect(planMirror(storage, 'me', 'other').read()).toBeNull();
  expect(planMirror(storage, 'you', 'sheet').read()).toBeNull();
  mine.clear();
  expect(mine.read()).toBeNull();
});
