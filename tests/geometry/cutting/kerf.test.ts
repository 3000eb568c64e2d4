import { expect, test } from 'vitest';
import { kerfFromEnds, kerfFromWidths } from '#geometry/cutting/kerf.ts';

const COMMANDED = [10, 20, 40];
const pathsOf = (measured: number[], commanded = COMMANDED) => {
  const { kerf, findings } = kerfFromWidths(commanded, measured);
  expect(kerf).toBeNull();
  for (const { message } of findings) expect(message).toMatch(/^[A-Z0-9][^\n]*\.$/);
  return findings.map(({ path }) => path);
};

test('the kerf is the mean of commanded less measured, with largest less smallest as spread', () => {
  const { kerf, findings } = kerfFromWidths(COMMANDED, [9.2, 19.1, 39.3]);
  expect(findings).toEqual([]);
  // 0.8, 0.9 and 0.7.
  expect(kerf!.kerfMm).toBeCloseTo(0.8, 12);
  expect(kerf!.spreadMm).toBeCloseTo(0.2, 12);
  expect(kerf!.singleMm[1]).toBeCloseTo(0.9, 12);
});

test('widths that can’t be right are refused, each with its field', () => {
  expect(pathsOf([9.2, 20, 39.2])).toEqual(['measuredMm.1']);
  expect(pathsOf([9.2, 19.2, 30])).toEqual(['measuredMm.2']);
  expect(pathsOf([NaN, -1, Infinity])).toEqual(['measuredMm.0', 'measuredMm.1', 'measuredMm.2']);
  expect(pathsOf([9.2, 19.2, 39.2], [0, 20, NaN])).toEqual(['commandedMm.0', 'commandedMm.2']);
  expect(pathsOf([9.2, 19.2])).toEqual(['measuredMm']);
  expect(pathsOf([], [])).toEqual(['measuredMm']);
});

test('a piece that gives another kerf than the middle one is to be measured again', () => {
  expect(pathsOf([9.2, 18.2, 39.2])).toEqual(['measuredMm.1']);
  // Of two that differ neither is known to be right.
  expect(pathsOf([9.2, 18], [10, 20])).toEqual(['measuredMm.0', 'measuredMm.1']);
  // 0.3 mm beside a middle of 0.8 mm is within half of it.
  expect(kerfFromWidths(COMMANDED, [9.2, 18.9, 39.2]).kerf).not.toBeNull();
  // A narrow kerf may differ by 0.2 mm, the caliper's and the edge's share.
  expect(kerfFromWidths(COMMANDED, [9.9, 19.75, 39.85]).kerf).not.toBeNull();
  expect(pathsOf([9.9, 19.9, 39.65])).toEqual(['measuredMm.2']);
});

test('both ends of the wire: the mean for the plan, the difference to be looked at', () => {
  const { kerf } = kerfFromEnds(COMMANDED, [9.2, 19.2, 39.2], [9, 19, 39]);
  expect(kerf!.left.kerfMm).toBeCloseTo(0.8, 12);
  expect(kerf!.right.kerfMm).toBeCloseTo(1, 12);
  expect(kerf!.kerfMm).toBeCloseTo(0.9, 12);
  expect(kerf!.differenceMm).toBeCloseTo(0.2, 12);
  const refused = kerfFromEnds(COMMANDED, [9.2, 19.2, 39.2], [9, 29, 39]);
  expect(refused.kerf).toBeNull();
  expect(refused.findings.map(({ path }) => path)).toEqual(['rightMm.1']);
});
