import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Polyline, at, boxOf, polylineOf } from '#geometry/cutting/arrays.ts';
import { toBlock } from '#geometry/cutting/block.ts';
import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { pairsInStep } from '#geometry/cutting/files/in-step.ts';
import { type CorePlan } from '#geometry/cutting/planner.ts';
import { ENDS } from '#geometry/cutting/plan.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { distanceTo, farthest, fine } from '../measuring.ts';
import { PLAN, SLOT, TUBE, planWith, plans, prismOf, section } from '../plans.ts';
import { type ReadEntity, SHEET, WHOLE, planned, readDxf, textOf } from './sheet-example.ts';

const whole = planned(WHOLE);
const root = readDxf(textOf(whole, 'root.dxf'));
const tip = readDxf(textOf(whole, 'tip.dxf'));
const both = { root, tip };

const lineOf = ({ vertices = [] }: ReadEntity): Polyline => polylineOf(vertices);
const only = (entities: readonly ReadEntity[]): ReadEntity => {
  expect(entities).toHaveLength(1);
  return entities[0]!;
};

/** Largest distance between the vertices of a file's outline and the pairs of the plan that it stands for, mm. */
function offPlan(core: CorePlan, end: 'root' | 'tip', entity: ReadEntity): number {
  const pairs = pairsInStep(core.core);
  const { core: wanted } = core.core[end];
  expect(entity.vertices).toHaveLength(pairs.length);
  const off = pairs.map((pair, k) => {
    const { x, y } = entity.vertices![k]!;
    return Math.hypot(x - at(wanted.x, pair), y - at(wanted.y, pair));
  });
  return Math.max(...off);
}

test('states millimetres and carries the five layers', () => {
  for (const end of ENDS) {
    expect(both[end].header).toMatchObject({ $ACADVER: 'AC1015', $INSUNITS: 4 });
    expect(both[end].layers).toEqual(['0', 'CUT', 'SLOT', 'ENGRAVE', 'REFERENCE', 'TEXT']);
    for (const layer of both[end].layers.slice(1)) expect(both[end].on(layer).length).toBeGreaterThan(0);
  }
});

test('CUT is one closed outline in step at both ends, each vertex where the plan has it', () => {
  for (const end of ENDS) {
    const outline = only(both[end].on('CUT'));
    expect(outline.shape).toBe(true);
    expect(offPlan(whole, end, outline)).toBeLessThanOrEqual(1e-5);
  }
  expect(root.on('CUT')[0]!.vertices).toHaveLength(tip.on('CUT')[0]!.vertices!.length);
});

test('its extents are those of the core, and the header’s those of all that is drawn', () => {
  for (const end of ENDS) {
    const box = boxOf(lineOf(only(both[end].on('CUT'))));
    const wanted = boxOf(whole.core[end].core);
    for (const side of ['minX', 'maxX', 'minY', 'maxY'] as const)
      expect(Math.abs(box[side] - wanted[side])).toBeLessThanOrEqual(1e-5);
    const drawn = both[end].entities.filter(({ vertices }) => vertices).map(lineOf);
    const all = boxOf(...drawn);
    expect(both[end].header['$EXTMIN']).toMatchObject({ x: all.minX, y: all.minY });
    expect(both[end].header['$EXTMAX']).toMatchObject({ x: all.maxX, y: all.maxY });
  }
});

test('random panels: in step, within 0.005 mm of the plan, no pair lost that a file can tell apart', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const core = planned(plan);
      const files = { root: readDxf(textOf(core, 'root.dxf')), tip: readDxf(textOf(core, 'tip.dxf')) };
      const pairs = new Set(pairsInStep(core.core));
      for (const end of ENDS) {
        const outline = only(files[end].on('CUT'));
        expect(offPlan(core, end, outline)).toBeLessThanOrEqual(0.005);
        const { x, y } = core.core[end].core;
        for (let i = 0; i < x.length; i++) {
          if (pairs.has(i)) continue;
          const nearest = Math.min(
            ...outline.vertices!.map((vertex) => Math.hypot(vertex.x - at(x, i), vertex.y - at(y, i))),
          );
          expect(nearest).toBeLessThanOrEqual(2e-5);
        }
      }
    }),
    { numRuns: 6 },
  );
});

