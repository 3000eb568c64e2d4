import { expect, test } from 'vitest';
import { readProgram } from '#geometry/cutting/read-program.ts';
import { PLAN } from './plans.ts';

test.each([
  ['inches', 'G20 G90\nG1 X1 F10', 'unclear-move', 2],
  ['increments', 'G21 G91\nG1 X1 F10', 'unclear-move', 2],
  ['units never stated', 'G1 X1 F10', 'unclear-move', 1],
  ['arcs', 'G21 G90\nG2 X1 Y1 F10', 'unsupported-code', 2],
  ['a shifted origin', 'G21 G90\nG92 X0', 'unsupported-code', 2],
  ['a letter that is no axis', 'G21 G90\nG1 Q1 F10', 'unclear-move', 2],
  ['no F under G93', 'G21 G90\nG93\nG1 X1', 'unclear-move', 3],
  ['no feed', 'G21 G90\nG1 X1', 'unclear-move', 2],
  ['no motion mode', 'G21 G90\nX1', 'unclear-move', 2],
  ['rubbish', 'G21 G90\nhello?', 'unreadable-line', 2],
])('a program with %s is a finding with its line', (_, text, code, line) => {
  const { findings } = readProgram(text, PLAN.machine);
  expect(findings).toEqual([expect.objectContaining({ severity: 'error', code, at: { line } })]);
});

test('the reader keeps modes, skips comments and blanks, and adds waits', () => {
  const text = 'g21 g90 (mm)\n\nG94 ; per minute\nG1 X60 Y0 U60 V0 F60\nX60 Y60 U60 V60\nG4 P2.5\nG0 X0\n';
  const { moves, totalSeconds, findings } = readProgram(text, PLAN.machine);
  expect(findings).toEqual([]);
  expect(moves.map(({ line, leftX, leftY }) => [line, leftX, leftY])).toEqual([
    [0, 0, 0],
    [4, 60, 0],
    [5, 60, 60],
    [7, 0, 60],
  ]);
  // All axes: √2 · 60 mm at 60 mm/min twice, 2.5 s, and 60 mm at 1200 mm/min.
  expect(totalSeconds).toBeCloseTo(2 * 60 * Math.SQRT2 + 2.5 + 3, 9);
});

test.each([
  // 30 mm on the left tower, 40 mm on the right: 50 mm over all axes.
  ['all-axes', 50],
  ['left-tower', 30],
] as const)('G94 over %s: F is taken over %i mm', (feedOver, wayMm) => {
  const machine = { ...PLAN.machine, controller: { ...PLAN.machine.controller, feedOver } };
  const { moves } = readProgram('G21 G90\nG94\nG1 X30 Y0 U0 V40 F60\nG1 X30 Y0 U0 V100 F60', machine);
  expect(moves.map(({ seconds }) => seconds)).toEqual([0, wayMm, 60]);
});

test.each([
  ['per-minute', 15],
  ['per-second', 0.25],
  ['seconds', 4],
] as const)('G93 %s: F%f is four seconds whatever the way', (inverseTime, value) => {
  const machine = { ...PLAN.machine, controller: { ...PLAN.machine.controller, inverseTime } };
  const { moves, totalSeconds } = readProgram(`G21 G90 G93\nG1 X1 F${value}\nG1 V300 F${value}`, machine);
  expect(moves.map(({ seconds }) => seconds)).toEqual([0, 4, 4]);
  expect(totalSeconds).toBe(8);
});

test('waits in milliseconds, other letters of the machine, and words in any order', () => {
  const { controller } = PLAN.machine;
  const axes = { leftX: 'A', leftY: 'B', rightX: 'X', rightY: 'Z' } as const;
  const machine = {
    ...PLAN.machine,
    controller: { ...controller, axes, dwellUnit: 'milliseconds' as const },
  };
  const read = readProgram('N10 G90 G21\nN20 F60 Z4 X3 G1 G94\nG4 P1500\nM5', machine);
  expect(read.findings).toEqual([]);
  expect(read.moves.at(-1)).toEqual({ line: 2, leftX: 0, leftY: 0, rightX: 3, rightY: 4, seconds: 5 });
  expect(read.totalSeconds).toBe(6.5);
});

test('an unreadable line is passed over and those after it are read', () => {
  const { moves, findings } = readProgram('G21 G90 G94\nG1 X1 F60 ?\nG1 X2 F60', PLAN.machine);
  expect(findings.map(({ at }) => at?.line)).toEqual([2]);
  expect(moves.map(({ leftX }) => leftX)).toEqual([0, 2]);
});
