import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readDat } from '#geometry/formats/dat.ts';
import { type DemoRole, startApp, type TestApp, type Visit } from './app.ts';
import { sectionPath } from './names.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

async function openPanel(as: DemoRole): Promise<Visit> {
  const visit = await app.open({ as });
  await visit.page.goto(await sectionPath(app, 'Heron outer panel', 3));
  await visit.page.getByRole('button', { name: 'Export…' }).click();
  await visit.page.getByRole('dialog').waitFor();
  return visit;
}

async function download(page: Page): Promise<{ name: string; text: string; sum: string }> {
  const coming = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Download' }).click();
  const file = await coming;
  const bytes = await readFile(await file.path());
  return {
    name: file.suggestedFilename(),
    text: bytes.toString('utf8'),
    sum: createHash('sha256').update(bytes).digest('hex'),
  };
}

describe('the export panel', () => {
  it('downloads the coordinates that it announced, and the download is on record', async () => {
    const visit = await openPanel('builder');
    const { page } = visit;
    await page.getByRole('radio', { name: 'dat' }).check();
    await page.getByLabel('Unit chord').check();
    await page.getByLabel('Points per surface').fill('40');
    const shown = page.getByRole('dialog').getByText(/^[0-9a-f]{4} [0-9a-f]{4} [0-9a-f]{4}$/);
    await shown.waitFor();
    const announced = await shown.textContent();
    const file = await download(page);
    await page.getByText(/Its bytes match their checksum/).waitFor();
    expect(file.name).toBe('heron-outer-panel_v3_unit.dat');
    expect(file.sum.slice(0, 12)).toBe(announced?.replaceAll(' ', ''));
    expect(readDat(file.text).points).toHaveLength(79);
    expect(await download(page)).toEqual(file);
    const records: unknown[] = await app.database
      .knex('downloads')
      .where({ file_name: file.name })
      .select('file_name', 'checksum');
    const record = { file_name: file.name, checksum: file.sum };
    expect(records).toEqual([record, record]);
    await page.keyboard.press('Escape');
    await page
      .getByRole('region', { name: 'Downloads' })
      .getByText('heron-outer-panel_v3_unit.dat')
      .first()
      .waitFor();
    await visit.close();
  });

  it('names the field at fault, keeps what was typed and takes no file meanwhile', async () => {
    const visit = await openPanel('technician');
    const { page } = visit;
    let downloads = 0;
    page.on('download', () => (downloads += 1));
    await page.getByLabel('Chord', { exact: true }).fill('2 m');
    await page.getByRole('button', { name: 'Download' }).click();
    await page
      .getByText(/^Saved heron-outer-panel_v3_2000mm\.dxf/)
      .first()
      .waitFor();
    await page.getByLabel('Chord', { exact: true }).fill('22o mm');
    await page.getByRole('button', { name: 'Download' }).click();
    expect(await page.getByLabel('Chord', { exact: true }).inputValue()).toBe('22o mm');
    expect(await page.getByLabel('Chord', { exact: true }).getAttribute('aria-invalid')).toBe('true');
    expect(downloads).toBe(1);
    await page.getByLabel('Chord', { exact: true }).fill('220');
    for (const layer of ['OUTLINE', 'CHORD', 'CAMBER', 'TEXT'])
      await page.getByRole('checkbox', { name: layer }).uncheck();
    await page.getByText(/at least one layer/i).waitFor();
    expect(await page.getByRole('button', { name: 'Download' }).isDisabled()).toBe(true);
    await visit.close();
  });

  it('saves nothing when the network is gone or the bytes were changed on the way', async () => {
    const visit = await openPanel('technician');
    const { page, watch } = visit;
    watch.expectOffline();
    const file = '**/contour.dxf?*';
    await page.route(file, (route) => route.abort('internetdisconnected'));
    await page.getByRole('button', { name: 'Download' }).click();
    await page.getByText(/Nothing was saved; your settings are kept/).waitFor();
    await page.unroute(file);
    await page.route(file, async (route) => {
      const answer = await route.fetch();
      await route.fulfill({ response: answer, body: (await answer.text()).replace('HEADER', 'HEADED') });
    });
    await page.getByRole('button', { name: 'Download' }).click();
    await page.getByText(/do not match their checksum, so nothing was saved/).waitFor();
    await page.unroute(file);
    expect((await download(page)).name).toBe('heron-outer-panel_v3_220mm.dxf');
    await visit.close();
  });

  it('has targets of 48 px, the file name in 20 px and one orange action for the technician', async () => {
    const visit = await openPanel('technician');
    const dialog = visit.page.getByRole('dialog');
    const low = await dialog
      .locator('button, select, input[type=text], label:has(input)')
      .evaluateAll((targets) =>
        targets
          .filter(
            (target) => target.getBoundingClientRect().height < 48 && !target.matches('[aria-label=Close]'),
          )
          .map((target) => target.outerHTML.slice(0, 120)),
      );
    expect(low).toEqual([]);
    const size = await dialog
      .getByText(/heron-outer-panel/)
      .evaluate((name) => getComputedStyle(name).fontSize);
    expect(Number.parseFloat(size)).toBeGreaterThanOrEqual(20);
    const wire = await visit.page.evaluate(() =>
      getComputedStyle(document.documentElement).getPropertyValue('--wire'),
    );
    expect(wire.trim()).not.toBe('');
    const orange = await dialog
      .getByRole('button')
      .evaluateAll((buttons) =>
        buttons
          .filter((button) => getComputedStyle(button).backgroundColor === 'rgb(194, 65, 12)')
          .map((b) => b.textContent),
      );
    expect(orange).toEqual(['Download']);
    await visit.close();
  });
});
