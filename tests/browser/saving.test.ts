import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from './app.ts';
import { sectionIdOf, sectionPath } from './names.ts';
import { drag, handle, valueOf, waitUntilKept } from './sheet.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

async function notesOf(name: string): Promise<string[]> {
  const rows: { note: string }[] = await app.database
    .knex('section_versions')
    .where({ section_id: await sectionIdOf(app, name) })
    .orderBy('number')
    .select('note');
  return rows.map(({ note }) => note);
}

describe('two people on the same version', () => {
  it('are both kept: the second sees both, and saves on top', async () => {
    const name = 'Marsh 2412';
    const [first, second] = [await app.open({ as: 'designer' }), await app.open({ as: 'owner' })];
    for (const { page } of [first, second]) {
      await page.goto(await sectionPath(app, name));
      await handle(page, 'camber').waitFor();
    }
    await handle(first.page, 'thickness-upper').focus();
    await first.page.keyboard.press('Shift+ArrowUp');
    await handle(second.page, 'camber').focus();
    await second.page.keyboard.press('Shift+ArrowUp');
    const wanted = await valueOf(handle(second.page, 'camber'));

    await first.page.getByRole('button', { name: 'Save as version 3' }).click();
    await first.page.getByLabel(/What changed/).fill('Thicker, by the designer.');
    await first.page.getByRole('button', { name: 'Save version 3' }).click();
    await first.page.getByText('version 3, no unsaved changes').waitFor();

    second.watch.expectRefusal('POST', /\/versions$/, 409);
    await second.page.getByRole('button', { name: 'Save as version 3' }).click();
    await second.page.getByLabel(/What changed/).fill('More camber, by the owner.');
    await second.page.getByRole('button', { name: 'Save version 3' }).click();
    const dialog = second.page.getByRole('dialog', { name: 'Version 3 came in between' });
    await dialog.getByText('Thicker, by the designer.').waitFor();
    await dialog.getByText('More camber, by the owner.').waitFor();
    expect(await notesOf(name)).toHaveLength(3);
    await dialog.getByRole('button', { name: 'Save on top of version 3' }).click();
    await second.page.getByText('version 4, no unsaved changes').waitFor();
    expect(await valueOf(handle(second.page, 'camber'))).toBe(wanted);
    expect((await notesOf(name)).slice(2)).toEqual([
      'Thicker, by the designer.',
      'More camber, by the owner.',
    ]);
    await first.close();
    await second.close();
  });
});

describe('unsaved work', () => {
  it('survives a closed tab, and a second browser of the same person finds it', async () => {
    const path = await sectionPath(app, 'Heron winglet');
    const visit = await app.open({ as: 'designer' });
    await visit.page.goto(path);
    const camber = handle(visit.page, 'camber');
    await camber.waitFor();
    await drag(visit.page, camber, { x: 0, y: -18 });
    const value = await valueOf(camber);
    expect(value).toBeGreaterThan(1.1);
    await waitUntilKept(visit.page);
    await visit.page.close();

    const again = await visit.tab();
    await again.page.goto(path);
    await handle(again.page, 'camber').waitFor();
    expect(await valueOf(handle(again.page, 'camber'))).toBe(value);
    await again.page.getByText(/^draft on version 2/).waitFor();
    await visit.close();

    const elsewhere = await app.open({ as: 'designer' });
    await elsewhere.page.goto(path);
    await handle(elsewhere.page, 'camber').waitFor();
    expect(await valueOf(handle(elsewhere.page, 'camber'))).toBe(value);
    await elsewhere.close();

    const other = await app.open({ as: 'owner' });
    await other.page.goto(path);
    await handle(other.page, 'camber').waitFor();
    expect(await valueOf(handle(other.page, 'camber'))).toBe(1);
    await other.close();
  });

  it('survives a tab that is closed while the server cannot be reached', async () => {
    const path = await sectionPath(app, 'Heron inner panel');
    const visit = await app.open({ as: 'designer' });
    visit.watch.expectOffline();
    await visit.page.goto(path);
    const thickness = handle(visit.page, 'thickness-upper');
    await thickness.waitFor();
    await visit.page.route('**/draft', (route) => route.abort('internetdisconnected'));
    await thickness.focus();
    await visit.page.keyboard.press('Shift+ArrowUp');
    const value = await valueOf(thickness);
    await visit.page.getByText(/not kept: offline/).waitFor();
    await visit.page.close();

    const again = await visit.tab();
    await again.page.goto(path);
    await handle(again.page, 'thickness-upper').waitFor();
    expect(await valueOf(handle(again.page, 'thickness-upper'))).toBe(value);
    await visit.close();
  });
});
