import { cutSheetPages } from '#geometry/pages/cut-sheet/cut-sheet-pages.ts';
import { templatePages } from '#geometry/pages/templates/template-pages.ts';
import { makeArchive, makeFiles } from '#server/cut-sheets/files/make.ts';
import { pagesToPdf } from '#server/cut-sheets/files/pdf.ts';
import { qrModules } from '#server/cut-sheets/files/qr.ts';
import { RIBS, TEMPLATE, planWith } from '#tests/geometry/cutting/plans.ts';
import { PLANS, SHEET, planned } from '#tests/geometry/pages/samples.ts';
import { type Bench, type Figure } from './figures.ts';

const WARM_UP = 8;
const RUNS = 15;
/** The plan of the other figures with all that is printed and packed: 400 points, 30 ribs, templates. */
const WHOLE = planWith({
  cut: { pointsPerSurface: 190 },
  ribs: { ...RIBS, stations: { kind: 'count', count: 30 } },
  template: TEMPLATE,
});

/** Median time of one call in ms, after the engine has compiled it. */
async function medianMs(work: () => Promise<unknown>): Promise<number> {
  for (let i = 0; i < WARM_UP; i += 1) await work();
  const times: number[] = [];
  for (let i = 0; i < RUNS; i += 1) {
    const start = performance.now();
    await work();
    times.push(performance.now() - start);
  }
  return times.sort((a, b) => a - b)[(RUNS - 1) / 2] ?? NaN;
}

async function figures(): Promise<Figure[]> {
  const details = { qr: qrModules(SHEET.address), owner: 'Fen Works' };
  const templates = (of: keyof typeof PLANS) => {
    const { plan } = planned(PLANS[of]);
    return templatePages(plan, SHEET, 'A4', details);
  };
  const { plan, findings } = planned(PLANS['tapered and swept']);
  const printed = (of: keyof typeof PLANS) => pagesToPdf(templates(of), 'Templates', SHEET);
  const sheet = () => pagesToPdf(cutSheetPages(plan, findings, SHEET, details), 'Cut sheet', SHEET);
  const order = { plan: WHOLE, identity: SHEET, paper: 'A4', owner: details.owner } as const;
  const whole = async () => makeArchive((await makeFiles(order)).files);
  const start = performance.now();
  const { length } = await whole();
  const first = performance.now() - start;
  return [
    { what: 'all.zip with both PDFs, the first time in a process', value: first, unit: 'ms' },
    {
      what: 'all.zip with both PDFs: 400 points, 30 ribs',
      value: await medianMs(whole),
      unit: 'ms',
      goal: 1500,
    },
    { what: 'size of that zip', value: length / 1024, unit: 'kB' },
    { what: 'templates.pdf, 2 pages', value: await medianMs(() => printed('tapered and swept')), unit: 'ms' },
    {
      what: `templates.pdf, chord of 1200 mm, ${templates('chord of 1200 mm').length} pages`,
      value: await medianMs(() => printed('chord of 1200 mm')),
      unit: 'ms',
    },
    { what: 'cut-sheet.pdf, 2 pages', value: await medianMs(sheet), unit: 'ms' },
  ];
}

const bench: Bench = { name: `Printed files (medians of ${RUNS} warm calls)`, run: figures };
export default bench;
