import { Fragment } from 'react';
import {
  formatLength,
  formatNumber,
  formatPercent,
  MM_PER_INCH,
  type Units,
  useUnits,
} from '#client/app/units.ts';
import { type CutModel, type PlanModel } from '../views/plan-model.ts';
import { duration } from '../views/view-words.ts';
import { stepLength } from '#geometry/cutting/feed.ts';
import { at } from '#geometry/cutting/arrays.ts';

type Row = readonly [name: string, value: string];

interface FiguresProps {
  readonly model: PlanModel | null;
  /** A newer plan is being worked out. */
  readonly stale: boolean;
  /** The form holds no plan: these are of the last one. */
  readonly refused: boolean;
}

/** What the plan comes to. Times and masses are estimates: foam differs from block to block, and machines from their program. */
export function Figures({ model, stale, refused }: FiguresProps) {
  const units = useUnits();
  const rows = model ? rowsOf(model, units) : EMPTY;
  return (
    <section aria-label="Figures" aria-busy={stale}>
      <div className="mb-1 flex items-end justify-between gap-2 border-b border-rule pb-1 text-xs text-graphite">
        <h2 className="font-semibold tracking-wide uppercase">Figures</h2>
        <span>{refused ? 'of the last plan' : 'estimates'}</span>
      </div>
      <dl
        className={`grid grid-cols-[minmax(0,1fr)_auto] gap-x-3 gap-y-1 ${stale || refused ? 'text-graphite' : ''}`}
      >
        {rows.map(([name, value]) => (
          <Fragment key={name}>
            <dt>{name}</dt>
            <dd className="text-right font-semibold whitespace-nowrap">{value}</dd>
          </Fragment>
        ))}
      </dl>
    </section>
  );
}

/** Wire speed at the faster end; melt ratio of the slower end; foam left around the cut; the simulated program against the plan. */
const NAMES = {
  volume: 'Core volume',
  mass: 'Core mass',
  time: 'Cut time',
  speed: 'Wire speed',
  melt: 'Melt ratio',
  root: 'Left at root',
  tip: 'Left at tip',
  check: 'Off the plan',
  points: 'Points in step',
  ribs: 'Ribs',
  yield: 'Sheet yield',
} as const;
const EMPTY: readonly Row[] = Object.values(NAMES).map((name) => [name, '–'] as const);

function rowsOf({ foam, cut, fit, ribs, root }: PlanModel, units: Units): Row[] {
  const length = (mm: number, decimals = 1) => formatLength(mm, units, decimals);
  return [
    [NAMES.volume, foam ? volume(foam.coreVolumeMm3, units) : '–'],
    [NAMES.mass, foam ? mass(foam.coreMassG, units) : '–'],
    [NAMES.time, cut ? duration(cut.totalSeconds) : '–'],
    [NAMES.speed, cut ? speed(fastest(cut), units) : '–'],
    [NAMES.melt, cut ? `${cut.melt.ratio.toFixed(2)} at the ${cut.melt.slowerEnd}` : '–'],
    [NAMES.root, fit ? length(fit.marginMm.root) : '–'],
    [NAMES.tip, fit ? length(fit.marginMm.tip) : '–'],
    [NAMES.check, cut ? length(cut.largestDeviationMm, 3) : '–'],
    [NAMES.points, `${root.core.x.length} + ${root.core.x.length}`],
    [NAMES.ribs, ribs ? `${ribs.stationsMm.length} on ${sheets(ribs.layout.sheets)}` : '–'],
    [NAMES.yield, ribs ? formatPercent(ribs.layout.yield, 0) : '–'],
  ];
}

function sheets(count: number): string {
  return count === 1 ? '1 sheet' : `${count} sheets`;
}

const SHORTEST_MM = 0.2;

/** The highest wire speed in the plane of either face while it cuts, mm/min. */
function fastest({ kinds, left, right, arrives, leaves }: CutModel): number {
  let highest = 0;
  for (let i = 1; i < kinds.length; i++) {
    const seconds = at(arrives, i) - at(leaves, i - 1);
    const way = Math.max(stepLength(left, i), stepLength(right, i));
    // The rounding of the program's coordinates tells on shorter moves.
    if (kinds[i] === 'travel' || seconds <= 0 || way < SHORTEST_MM) continue;
    highest = Math.max(highest, (60 * way) / seconds);
  }
  return highest;
}

function volume(mm3: number, units: Units): string {
  if (units === 'inch') return `${formatNumber(mm3 / MM_PER_INCH ** 3, 1)} in³`;
  return mm3 < 1e7 ? `${formatNumber(mm3 / 1e3, 0)} cm³` : `${formatNumber(mm3 / 1e6, 1)} dm³`;
}

/** Avoirdupois ounce (international yard and pound agreement, 1959). */
const G_PER_OUNCE = 28.349523125;
function mass(grams: number, units: Units): string {
  if (units === 'inch') return `${formatNumber(grams / G_PER_OUNCE, 2)} oz`;
  return grams < 1000 ? `${formatNumber(grams, 1)} g` : `${formatNumber(grams / 1000, 2)} kg`;
}

function speed(mmMin: number, units: Units): string {
  return units === 'mm'
    ? `${formatNumber(mmMin, 0)} mm/min`
    : `${formatNumber(mmMin / MM_PER_INCH, 1)} in/min`;
}
