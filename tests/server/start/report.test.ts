import { describe, expect, it } from 'vitest';
import { countReport, type Report } from '#tests/report.ts';

const file = (name: string, ...statuses: string[]): Report['testResults'][number] => ({
  name,
  status: statuses.includes('failed') ? 'failed' : 'passed',
  assertionResults: statuses.map((status, index) => ({ status, fullName: `test ${String(index)}` })),
});
const count = (files: Report['testResults'], code = 0, expected: string[] = []): [number, number] => {
  const { passed, failed } = countReport({ testResults: files }, code, expected);
  return [passed, failed];
};

describe('countReport', () => {
  it('counts tests', () => {
    expect(count([file('a', 'passed', 'passed'), file('b', 'passed')])).toEqual([3, 0]);
    expect(count([file('a', 'passed', 'failed')], 1)).toEqual([1, 1]);
  });

  it.each(['skipped', 'pending', 'todo'])('counts a test that is %s as failed', (status) => {
    expect(count([file('a', 'passed', status)])).toEqual([1, 1]);
  });

  it('counts a file without tests, and one that failed outside them, as failed', () => {
    expect(count([file('a')])).toEqual([0, 1]);
    expect(count([{ ...file('a', 'passed'), status: 'failed' }], 1)).toEqual([1, 1]);
  });

  it('counts a file that was expected and not run as failed', () => {
    expect(count([file('a', 'passed')], 0, ['a', 'b'])).toEqual([1, 1]);
  });

  it('counts a bad end without a failed test as failed', () => {
    expect(count([file('a', 'passed')], 1)).toEqual([1, 1]);
  });

  it('counts a missing report as failed', () => {
    expect(countReport(undefined, 0, [])).toMatchObject({ passed: 0, failed: 1 });
  });
});