test('where one end stands still and the other moves on, the vertex stands twice', () => {
  const blunt = { kind: 'cst', n1: 0.5, n2: 1, trailingEdgeGap: 0.04 } as const;
  const shape = { ...blunt, upper: [0.2, 0.2, 0.2], lower: [-0.1, -0.1, -0.1] };
  const core = planned(planWith({ panel: { tip: { shape, chordMm: 160 } }, features: [] }));
  const standing = ENDS.map((end) => {
    const outline = only(readDxf(textOf(core, `${end}.dxf`)).on('CUT'));
    expect(offPlan(core, end, outline)).toBeLessThanOrEqual(1e-5);
    const { vertices = [] } = outline;
    return vertices.map(({ x, y }, i) => x === vertices.at(i - 1)!.x && y === vertices.at(i - 1)!.y);
  });
  const [atRoot = [], atTip = []] = standing;
  expect(atRoot).toContain(true);
  expect(atRoot.some((stands, i) => stands && atTip[i])).toBe(false);
});

test('a prism without skin is cut as the section itself', () => {
  const core = planned(prismOf(section('2412'), 200));
  const exact = fine(outlineOf(section('2412')), 200);
  for (const end of ENDS) {
    const outline = lineOf(only(readDxf(textOf(core, `${end}.dxf`)).on('CUT')));
    expect(farthest(exact, outline)).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
    expect(farthest(outline, exact)).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
  }
});

test('SLOT has every feature at its place, in step, and the tube’s entry slit from the surface to the hole', () => {
  for (const end of ENDS) {
    const [tube, slit, slot] = both[end].on('SLOT');
    expect(both[end].on('SLOT')).toHaveLength(3);
    const around = boxOf(lineOf(tube!));
    expect(around.maxY - around.minY).toBeCloseTo(TUBE.diameterMm, 1);
    expect(slot!.vertices).toHaveLength(4);
    const notch = boxOf(lineOf(slot!));
    expect(notch.maxX - notch.minX).toBeCloseTo(SLOT.widthMm, 4);
    const [from, to] = slit!.vertices!;
    const foam = lineOf(only(both[end].on('CUT')));
    expect(distanceTo(foam, from!.x, from!.y)).toBeLessThan(0.01);
    expect(distanceTo(lineOf(tube!), to!.x, to!.y)).toBeLessThan(1e-4);
    expect(from!.x).toBeCloseTo(to!.x, 4);
  }
  const counts = (of: typeof root) => of.on('SLOT').map(({ vertices }) => vertices?.length);
  expect(counts(root)).toEqual(counts(tip));
});

test('strips and hinges are on SLOT with the plan’s own vertices, in step even where a hinge is a plain slit', () => {
  const stations = (at: number) => ({ rootStation: at, tipStation: at });
  const strip = { kind: 'strip', name: 'Web', ...stations(0.3), widthMm: 3 } as const;
  const hinge = { kind: 'hinge', name: '', hingeSurface: 'upper', webMm: 0.5, ...stations(0.7) } as const;
  for (const bevelDeg of [0, 30]) {
    const core = planned(planWith({ features: [strip, { ...hinge, bevelDeg }] }));
    expect(core.features).toHaveLength(2);
    for (const end of ENDS) {
      const slots = readDxf(textOf(core, `${end}.dxf`)).on('SLOT');
      expect(slots).toHaveLength(2);
      slots.forEach(({ vertices, shape }, k) => {
        const { outline } = core.features[k]![end];
        expect(shape).toBe(true);
        expect(vertices).toHaveLength(outline.x.length);
        const off = vertices!.map(({ x, y }, i) => Math.hypot(x - at(outline.x, i), y - at(outline.y, i)));
        expect(Math.max(...off)).toBeLessThanOrEqual(1e-5);
      });
    }
  }
});

