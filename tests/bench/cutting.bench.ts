import { type CorePlan, planCore } from '#geometry/cutting/planner.ts';
import { buildRibs } from '#geometry/cutting/ribs.ts';
import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { MANIFEST_NAME, manifestOf, zipOf } from '#server/cut-sheets/files/archive.ts';
import { SHEET, planned } from '#tests/geometry/cutting/files/sheet-example.ts';
import { PLAN, RIBS, planWith } from '#tests/geometry/cutting/plans.ts';
import { type Bench, type Figure } from './figures.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 2, checksum: '0123456789abcdef', part: 'core' };
const WARM_UP = 60;
const RUNS = 101;
/** As many points as the goal speaks of: the chain then has about 400 pairs, 400 points at each end. */
const DENSE = planWith({ cut: { pointsPerSurface: 190 } });
const RIB_PLAN = planWith({ ribs: { ...RIBS, stations: { kind: 'count', count: 30 } } });

/** The files of a plan, the manifest with them. */
function archive(core: CorePlan): Uint8Array {
  const files = cutFiles(core, SHEET).map(({ name, text }) => ({ name, bytes: Buffer.from(text) }));
  return zipOf([...files, { name: MANIFEST_NAME, bytes: Buffer.from(manifestOf(files)) }]);
}

/** Median time of one call in ms, after the engine has compiled it. */
function medianMs(work: () => unknown): number {
  let kept: unknown;
  for (let i = 0; i < WARM_UP; i += 1) kept = work();
  const times = Array.from({ length: RUNS }, () => {
    const start = performance.now();
    kept = work();
    return performance.now() - start;
  });
  if (kept === undefined) throw new Error('Nothing was measured.');
  return times.sort((a, b) => a - b)[(RUNS - 1) / 2] ?? NaN;
}

function figures(): Figure[] {
  const { core } = planCore(RIB_PLAN, IDENTITY);
  const { ribs } = RIB_PLAN;
  if (!ribs || !core?.ribs || core.ribs.ribs.length !== 30)
    throw new Error('The plan does not give 30 ribs.');
  const dense = planned(DENSE);
  const withRibs = planned(planWith({ ...DENSE, ribs }));
  const points = planCore(DENSE, IDENTITY).core?.core.panel.chain.station.length ?? 0;
  return [
    { what: 'points at each end of the plan measured', value: points, unit: 'points' },
    {
      what: 'whole core plan, program simulated',
      value: medianMs(() => planCore(DENSE, IDENTITY)),
      unit: 'ms',
      goal: 25,
    },
    {
      what: 'whole core plan at the default spacing',
      value: medianMs(() => planCore(PLAN, IDENTITY)),
      unit: 'ms',
    },
    {
      what: 'set of 30 ribs with holes and tabs, packed',
      value: medianMs(() => buildRibs(RIB_PLAN, core.core, core.features, ribs)),
      unit: 'ms',
      goal: 300,
    },
    {
      what: 'files of the plan measured: DXF, program, coordinates',
      value: medianMs(() => cutFiles(dense, SHEET)),
      unit: 'ms',
    },
    {
      what: 'all.zip of it with 30 ribs, without PDF',
      value: medianMs(() => archive(withRibs)),
      unit: 'ms',
      goal: 1500,
    },
    {
      what: 'size of that zip',
      value: archive(withRibs).length / 1024,
      unit: 'kB',
    },
  ];
}

const bench: Bench = {
  name: `Cutting (medians of ${RUNS} warm calls)`,
  run: () => Promise.resolve(figures()),
};
export default bench;
