import { type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from './app.ts';
import { sectionPath } from './names.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

/** Names in the order of the table, once it shows the answer to the last question. */
async function names(page: Page): Promise<string[]> {
  await page.locator('table[aria-busy=false]').waitFor();
  return page.getByRole('rowheader').getByRole('link').allTextContents();
}

describe('the library', () => {
  it('searches, sorts and filters, and the address carries it all', async () => {
    const visit = await app.open({ as: 'designer' });
    const { page } = visit;
    expect((await names(page)).length).toBe(12);

    await page.getByRole('searchbox').fill('heron');
    await page.waitForURL(/search=heron/);
    await expect
      .poll(async () => (await names(page)).sort())
      .toEqual(['Heron inner panel', 'Heron outer panel', 'Heron winglet']);

    await page.getByRole('button', { name: 't/c' }).click();
    await page.waitForURL(/sort=thickness/);
    await expect.poll(() => names(page)).toEqual(['Heron inner panel', 'Heron outer panel', 'Heron winglet']);
    await page.getByRole('button', { name: 't/c' }).click();
    await expect.poll(() => names(page)).toEqual(['Heron winglet', 'Heron outer panel', 'Heron inner panel']);

    const link = page.url();
    await page.getByRole('link', { name: 'Heron winglet' }).click();
    await page.waitForURL(/\/sections\/[0-9a-f-]+$/);
    await page.goBack();
    expect(page.url()).toBe(link);
    await expect.poll(() => names(page)).toEqual(['Heron winglet', 'Heron outer panel', 'Heron inner panel']);
    expect(await page.getByRole('searchbox').inputValue()).toBe('heron');

    await page.goto('/sections?status=withdrawn');
    await expect.poll(() => names(page)).toEqual(['Sedge rudder']);
    await page.getByLabel('Status').selectOption('archived');
    await expect.poll(() => names(page)).toEqual(['Bench test wing']);
    await page.goto('/sections?kind=cst&sort=name');
    await expect
      .poll(() => names(page))
      .toEqual([
        'Bittern wing root',
        'Bittern wing tip',
        'Crane centre section',
        'Curlew trainer wing',
        'Reed tailplane',
        'Tail fin core',
        'Teal slow-flight wing',
      ]);
    await visit.close();
  });

  it('says that nothing was found and offers the way back', async () => {
    const visit = await app.open({ as: 'designer' });
    const { page } = visit;
    await page.getByRole('searchbox').fill('no such thing');
    await page.waitForURL(/search=no/);
    await page.getByRole('table').waitFor({ state: 'detached' });
    await page
      .getByRole('main')
      .getByRole('button', { name: /clear|all|without/i })
      .click();
    expect((await names(page)).length).toBe(12);
    await visit.close();
  });
});

describe('the technician', () => {
  it('sees released sections only, each leading to its version in force', async () => {
    const visit = await app.open({ as: 'technician', width: 1024, touch: true });
    const { page } = visit;
    await page.waitForURL(/status=released/);
    const list = page.getByRole('list', { name: 'Released sections' });
    await list.getByRole('link').first().waitFor();
    const released: { name: string }[] = await app.database
      .knex('sections')
      .whereNotNull('released_number')
      .whereNull('archived_at')
      .select('name');
    expect((await list.getByRole('link').allTextContents()).sort()).toEqual(
      released.map(({ name }) => name).sort(),
    );
    expect(await page.getByRole('button', { name: 'New section' }).count()).toBe(0);

    await list.getByRole('link', { name: 'Heron outer panel' }).click();
    await page.getByRole('heading', { level: 1, name: 'Heron outer panel v3' }).waitFor();
    await page.getByText(/^In force: released on/).waitFor();
    expect(await page.getByRole('button', { name: /Release|Withdraw/ }).count()).toBe(0);
    await visit.close();
  });

  it('is kept from drafts, and told which version is in force instead', async () => {
    const visit = await app.open({ as: 'technician' });
    const { page } = visit;
    visit.watch.expectRefusal('GET', /\/versions\/4$/, 404);
    await page.goto(await sectionPath(app, 'Heron outer panel', 4));
    await page.getByText('There is no version 4 to show here.').waitFor();
    await page.getByRole('link', { name: 'Version 3, in force' }).click();
    await page.getByRole('heading', { level: 1, name: 'Heron outer panel v3' }).waitFor();

    visit.watch.expectRefusal('GET', /^\/api\/sections\/[^/]+$/, 404);
    visit.watch.expectRefusal('GET', /\/versions\/1$/, 404);
    await page.goto(await sectionPath(app, 'Teal slow-flight wing', 1));
    await page.getByText('There is no version 1 to show here.').waitFor();
    expect(await page.getByText('Teal').count()).toBe(0);
    await visit.close();
  });

  it('reads of a superseded version that it is not to be cut, with the way to the one in force', async () => {
    const visit = await app.open({ as: 'technician' });
    const { page } = visit;
    await page.goto(await sectionPath(app, 'Tail fin core', 1));
    await page.getByText(/do not cut from this version any more/).waitFor();
    await page.getByRole('link', { name: 'Version 4' }).click();
    await page.getByRole('heading', { level: 1, name: 'Tail fin core v4' }).waitFor();
    expect(await page.getByText(/^In force: released on/).count()).toBe(1);
    await visit.close();
  });
});
