import { parseStringSync } from 'gcode-parser';
import { describe, expect, test } from 'vitest';
import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { pairsOf } from '../../formats/dxf-pairs.ts';
import { NASTY_NAMES } from '../../formats/identity-example.ts';
import { PLAN, RIBS, SLOT, TEMPLATE, TUBE, planWith } from '../plans.ts';
import { SHEET, WHOLE, fileOf, planned, readDxf } from './sheet-example.ts';

const whole = planned(WHOLE);
const files = cutFiles(whole, SHEET);
const namesOf = (plan: Plan) => cutFiles(planned(plan), SHEET).map(({ name }) => name);

test('a sheet of everything has all files, named for their place and for saving, with their part and kind', () => {
  expect(files.map(({ name, downloadName, part }) => [name, downloadName, part])).toEqual([
    ['root.dxf', 'reed-wing_v3_root_220mm.dxf', 'core'],
    ['tip.dxf', 'reed-wing_v3_tip_160mm.dxf', 'core'],
    ['core.nc', 'reed-wing_v3_core_220-160mm.nc', 'core'],
    ['ribs-1.dxf', 'reed-wing_v3_ribs-1_220-160mm.dxf', 'ribs'],
    ['root.dat', 'reed-wing_v3_root_220mm.dat', 'sheet'],
    ['tip.dat', 'reed-wing_v3_tip_160mm.dat', 'sheet'],
  ]);
  for (const { name, mediaType } of files)
    expect(mediaType).toBe(name.endsWith('.dxf') ? 'image/vnd.dxf' : 'text/plain; charset=utf-8');
});

test('what a plan does not have has no file', () => {
  expect(namesOf(PLAN)).toEqual(['root.dxf', 'tip.dxf', 'core.nc', 'root.dat', 'tip.dat']);
  expect(namesOf({ ...PLAN, machine: null, template: TEMPLATE })).toEqual([
    'root.dxf',
    'tip.dxf',
    'root.dat',
    'tip.dat',
  ]);
  const ribsAlone = { ...PLAN, machine: null, block: null, material: null, ribs: RIBS };
  expect(namesOf(ribsAlone)).toEqual(['ribs-1.dxf', 'root.dat', 'tip.dat']);
});

test('the same plan and identity give the same bytes', () => {
  const again = cutFiles(planned(structuredClone(WHOLE)), structuredClone(SHEET));
  expect(again).toEqual(files);
  expect(again.map(({ text }) => text)).toEqual(files.map(({ text }) => text));
});

test('facts are what the files hold', () => {
  for (const end of ['root', 'tip'] as const) {
    const { facts, text } = fileOf(files, `${end}.dxf`);
    const { vertices = [] } = readDxf(text).on('CUT')[0]!;
    const [xs, ys] = [vertices.map(({ x }) => x), vertices.map(({ y }) => y)];
    if (facts.kind !== 'outline') throw new Error(facts.kind);
    expect(facts.pairs).toBe(vertices.length);
    expect(Math.abs(facts.widthMm - (Math.max(...xs) - Math.min(...xs)))).toBeLessThanOrEqual(2e-5);
    expect(Math.abs(facts.heightMm - (Math.max(...ys) - Math.min(...ys)))).toBeLessThanOrEqual(2e-5);
  }
  const program = fileOf(files, 'core.nc');
  expect(program.facts).toEqual({
    kind: 'program',
    lines: program.text.trimEnd().split('\n').length,
    seconds: whole.cut!.program.totalSeconds,
  });
});

test('core.nc is the plan’s program, read by an independent reader as millimetres, absolute, ended', () => {
  const { text } = fileOf(files, 'core.nc');
  expect(text).toBe(whole.cut!.program.text);
  const words = parseStringSync(text).flatMap((line) => line.words);
  const codes = words.filter(([letter]) => letter === 'G').map(([, value]) => value);
  expect(codes.slice(0, 3)).toEqual([21, 90, 93]);
  const moves = whole.cut!.program.lineOfNode.filter((line) => line > 0).length;
  expect(codes.filter((code) => code === 1)).toHaveLength(moves);
  expect(words.at(-1)).toEqual(['M', 2]);
});

