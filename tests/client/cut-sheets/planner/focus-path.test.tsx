import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { fieldOf, focusPath } from '#client/cut-sheets/planner/focus-path.ts';

beforeEach(() => {
  document.body.innerHTML = `<form>
    <select name="machineId"></select>
    <select name="panel.root.sectionId"></select>
    <details><summary>2</summary><input name="features.1.rootStation" /><input name="features.1.widthMm" /></details>
    <details><summary>Ribs</summary><details><input name="ribs.stations.count" /></details></details>
  </form>`;
  // jsdom has no layout to scroll.
  Element.prototype.scrollIntoView = vi.fn();
});
afterEach(() => {
  document.body.innerHTML = '';
});
const form = () => document.querySelector('form')!;
const focused = () => document.activeElement?.getAttribute('name');

test.each([
  ['machine.towerDistanceMm', 'machineId'],
  ['material.feedMmMin', 'materialId'],
  ['panel.tip.shape', 'panel.tip.sectionId'],
  ['panel.root', 'panel.root.chordMm'],
  ['block', 'block.lengthMm'],
  ['ribs.stations.mm.3', 'ribs.stations.mm'],
  ['inspection.stations.0', 'inspection.stations'],
  ['kerfMm.root', 'kerfMm.root'],
])('%s belongs to the field %s', (path, field) => {
  expect(fieldOf(path)).toBe(field);
});

test('focuses the field and opens what it is folded into', () => {
  expect(focusPath(form(), 'features.1.widthMm')).toBe(true);
  expect(focused()).toBe('features.1.widthMm');
  expect(document.querySelector('details')!.open).toBe(true);
  focusPath(form(), 'ribs.stations');
  expect([...document.querySelectorAll('details')].map(({ open }) => open)).toEqual([true, true, true]);
});

test('takes the nearest field where there is none of that path', () => {
  focusPath(form(), 'features.1.tipDepthMm');
  expect(focused()).toBe('features.1.rootStation');
  focusPath(form(), 'machine.controller.axes');
  expect(focused()).toBe('machineId');
  expect(focusPath(form(), 'paper')).toBe(false);
});
