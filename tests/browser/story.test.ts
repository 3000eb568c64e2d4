import { readFile } from 'node:fs/promises';
import DxfParser, { type ILwpolylineEntity } from 'dxf-parser';
import { type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from './app.ts';
import { sectionIdOf } from './names.ts';
import { type Digits, distanceFromSection, surfacePoint } from './section-exact.ts';
import { distance, drag, handle, valueOf } from './sheet.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

const name = 'Snipe wing';

describe('a section from parameters to cut file', () => {
  it('is shaped, saved and released by the designer', async () => {
    const visit = await app.open({ as: 'designer', width: 1440, height: 900 });
    const { page } = visit;
    await makeSection(page);

    const camber = handle(page, 'camber');
    expect(await valueOf(camber)).toBeCloseTo(2, 9);
    const { pointer, mark } = await drag(page, camber, { x: 45, y: -14 });
    expect(distance(mark, pointer)).toBeLessThan(0.75);
    const dragged = await valueOf(camber);
    expect(dragged).toBeGreaterThan(2.2);

    await camber.focus();
    await page.keyboard.press('ArrowUp');
    const moved = await valueOf(camber);
    expect(moved).toBeCloseTo(dragged + 0.05, 6);
    await page.keyboard.press('Control+z');
    expect(await valueOf(camber)).toBe(dragged);
    await page.keyboard.press('Control+Shift+z');
    expect(await valueOf(camber)).toBe(moved);
    await page.keyboard.press('Control+z');

    await page.getByRole('button', { name: 'Save as version 2' }).click();
    await page.getByLabel(/What changed/).fill('Crest further aft, by eye.');
    await page.getByRole('button', { name: 'Save version 2' }).click();
    await page.getByText('version 2, no unsaved changes').waitFor();

    await page.getByRole('button', { name: /^v2/ }).click();
    await page.getByRole('heading', { level: 1, name: `${name} v2` }).waitFor();
    await page.getByText('Crest further aft, by eye.').waitFor();
    await page.getByRole('button', { name: 'Release…' }).click();
    await page.getByRole('button', { name: 'Release version 2' }).click();
    await page.getByText(/^In force: released on/).waitFor();
    await visit.close();

    const digits = await savedDigits(2);
    expect(100 * digits.maxCamber).toBeCloseTo(dragged, 6);
    expect(digits.maxCamberPosition).toBeGreaterThan(0.42);
    expect(digits.maxThickness).toBe(0.12);
  });

  it('is downloaded by the technician as a DXF that holds exactly that section at 220 mm', async () => {
    const visit = await app.open({ as: 'technician', width: 1024, height: 768, touch: true });
    const { page } = visit;
    await page.getByRole('link', { name }).click();
    await page.getByRole('heading', { level: 1, name: `${name} v2` }).waitFor();
    await page.getByRole('button', { name: 'Export…' }).click();
    await page.getByLabel('Chord', { exact: true }).fill('220');
    const coming = page.waitForEvent('download');
    await page.getByRole('button', { name: 'Download' }).click();
    const download = await coming;
    expect(download.suggestedFilename()).toBe('snipe-wing_v2_220mm.dxf');
    await page.getByText(/Its bytes match their checksum/).waitFor();
    const text = await readFile(await download.path(), 'utf8');
    await visit.close();

    const outlines = (new DxfParser().parseSync(text)?.entities ?? []).filter(
      ({ layer }) => layer === 'OUTLINE',
    );
    expect(outlines).toHaveLength(1);
    const outline = outlines[0] as ILwpolylineEntity;
    expect(outline.type).toBe('LWPOLYLINE');
    expect(outline.shape).toBe(true);
    expect(outline.vertices.length).toBeGreaterThan(40);

    const chordMm = 220;
    const digits = await savedDigits(2);
    const off = outline.vertices.map(
      ({ x, y }) => chordMm * distanceFromSection(digits, { x: x / chordMm, y: y / chordMm }),
    );
    expect(Math.max(...off)).toBeLessThan(0.005);
    const ends = [outline.vertices[0], outline.vertices.at(-1)];
    for (const [index, side] of ([1, -1] as const).entries()) {
      const exact = surfacePoint(digits, side, 1);
      expect(Math.abs((ends[index]?.x ?? Number.NaN) - chordMm * exact.x)).toBeLessThan(0.005);
      expect(Math.abs((ends[index]?.y ?? Number.NaN) - chordMm * exact.y)).toBeLessThan(0.005);
    }
    expect(largestGapMm(digits, outline.vertices, chordMm)).toBeLessThan(0.011);
  });
});

async function makeSection(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'New section' }).click();
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('4-digit designation').fill('2412');
  await page.getByRole('button', { name: 'Make the section' }).click();
  await page.getByRole('heading', { level: 1, name }).waitFor();
  await handle(page, 'camber').waitFor();
}

async function savedDigits(number: number): Promise<Digits> {
  const row: { shape: Digits } | undefined = await app.database
    .knex('section_versions')
    .where({ section_id: await sectionIdOf(app, name), number })
    .first('shape');
  if (!row) throw new Error(`There is no version ${String(number)}.`);
  return row.shape;
}

/** Largest distance of the exact section from the straight pieces of the file. */
function largestGapMm(
  digits: Digits,
  vertices: readonly { x: number; y: number }[],
  chordMm: number,
): number {
  let largest = 0;
  for (const side of [1, -1] as const) {
    for (let i = 0; i <= 600; i += 1) {
      const { x, y } = surfacePoint(digits, side, (i / 600) ** 2);
      const point = { x: x * chordMm, y: y * chordMm };
      let nearest = Number.POSITIVE_INFINITY;
      vertices.forEach((from, index) => {
        const to = vertices[(index + 1) % vertices.length] ?? from;
        nearest = Math.min(nearest, distanceFromPiece(point, from, to));
      });
      largest = Math.max(largest, nearest);
    }
  }
  return largest;
}

function distanceFromPiece(
  point: { x: number; y: number },
  from: { x: number; y: number },
  to: { x: number; y: number },
): number {
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  const along = ((point.x - from.x) * dx + (point.y - from.y) * dy) / (dx * dx + dy * dy || 1);
  const share = Math.min(1, Math.max(0, along));
  return Math.hypot(point.x - from.x - share * dx, point.y - from.y - share * dy);
}
