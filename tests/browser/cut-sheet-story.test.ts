import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { buffer } from 'node:stream/consumers';
import { type Download, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import sharp from 'sharp';
import yauzl from 'yauzl';
import { startApp, type TestApp } from './app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

const name = 'Snipe outer panel';

describe('a cut sheet from plan to measured part', () => {
  it('is planned by the builder, who mends a finding and releases it', async () => {
    const visit = await app.open({ as: 'builder', width: 1440, height: 900 });
    const { page } = visit;
    await makeSheet(page);
    await fill(page, {
      'Chord at the root': '220',
      'Chord at the tip': '160',
      Span: '600',
      Washout: '2',
      'Skin, upper': '1',
      'Skin, lower': '1',
      'Kerf at the root': '0.8',
      'Kerf at the tip': '0.8',
    });
    await addFeature(page, 'Tube with its entry slit');
    await fill(page, { Diameter: '6' });
    await addFeature(page, 'Slot for a spar');
    await fill(page, { 'Station at the root': '45', 'Station at the tip': '45', 'Depth at the root': '40' });
    const finding = page.getByRole('button', { name: /^Error/ }).first();
    await finding.click();
    await page.keyboard.type('3');
    await page.keyboard.press('Enter');
    await fill(page, { 'Depth at the tip': '3' });
    await page.getByRole('button', { name: /^Error/ }).waitFor({ state: 'detached' });

    await page.getByRole('button', { name: 'Save as version 2' }).click();
    await page.getByLabel(/What changed/).fill('Tube and cap slot, one millimetre of skin.');
    await page.getByRole('button', { name: 'Save version 2' }).click();
    await page.getByText('version 2, no unsaved changes').waitFor();
    await page.getByRole('link', { name: /Version 2: files, release/ }).click();
    await page.getByRole('heading', { level: 1, name: `${name} v2` }).waitFor();
    await page.getByRole('button', { name: 'Release…' }).click();
    await page.getByRole('button', { name: 'Release version 2' }).click();
    await page.getByText(/^In force: released on/).waitFor();
    await visit.close();

    const kept: { name: string }[] = await app.database
      .knex('cut_files')
      .join('cut_sheets', 'cut_sheets.id', 'cut_files.sheet_id')
      .where({ 'cut_sheets.name': name })
      .select('cut_files.name');
    expect(kept.map((file) => file.name).sort()).toEqual(
      ['core.nc', 'cut-sheet.pdf', 'root.dat', 'root.dxf', 'tip.dat', 'tip.dxf'].sort(),
    );
  });

  it('is downloaded, checked, cut and measured by the technician', async () => {
    const visit = await app.open({ as: 'technician', width: 1024, height: 768, touch: true });
    const { page } = visit;
    await page.goto('/cutting-list');
    const job = page.getByRole('listitem').filter({ hasText: `${name} v2, core` });
    await job.getByRole('button', { name: 'Files' }).click();
    const program = await download(page, 'core.nc');
    expect(program.fileName).toBe('snipe-outer-panel_v2_core_220-160mm.nc');
    const archive = await download(page, 'all.zip');
    const files = await unpacked(archive.bytes);
    expect(files.get(program.fileName)?.equals(program.bytes)).toBe(true);
    expectManifest(files);
    await page.getByRole('button', { name: 'Close' }).click();

    await page.getByLabel('File to check').setInputFiles(archive.path);
    await page.getByText('Current: this is the one to cut.').waitFor();

    visit.watch.expectOffline();
    await page.context().setOffline(true);
    await job.getByRole('button', { name: 'Start' }).click();
    await page.getByText('One entry waits for the network.').waitFor();
    await job.getByText(/^started by/).waitFor();
    await page.context().setOffline(false);
    await page.getByText('One entry waits for the network.').waitFor({ state: 'detached' });
    await job.getByRole('button', { name: 'Done' }).click();
    await job.getByText('1 of 2 done').waitFor();

    await job.getByRole('link', { name: 'Measure…' }).click();
    await measure(page);
    await page.getByLabel('Mark on the part').fill('left 1');
    await page.getByRole('button', { name: 'File the inspection' }).click();
    await page.getByText(/Out of tolerance: it stands on/).waitFor();
    const create = { width: 40, height: 30, channels: 3, background: '#dcebee' } as const;
    const photograph = await sharp({ create }).png().toBuffer();
    const file = { name: 'part.png', mimeType: 'image/png', buffer: photograph };
    await page.getByLabel('Photograph of the part').setInputFiles(file);
    await page.getByRole('img', { name: 'Photograph 1 of the part' }).waitFor();
    await visit.close();
    expect(await logged()).toEqual(['started', 'done']);
  });

  it('reaches the desk of the designer', async () => {
    const visit = await app.open({ as: 'designer', width: 1280, height: 800 });
    const { page } = visit;
    await page.goto('/');
    const list = page.getByRole('region', { name: 'Out of tolerance' });
    await list.getByRole('link', { name: `${name} v2, left 1` }).click();
    await page.getByLabel('What is to be done with the part').fill('Sand the nose, then measure again.');
    await page.getByRole('button', { name: 'Reject the part' }).click();
    await page.getByText('Sand the nose, then measure again.', { exact: false }).waitFor();
    await page.goto('/');
    await list.waitFor();
    expect(await list.getByRole('link', { name: `${name} v2, left 1` }).count()).toBe(0);
    await visit.close();
  });
});

async function makeSheet(page: Page): Promise<void> {
  await page.goto('/cut-sheets');
  await page.getByRole('button', { name: 'New cut sheet' }).first().click();
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Section at the root').selectOption({ index: 1 });
  await page.getByLabel('Machine').selectOption('Long bench');
  await page.getByLabel('Foam').selectOption('XPS 32, blue');
  await page.getByRole('button', { name: 'Make the cut sheet' }).click();
  await page.getByRole('heading', { level: 1, name }).waitFor();
  await page.getByText('version 1, no unsaved changes').waitFor();
}

/** Types values into fields of the last group that has them open. */
async function fill(page: Page, values: Readonly<Record<string, string>>): Promise<void> {
  for (const [label, value] of Object.entries(values)) {
    const field = page.getByLabel(label, { exact: true }).locator('visible=true').last();
    await field.fill(value);
    await field.press('Enter');
  }
}

async function addFeature(page: Page, kind: string): Promise<void> {
  await page.getByRole('button', { name: 'Add a feature' }).click();
  await page.getByRole('menuitem', { name: kind }).click();
}

async function download(page: Page, file: string) {
  const coming = page.waitForEvent('download');
  await page.getByRole('button', { name: `Download ${file}` }).click();
  const taken: Download = await coming;
  await page.getByText(/Its bytes match their checksum/).waitFor();
  const path = await taken.path();
  return { path, fileName: taken.suggestedFilename(), bytes: await readFile(path) };
}

/** The files of an archive, by an independent reader. */
async function unpacked(bytes: Buffer): Promise<Map<string, Buffer>> {
  const zip = await yauzl.fromBufferPromise(bytes);
  const files = new Map<string, Buffer>();
  for await (const entry of zip.eachEntry()) {
    files.set(entry.fileName, await buffer(await zip.openReadStreamPromise(entry)));
  }
  return files;
}

function expectManifest(files: ReadonlyMap<string, Buffer>): void {
  const lines = (files.get('manifest.sha256')?.toString('utf8') ?? '').trim().split('\n');
  expect(lines).toHaveLength(files.size - 1);
  for (const line of lines) {
    const [sum, file = ''] = line.split('  ');
    expect(
      createHash('sha256')
        .update(files.get(file) ?? '')
        .digest('hex'),
    ).toBe(sum);
  }
}

/** Takes the nominal of each station as measured, but for the first, which is 1 mm too thin. */
async function measure(page: Page): Promise<void> {
  const rows = page.getByRole('table', { name: 'Readings' }).locator('tbody tr');
  await rows.first().waitFor();
  const count = await rows.count();
  expect(count).toBe(8);
  await rows.first().getByRole('textbox').focus();
  for (let i = 0; i < count; i += 1) {
    const nominal = Number.parseFloat(await rows.nth(i).locator('td').first().innerText());
    await page.keyboard.type((i === 0 ? nominal - 1 : nominal).toFixed(2));
    await page.keyboard.press('Enter');
  }
  await page.getByText('8 of 8 measured, 1 out of tolerance').waitFor();
}

async function logged(): Promise<string[]> {
  const rows: { action: string }[] = await app.database
    .knex('cut_logs')
    .join('cut_sheets', 'cut_sheets.id', 'cut_logs.sheet_id')
    .where({ 'cut_sheets.name': name })
    .orderBy('cut_logs.id')
    .select('action');
  return rows.map(({ action }) => action);
}
