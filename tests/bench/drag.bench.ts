import { type CDPSession, type Page } from 'playwright-core';
import { type DemoRole, startApp } from '#tests/browser/app.ts';
import { sectionPath } from '#tests/browser/names.ts';
import { handle, placeOf } from '#tests/browser/sheet.ts';
import setupBrowser from '#tests/setup-browser.ts';
import { type Bench, type Figure } from './figures.ts';

/** Moves of a drag; the first ones, in which the code is compiled, are not counted. */
const MOVES = 300;
const WARM_UP = 60;
const SCRIPT_GOAL_MS = 4;
const TASK_GOAL_MS = 50;
const DESIGNER: DemoRole = 'designer';

const drags = [
  { section: 'Marsh 2412', mark: 'camber', what: '4-digit, camber' },
  { section: 'Curlew trainer wing', mark: 'upper-3', what: 'free form of order 6, weight 3' },
] as const;

interface TraceEvent {
  readonly name: string;
  readonly ph: string;
  readonly ts: number;
  readonly dur?: number;
  /** Time of the thread alone, without what others took of the processor. */
  readonly tdur?: number;
  readonly tid: number;
  readonly pid: number;
  readonly args: { readonly data?: { readonly type?: string; readonly id?: number } };
}

/** Records what Chromium's main thread does while a section is dragged by one handle. */
async function traceDrag(page: Page, mark: string): Promise<readonly TraceEvent[]> {
  const cdp = await page.context().newCDPSession(page);
  const from = await placeOf(handle(page, mark));
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await circle(page, from, WARM_UP);
  const events = await traced(cdp, () => circle(page, from, MOVES));
  await page.mouse.up();
  await page.keyboard.press('Control+z');
  return events;
}

/** Carries the pointer round a small circle, a step a frame. */
async function circle(page: Page, about: { x: number; y: number }, moves: number): Promise<void> {
  for (let i = 1; i <= moves; i += 1) {
    const turn = (2 * Math.PI * i) / 60;
    await page.mouse.move(about.x + 24 * Math.sin(turn), about.y + 6 * Math.cos(turn) - 6);
  }
}

async function traced(cdp: CDPSession, work: () => Promise<void>): Promise<TraceEvent[]> {
  const events: TraceEvent[] = [];
  cdp.on('Tracing.dataCollected', ({ value }) => events.push(...(value as unknown as TraceEvent[])));
  const done = new Promise<void>((resolve) => cdp.once('Tracing.tracingComplete', () => resolve()));
  await cdp.send('Tracing.start', {
    transferMode: 'ReportEvents',
    traceConfig: {
      includedCategories: ['devtools.timeline', 'disabled-by-default-devtools.timeline', 'toplevel'],
    },
  });
  await work();
  await cdp.send('Tracing.end');
  await done;
  return events;
}

/** Script time of each pointer move: its event, and the animation frame in which the sheet is drawn anew. */
function scriptTimes(events: readonly TraceEvent[]): number[] {
  const frames = events.filter(({ name, ph }) => name === 'FireAnimationFrame' && ph === 'X');
  const thread = frames[0]?.tid;
  const moves = events.filter(
    ({ name, tid, args }) => name === 'EventDispatch' && tid === thread && args.data?.type === 'pointermove',
  );
  const ms = (list: readonly TraceEvent[]) =>
    list.reduce((sum, { tdur, dur = 0 }) => sum + (tdur ?? dur) / 1000, 0);
  let before = Number.NEGATIVE_INFINITY;
  return frames
    .filter(({ tid }) => tid === thread)
    .sort((a, b) => a.ts - b.ts)
    .map((frame) => {
      const own = moves.filter(({ ts }) => ts > before && ts <= frame.ts);
      before = frame.ts;
      return ms([frame, ...own]);
    });
}

function longestTask(events: readonly TraceEvent[]): number {
  const thread = events.find(({ name }) => name === 'FireAnimationFrame')?.tid;
  const tasks = events.filter(({ name, tid }) => name.endsWith('RunTask') && tid === thread);
  return Math.max(0, ...tasks.map(({ tdur, dur = 0 }) => (tdur ?? dur) / 1000));
}

function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? Number.NaN;
}

const bench: Bench = {
  name: 'Dragging a handle in Chromium',
  async run() {
    await setupBrowser();
    const app = await startApp();
    const figures: Figure[] = [];
    try {
      for (const { section, mark, what } of drags) {
        const visit = await app.open({ as: DESIGNER, width: 1440, height: 900 });
        await visit.page.goto(await sectionPath(app, section));
        await handle(visit.page, mark).waitFor();
        const events = await traceDrag(visit.page, mark);
        const times = scriptTimes(events);
        if (times.length < MOVES / 2)
          throw new Error(`Only ${String(times.length)} frames of ${String(MOVES)} moves were seen.`);
        figures.push(
          { what: `${what}: script of a move, median`, value: quantile(times, 0.5), unit: 'ms' },
          {
            what: `${what}: script of a move, p95`,
            value: quantile(times, 0.95),
            unit: 'ms',
            goal: SCRIPT_GOAL_MS,
          },
          { what: `${what}: longest task`, value: longestTask(events), unit: 'ms', goal: TASK_GOAL_MS },
        );
        await visit.close();
      }
      return figures;
    } finally {
      await app.stop();
    }
  },
};

export default bench;