test.each([
  ['version', { versionNumber: 4 }],
  ['checksum', { checksum: 'f'.repeat(64) }],
  ['name', { sheetName: 'Other wing' }],
])('a program planned under another %s is refused', (_, change) => {
  expect(() => cutFiles(whole, { ...SHEET, ...change })).toThrow('it is of another version');
});

test('old controllers get R12 with the same outlines', () => {
  for (const name of ['root.dxf', 'ribs-1.dxf']) {
    const old = readDxf(fileOf(cutFiles(whole, SHEET, { release: 'r12' }), name).text);
    expect(old.header['$ACADVER']).toBe('AC1009');
    const cut = (of: typeof old) =>
      of.on('CUT').map(({ vertices, radius }) => radius ?? vertices!.map(({ x, y }) => [x, y]));
    expect(cut(old)).toEqual(cut(readDxf(fileOf(files, name).text)));
  }
});

describe('free text stays on its line', () => {
  const hostile = [
    ...NASTY_NAMES,
    'wing) G0 X0 Y0 (',
    'wing\nG0 X999 Y999 F99999\n(',
    'wing\r\n  0\r\nLINE\r\n  8\r\nCUT',
    '(MSG,now) (DEBUG,#1)',
    '%\nO0001\nM3 S9999',
    '; M104 S200',
  ].map((name) => name.slice(0, 60));

  /** What a machine obeys, and nothing that is only read: group codes and geometry, words of a program, numbers. */
  const obeyed = (name: string, text: string): string => {
    if (name.endsWith('.dxf')) {
      expect(text).toMatch(/^[\x20-\x7e\r\n]*$/);
      const { on } = readDxf(text);
      const geometry = ['CUT', 'SLOT', 'ENGRAVE', 'REFERENCE'].map((layer) => on(layer));
      return JSON.stringify([pairsOf(text).map(({ code }) => code), geometry]);
    }
    if (name.endsWith('.nc')) {
      expect(text).toMatch(/^[\x20-\x7e\n]*$/);
      expect(text.split('\n').filter((line) => !/^[^()]*(?:\([^()]*\))?$/.test(line))).toEqual([]);
      return JSON.stringify(parseStringSync(text).map(({ words }) => words));
    }
    const [, ...numbers] = text.split('\n');
    return numbers.join('\n');
  };
  /** A coarse plan of all parts with all its names, and the identity with all its texts, set to one text. */
  const named = (text: string): { plan: Plan; identity: SheetIdentity } => ({
    plan: planWith({
      cut: { toleranceMm: 0.2, pointsPerSurface: 10 },
      ribs: { ...RIBS, stations: { kind: 'count', count: 2 }, lighteningHoles: null },
      template: { ...TEMPLATE, ticks: 6 },
      features: [
        { ...TUBE, name: text },
        { ...SLOT, name: text },
      ],
      machine: { name: text },
      material: { name: text },
    }),
    identity: {
      ...SHEET,
      sheetName: text,
      status: text,
      shortCode: text,
      address: text,
      root: { ...SHEET.root, sectionName: text, designation: text, checksum: text },
      tip: { ...SHEET.tip, sectionName: text, designation: text, checksum: text },
      author: text,
      releasedBy: text,
      machineName: text,
      materialName: text,
      ribMaterialName: text,
    },
  });
  const write = (text: string) => {
    const { plan, identity } = named(text);
    return cutFiles(planned(plan, identity), identity);
  };
  const harmless = write('Marsh');
  const wanted = harmless.map(({ name, text }) => obeyed(name, text));

  test('all kinds of files are tried', () => {
    expect(harmless.map(({ name }) => name)).toEqual(files.map(({ name }) => name));
  });

  test.each(hostile)('%j', (text) => {
    const written = write(text);
    expect(written.map(({ name }) => name)).toEqual(harmless.map(({ name }) => name));
    written.forEach(({ name, text: content, downloadName }, i) => {
      expect(obeyed(name, content) === wanted[i], name).toBe(true);
      expect(downloadName).toMatch(/^[a-z0-9][a-z0-9._-]*$/);
    });
  });
});
