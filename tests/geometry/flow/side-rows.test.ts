import { expect, test } from 'vitest';
import { PER_NODE } from '#geometry/flow/march.ts';
import { SideRows } from '#geometry/flow/side-rows.ts';
import { prepared, started } from './prepared.ts';

const { coupled, layer } = started(prepared('0012', 60), 0, { reynolds: 1e6 });
const { march } = coupled;
const size = layer.size;

/** Answers of made-up numbers: rows of a matrix that the expressions are multiplied with. */
const number = (i: number, k: number) => Math.sin(3 * i + 1.7 * k);
for (const i of [40, 41]) for (let k = 0; k < PER_NODE; k++) march.answers[i * PER_NODE + k] = number(i, k);

test('the expressions of a station are its answers applied to those of the station before', () => {
  const rows = new SideRows(march);
  rows.advance(40, -1, null, 40, 40);
  rows.advance(41, 40, null, 40, 41);
  // Mass defects of 0.3 and −0.2 at both nodes, evaluated step by step.
  const [m1, m2] = [0.3, -0.2];
  const first = [0, 7, 14].map((at) => number(40, at) + number(40, at + 5) * m1);
  const second = [0, 7, 14].map((at) =>
    number(41, at) + number(41, at + 1) * first[0]! + number(41, at + 2) * first[1]! + number(41, at + 3) * first[2]! + number(41, at + 4) * m1 + number(41, at + 5) * m2); // prettier-ignore
  [rows.theta, rows.c, rows.ue].forEach((row, k) => {
    expect(row[40]! * m1 + row[41]! * m2 + row[size]!).toBeCloseTo(second[k]!, 12);
  });
});

test('the place of transition answers to the growth upstream, and the station behind it to the place', () => {
  const rows = new SideRows(march);
  rows.advance(40, -1, null, 40, 40);
  rows.advanceGrowth(40, true, 40, 40);
  const rate = march.growth.rates.slice(160, 164);
  const change = { node: 41, xi: 0.5, byN: -2, byRate: 3, byRateBefore: 0 };
  rows.setShare(change);
  const total = layer.dstar[40]! / layer.ue[40]!;
  const m1 = 0.3;
  const [theta, ue] = [0, 14].map((at) => number(40, at) + number(40, at + 5) * m1);
  const dstar = m1 / layer.ue[40]! - total * ue!;
  const share = 3 * (rate[1]! * theta! + rate[2]! * dstar + rate[3]! * ue!);
  expect(rows.xi[40]! * m1 + rows.xi[size]!).toBeCloseTo(share, 6);
  const before =
    number(41, 1) * theta! + number(41, 2) * (number(40, 7) + number(40, 12) * m1) + number(41, 3) * ue!;
  rows.advance(41, 40, rows.xi, 40, 41);
  const wanted = number(41, 0) + before + number(41, 4) * m1 + number(41, 6) * share;
  expect(rows.theta[40]! * m1 + rows.theta[size]!).toBeCloseTo(wanted, 6);
  rows.clear();
  expect(rows.theta.every((value) => value === 0)).toBe(true);
});
