import fc from 'fast-check';
import { expect, test } from 'vitest';
import { segmentDistance } from '#geometry/cutting/arrays.ts';
import { type Template } from '#geometry/cutting/template.ts';
import { type Page } from '#geometry/pages/page.ts';
import { PAPERS, templatePages } from '#geometry/pages/templates/template-pages.ts';
import { type Point } from '#geometry/point.ts';
import { TEMPLATE, plans } from '#tests/geometry/cutting/plans.ts';
import { faultsOf, textsOf, wordsOf } from '../checking.ts';
import { DETAILS, PLANS, SHEET, namedSheet, names, planned } from '../samples.ts';

/** Whole plans are worked out here; on a busy machine that takes its time, in ms. */
const PATIENCE = 20_000;

const EDGE_WIDTH = 0.35;

/** The pieces of the template's edge on a page. */
function edgesOn({ marks }: Page): (readonly Point[])[] {
  return marks.flatMap((of) =>
    of.kind === 'line' && of.widthMm === EDGE_WIDTH && !of.closed ? [of.points] : [],
  );
}

/** The crosses on a page by the tiles that they join, whose names stand beside them; two of each pair. */
function crossesOn({ marks }: Page): Map<string, Point[]> {
  const crosses = new Map<string, Point[]>();
  for (const mark of marks) {
    if (mark.kind !== 'circle' || mark.ink !== 'graphite') continue;
    const { x, y } = mark.centre;
    const names = textsOf(marks)
      .filter((of) => /^[A-Z]\d$/.test(of.text) && Math.hypot(of.at.x - x, of.at.y - y) < 6)
      .map(({ text }) => text);
    expect(names).toHaveLength(2);
    crosses.set(names.join(), [...(crosses.get(names.join()) ?? []), mark.centre]);
  }
  for (const pair of crosses.values()) pair.sort((a, b) => a.x + a.y - b.x - b.y);
  return crosses;
}

/** Lays the pages of one template together by their crosses, as a person does it: where each page's corner lies on the first page. */
function laidTogether(pages: readonly Page[]): Point[] {
  const crosses = pages.map(crossesOn);
  const places = new Map<number, Point>([[0, { x: 0, y: 0 }]]);
  for (const [from, place] of places) {
    pages.forEach((_, to) => {
      if (places.has(to)) return;
      const name = [...crosses[from]!.keys()].find((of) => crosses[to]!.has(of));
      if (name === undefined) return;
      const [a, b] = [crosses[from]!.get(name)!, crosses[to]!.get(name)!];
      const move = { x: a[0]!.x - b[0]!.x, y: a[0]!.y - b[0]!.y };
      // Both crosses fall together.
      expect(a[1]!.x - b[1]!.x).toBeCloseTo(move.x, 9);
      expect(a[1]!.y - b[1]!.y).toBeCloseTo(move.y, 9);
      places.set(to, { x: place.x + move.x, y: place.y + move.y });
    });
  }
  expect(places.size).toBe(pages.length);
  return pages.map((_, i) => places.get(i)!);
}

/** The edge on all pages laid together, in the template's frame: its first pin tells where that lies. */
function assembled(pages: readonly Page[], template: Template): Point[][] {
  const places = laidTogether(pages);
  const pins = pages.flatMap(({ marks }, i) =>
    marks.flatMap((of) =>
      of.kind === 'circle' && of.ink === 'ink'
        ? [{ x: of.centre.x + places[i]!.x, y: of.centre.y + places[i]!.y }]
        : [],
    ),
  );
  const [pin, drawn] = [template.pins[0]!, pins.sort((a, b) => a.x - b.x)[0]!];
  return pages.flatMap((page, i) =>
    edgesOn(page).map((points) =>
      points.map(({ x, y }) => ({
        x: x + places[i]!.x - drawn.x + pin.x,
        y: pin.y - (y + places[i]!.y - drawn.y),
      })),
    ),
  );
}

function distanceTo(point: Point, lines: readonly (readonly Point[])[]): number {
  let least = Infinity;
  for (const line of lines)
    for (let i = 1; i < line.length; i += 1) {
      const [a, b] = [line[i - 1]!, line[i]!];
      least = Math.min(least, segmentDistance(point.x, point.y, a.x, a.y, b.x, b.y));
    }
  return least;
}

