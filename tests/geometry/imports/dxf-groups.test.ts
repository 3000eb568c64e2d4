import { describe, expect, test } from 'vitest';
import { type DxfGroup, dxfNumber, eachDxfGroup } from '#geometry/imports/dxf-groups.ts';
import { refusalOf } from './files.ts';

function groupsOf(text: string, wants: (code: number) => boolean = () => true): DxfGroup[] {
  const groups: DxfGroup[] = [];
  eachDxfGroup(text, wants, (group) => groups.push(group));
  return groups;
}

describe('pairs of lines', () => {
  test('codes and values, whichever way lines end', () => {
    for (const end of ['\n', '\r\n', '\r']) {
      expect(groupsOf(['  0', 'LINE', ' 10', ' 1.5 ', '-5', '', '0', 'EOF', '0', 'X'].join(end))).toEqual([
        { code: 0, value: 'LINE', line: 1 },
        { code: 10, value: '1.5', line: 3 },
        { code: -5, value: '', line: 5 },
      ]);
    }
  });

  test('only wanted codes are handed over, and those that begin something', () => {
    expect(groupsOf('0\nA\n5\nx\n10\n1\n', (code) => code === 10).map(({ code }) => code)).toEqual([0, 10]);
  });

  test('blank lines at the end are none', () => {
    expect(groupsOf('0\nA\n\n  \n')).toHaveLength(1);
    expect(groupsOf('')).toEqual([]);
  });

  test('a line that is no code is refused with its number', () => {
    for (const bad of ['x', '1.5', '', '99999999999999', '- 5']) {
      const refusal = refusalOf(() => groupsOf(`0\nA\n${bad}\n1\n`));
      expect([refusal.code, refusal.line]).toEqual(['broken-drawing', 3]);
      expect(refusal.message).toContain('Line 3 should be a group code of a DXF drawing');
    }
  });
});

test('a number in a group, or a refusal that names its line', () => {
  const group = (value: string) => ({ code: 10, value, line: 7 });
  expect([dxfNumber(group('-1.5e2')), dxfNumber(group('0'))]).toEqual([-150, 0]);
  for (const bad of ['', 'x', 'NaN', 'Infinity', '1e999', '1'.repeat(65)]) {
    const refusal = refusalOf(() => dxfNumber(group(bad)));
    expect([refusal.code, refusal.line]).toEqual(['broken-drawing', 8]);
  }
});