test('REFERENCE has the whole section in its place, its chord line, and the block about the core', () => {
  for (const end of ENDS) {
    const [contour, chord, block] = both[end].on('REFERENCE');
    const placed = whole.core.panel[end];
    const exact = fine(placed.outline, 1);
    const wanted = polylineOf(Array.from(exact.x, (x, i) => placed.toPanel({ x, y: at(exact.y, i) })));
    expect(farthest(wanted, lineOf(contour!))).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
    const [nose, edge] = chord!.vertices!;
    expect(Math.hypot(edge!.x - nose!.x, edge!.y - nose!.y)).toBeCloseTo(placed.chordMm, 4);
    const turn = Math.atan2(edge!.y - nose!.y, edge!.x - nose!.x);
    expect((turn * 180) / Math.PI).toBeCloseTo(end === 'root' ? 0 : 2, 4);
    const inBlock = toBlock(whole.fit!.places[0]!, lineOf(block!));
    [0, 260, 260, 0].forEach((x, i) => expect(at(inBlock.x, i)).toBeCloseTo(x, 4));
    [0, 0, 60, 60].forEach((y, i) => expect(at(inBlock.y, i)).toBeCloseTo(y, 4));
  }
});

test('a tilted block is drawn as the block lies about the panel', () => {
  const core = planned(planWith({ block: { tiltDeg: 3 } }));
  const block = readDxf(textOf(core, 'root.dxf')).on('REFERENCE')[2]!;
  const inBlock = toBlock(core.fit!.places[0]!, lineOf(block));
  [0, 260, 260, 0].forEach((x, i) => expect(at(inBlock.x, i)).toBeCloseTo(x, 4));
  [0, 0, 60, 60].forEach((y, i) => expect(at(inBlock.y, i)).toBeCloseTo(y, 4));
});

test('ENGRAVE has a level line through the washout’s axis and the template’s ticks on the foam’s edge', () => {
  for (const end of ENDS) {
    const [level, ...others] = both[end].on('ENGRAVE');
    const axis = whole.core.panel[end].toPanel({ x: 0.25, y: 0 });
    for (const { y } of level!.vertices!) expect(y).toBeCloseTo(axis.y, 4);
    const foam = lineOf(only(both[end].on('CUT')));
    for (const { x, y } of level!.vertices!) expect(distanceTo(foam, x, y)).toBeLessThan(1e-4);
    const ticks = others.filter(({ vertices }) => {
      const [foot] = vertices!;
      return vertices!.length === 2 && distanceTo(foam, foot!.x, foot!.y) < 0.1;
    });
    // 41 ticks, without those at the trailing edge, which the foam does not reach.
    expect(ticks.length).toBeGreaterThanOrEqual(37);
    expect(ticks.length).toBeLessThanOrEqual(39);
    expect(others.length).toBeGreaterThan(ticks.length + 6);
  }
});

test('without templates only the level line is engraved', () => {
  const dxf = readDxf(textOf(planned(PLAN), 'tip.dxf'));
  expect(only(dxf.on('ENGRAVE')).vertices).toHaveLength(2);
});

test('TEXT says sheet, version, part, chord, unit, checksum, code and cautions, clear below the drawing', () => {
  for (const end of ENDS) {
    const texts = both[end].on('TEXT');
    expect(texts.map(({ text }) => text)).toEqual([
      'Reed wing v3, released',
      `Part: core, ${end}, chord ${end === 'root' ? 220 : 160} mm, unit mm`,
      end === 'root'
        ? 'Section Marsh v5, NACA 2412, checksum a1b2c3d4e5f6'
        : 'Section Marsh tip v2, NACA 2410, checksum 0f1e2d3c4b5a',
      'Core of EPS 20 on Long bench',
      'Sheet checksum 3f2a9c81b0de, code 7WN9-S0DG',
      'CUT is the finished foam, skins taken off, without the kerf (planned 0.8 mm)',
      'Root and tip in step, one origin: root leading edge, x aft, y up',
      'Caution: hot wire burns, fumes harm: ventilate, dry run with a cold wire first',
    ]);
    const lowest = (both[end].header['$EXTMIN'] as { y: number }).y;
    for (const { startPoint } of texts) expect(startPoint!.y).toBeLessThan(lowest - 1);
  }
});

test('a core cut by hand names no machine, a pair says that the second core is mirrored', () => {
  const byHand = planned({ ...PLAN, machine: null });
  const [file] = cutFiles(byHand, { ...SHEET, machineName: null });
  expect(
    readDxf(file!.text)
      .on('TEXT')
      .map(({ text }) => text),
  ).toContain('Core of EPS 20');
  const pair = planned(planWith({ block: { heightMm: 140, pair: true } }));
  expect(pair.fit!.places).toHaveLength(2);
  expect(textOf(pair, 'root.dxf')).toContain('Pair: the second core in the block is mirrored');
});