test.each(['tapered and swept', 'chord of 1200 mm'] as const)(
  '%s: the tiles laid together by their crosses give the plan’s templates within 0.01 mm',
  (name) => {
    const { plan } = planned(PLANS[name]);
    const pages = templatePages(plan, SHEET, 'A4', DETAILS);
    for (const template of plan.templates) {
      const word = template.end === 'root' ? 'Root template' : 'Tip template';
      const own = pages.filter(({ marks }) => wordsOf(marks).some((of) => of.startsWith(`${word}:`)));
      const pieces = assembled(own, template);
      const corners = Array.from(template.outline.x, (x, i) => ({ x, y: template.outline.y[i]! }));
      const edge = [[...corners, corners[0]!]];
      expect(Math.max(...pieces.flat().map((point) => distanceTo(point, edge)))).toBeLessThan(0.01);
      expect(Math.max(...corners.map((corner) => distanceTo(corner, pieces)))).toBeLessThan(0.01);
    }
  },
  PATIENCE,
);

test.each(Object.entries(PLANS))(
  '%s: nothing overlaps and nothing is cut off',
  (_, of) => {
    const { plan } = planned(of);
    for (const paper of of === PLANS['chord of 1200 mm']
      ? (['Letter'] as const)
      : (['A4', 'A3', 'Letter'] as const)) {
      const pages = templatePages(plan, SHEET, paper, DETAILS);
      expect(pages.length > 0).toBe(of.template !== null);
      for (const page of pages) {
        expect(page).toMatchObject(PAPERS[paper]);
        expect(faultsOf(page)).toEqual([]);
      }
    }
  },
  PATIENCE,
);

test(
  'every page says what it is, where it lies and what to mind',
  () => {
    const { plan } = planned(PLANS['chord of 1200 mm']);
    const pages = templatePages(plan, SHEET, 'A4', DETAILS);
    pages.forEach(({ marks }, i) => {
      const words = wordsOf(marks);
      expect(words).toContain(`Sheet ${i + 1} of ${pages.length}`);
      expect(words.some((of) => /^(?:Root|Tip) template: row [AB], column [1-6]$/.test(of))).toBe(true);
      expect(words).toContain('K7QM-3F2X');
      expect(words).toContain('SHA-256 8c1f 04d9 a77e');
      expect(words).toContain('Version 3, released 2026-03-05');
      expect(words.filter((of) => of === '100 mm')).toHaveLength(2);
      expect(words.join(' ')).toContain('Print at 100 %');
      expect(words.join(' ')).toContain(SHEET.address);
    });
    expect(pages.flatMap(({ marks }) => wordsOf(marks))).toContain('Root template, chord 1200 mm');
  },
  PATIENCE,
);

test('all numbers of the ticks are there where there is room', () => {
  const { plan } = planned(PLANS['chord of 1200 mm']);
  const words = new Set(templatePages(plan, SHEET, 'A4', DETAILS).flatMap(({ marks }) => wordsOf(marks)));
  const most = Math.max(...plan.templates.flatMap(({ ticks }) => ticks.map(({ number }) => number)));
  for (let number = 1; number <= most; number += 1) expect(words).toContain(String(number));
});

test('first and last number stand on small templates too', () => {
  const { plan } = planned(PLANS['tapered and swept']);
  for (const { marks } of templatePages(plan, SHEET, 'A4', DETAILS)) {
    const words = wordsOf(marks);
    for (const number of ['1', '21', '41']) expect(words).toContain(number);
    expect(words.some((of) => of.startsWith('level'))).toBe(true);
  }
});

test('a sheet that is not released says so on its templates', () => {
  const { plan } = planned(PLANS['by hand']);
  const [page] = templatePages(plan, { ...SHEET, status: 'withdrawn' }, 'A4', DETAILS);
  expect(wordsOf(page!.marks)).toContain('Version 3, withdrawn: not for cutting');
});

test(
  'ordinary plans with any names: nothing overlaps, and the same plan gives the same pages',
  () => {
    fc.assert(
      fc.property(plans, names, (of, name) => {
        const { plan } = planned({ ...of, template: TEMPLATE });
        const pages = templatePages(plan, namedSheet(name), 'A4', DETAILS);
        for (const page of pages) expect(faultsOf(page)).toEqual([]);
        expect(templatePages(plan, namedSheet(name), 'A4', DETAILS)).toEqual(pages);
      }),
      { numRuns: 4 },
    );
  },
  PATIENCE,
);
