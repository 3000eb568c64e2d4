import { afterAll, beforeAll } from 'vitest';
import { at, describeScreens, type Screen } from './appearance.ts';
import { startApp, type TestApp } from './app.ts';
import { sheetIdOf, sheetPath } from './names.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

const screens: readonly Screen[] = [
  {
    name: 'desk',
    as: 'designer',
    show: at('/', (page) => page.getByRole('heading', { name: /^Sections changed last/ })),
  },
  {
    name: 'cut sheets',
    as: 'builder',
    show: at('/cut-sheets', (page) => page.getByRole('link', { name: 'Heron outer panel', exact: true })),
  },
  {
    name: 'planner',
    as: 'builder',
    show: at(
      () => sheetPath(app, 'Heron outer panel'),
      (page) => page.getByText('Planform, seen from above'),
    ),
  },
  {
    name: 'planner with findings',
    as: 'designer',
    show: at(
      () => sheetPath(app, 'Bittern wing'),
      (page) => page.getByRole('button', { name: /^Error/ }),
    ),
  },
  {
    name: 'cut sheet in force',
    as: 'technician',
    show: at(
      () => sheetPath(app, 'Heron outer panel', 2),
      (page) => page.getByRole('button', { name: 'Download all.zip' }),
    ),
  },
  {
    name: 'cutting list',
    as: 'technician',
    show: at('/cutting-list', (page) => page.getByRole('button', { name: 'Start' })),
  },
  {
    name: 'measuring',
    as: 'technician',
    show: at(
      async () => `/cutting-list/inspect/${await sheetIdOf(app, 'Heron outer panel')}/2`,
      (page) => page.getByRole('table', { name: 'Readings' }),
    ),
  },
  {
    name: 'inspection out of tolerance',
    as: 'builder',
    show: async (page) => {
      await page.goto('/inspections');
      await page.getByRole('link', { name: /Second set, right/ }).click();
      await page.getByRole('button', { name: 'Reject the part' }).waitFor();
    },
  },
  {
    name: 'inspections',
    as: 'designer',
    show: at('/inspections', (page) =>
      page.getByRole('heading', { name: 'Deviation by section and machine' }),
    ),
  },
];

describeScreens(() => app, screens);
