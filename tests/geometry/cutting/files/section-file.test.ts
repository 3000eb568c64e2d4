import { expect, test } from 'vitest';
import { type Polyline, polylineOf } from '#geometry/cutting/arrays.ts';
import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { ENDS } from '#geometry/cutting/plan.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { farthest, fine } from '../measuring.ts';
import { PLAN, planWith, section } from '../plans.ts';
import { SHEET, fileOf, planned, textOf } from './sheet-example.ts';

/** A plain reader: a name line, then two numbers on each line. */
function readPlain(text: string): { readonly name: string; readonly line: Polyline } {
  const [name = '', ...lines] = text.trimEnd().split('\n');
  const points = lines.map((line) => {
    const [x, y, ...more] = line.trim().split(/ +/).map(Number);
    if (x === undefined || y === undefined || more.length > 0 || !Number.isFinite(x) || !Number.isFinite(y))
      throw new Error(`Not two numbers: ${line}`);
    return { x, y };
  });
  return { name, line: polylineOf(points) };
}

test.each(['open', 'closed'] as const)(
  'coordinates are the section’s at its chord within the tolerance, trailing edge %s',
  (edge) => {
    const panel = {
      root: { shape: section('2412', edge), chordMm: 220 },
      tip: { shape: section('0010', edge), chordMm: 160 },
    };
    const core = planned(planWith({ panel }));
    for (const end of ENDS) {
      const { line } = readPlain(textOf(core, `${end}.dat`));
      const exact = fine(outlineOf(panel[end].shape), panel[end].chordMm);
      expect(farthest(exact, line)).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
      expect(farthest(line, exact)).toBeLessThanOrEqual(1e-4);
      expect(line.x[0]).toBeCloseTo(panel[end].chordMm, 0);
      expect(Math.min(...line.x)).toBeGreaterThan(-0.1);
    }
  },
);

test('washout, sweep, skin and stock change the coordinates of a section by nothing', () => {
  const plain = textOf(planned(PLAN), 'tip.dat');
  const changed = planWith({
    panel: { washoutDeg: -3, sweepMm: 80, verticalOffsetMm: 9 },
    allowances: { upperMm: 0.5, lowerMm: 0.5 },
    stock: { leadingEdgeStation: 0.05, trailingEdgeStation: 0.9 },
    features: [],
  });
  expect(textOf(planned(changed), 'tip.dat')).toBe(plain);
});

test('the name line says sheet, section, chord and both checksums', () => {
  const file = fileOf(cutFiles(planned(PLAN), SHEET), 'tip.dat');
  const { name, line } = readPlain(file.text);
  expect(name).toBe(
    'Reed wing v3 tip, released, Section Marsh tip v2, NACA 2410, checksum 0f1e2d3c4b5a, chord 160 mm, unit mm, tolerance 0.01 mm, Sheet checksum 3f2a9c81b0de, code 7WN9-S0DG',
  );
  expect(file.facts).toMatchObject({ kind: 'coordinates', points: line.x.length });
});
