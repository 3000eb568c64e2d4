import { type CutAction } from '#server/contracts/cutting-list.ts';
import { type SheetPart } from '#server/contracts/cut-sheets.ts';
import { type Signed, type Time } from './histories.ts';

interface OfSheet {
  /** The sheet's name, and the number of its version. */
  readonly sheet: string;
  readonly version: number;
}

/** What a caliper showed beyond the nominal, mm. */
interface Deviation {
  readonly end: 'root' | 'tip';
  readonly station: number;
  readonly mm: number;
}

/** What happened at the machines and at the bench, in order. */
export type FloorStep = Signed &
  (
    | (OfSheet & {
        readonly did: 'log';
        readonly part: SheetPart;
        readonly action: CutAction;
        readonly machine: string | null;
        readonly reason: string;
      })
    | (OfSheet & {
        readonly did: 'inspect';
        readonly mark: string;
        readonly machine: string | null;
        readonly note: string;
        readonly deviations: readonly Deviation[];
      })
    | {
        readonly did: 'answer';
        /** The inspection, by what is written on the part. */
        readonly mark: string;
        readonly decision: 'accepted' | 'rejected';
        readonly note: string;
      }
  );

interface Work extends OfSheet {
  readonly part: SheetPart;
  readonly machine: string | null;
}

function log(work: Work, action: CutAction, daysAgo: number, time: Time, reason = ''): FloorStep {
  return { did: 'log', at: { daysAgo, time }, by: 'technician', ...work, action, reason };
}

function inspect(
  { sheet, version, machine }: Work,
  daysAgo: number,
  time: Time,
  mark: string,
  deviations: readonly Deviation[],
  note = '',
): FloorStep {
  const at = { daysAgo, time };
  return { did: 'inspect', at, by: 'technician', sheet, version, machine, mark, note, deviations };
}

/** Deviations at the plan's stations of one end, from the nose aft. */
function at(end: 'root' | 'tip', ...values: readonly number[]): Deviation[] {
  return [0.15, 0.3, 0.5, 0.7].flatMap((station, i) => {
    const mm = values[i];
    return mm === undefined ? [] : [{ end, station, mm }];
  });
}

const outer: Work = { sheet: 'Heron outer panel', version: 2, part: 'core', machine: 'Long bench' };
const firstSet: Work = { ...outer, sheet: 'Heron outer panel, first set', version: 1 };
const winglet: Work = {
  sheet: 'Heron winglet, by hand',
  version: 1,
  part: 'core',
  machine: 'Two-hand bow',
};
const templates: Work = { ...winglet, part: 'templates', machine: null };
const ribs: Work = {
  sheet: 'Curlew trainer ribs',
  version: 1,
  part: 'ribs',
  machine: 'Laser by the window',
};
const rudder: Work = { sheet: 'Sedge rudder core', version: 1, part: 'core', machine: 'Short bench' };

/** What the technician of the demo workshop cut and measured, and what was said to it. */
export const demoFloor: readonly FloorStep[] = [
  log(rudder, 'started', 24, '13:40'),
  log(rudder, 'done', 24, '14:05'),
  log(firstSet, 'started', 20, '10:50'),
  log(firstSet, 'done', 20, '11:35'),
  log(firstSet, 'started', 20, '13:10'),
  log(firstSet, 'done', 20, '13:50'),
  inspect(firstSet, 20, '14:30', 'First set, left', [
    ...at('root', -0.05, 0.08, 0.11, 0.06),
    ...at('tip', 0.02, 0.13, 0.16, 0.09),
  ]),
  inspect(
    firstSet,
    20,
    '14:45',
    'First set, right',
    [...at('root', -0.38, 0.04, 0.1, 0.07), ...at('tip', -0.06, 0.11, 0.14, 0.12)],
    'Wire dragged at the nose of the root.',
  ),
  {
    did: 'answer',
    at: { daysAgo: 19, time: '09:20' },
    by: 'designer',
    mark: 'First set, right',
    decision: 'accepted',
    note: 'The nose lies under the joint tape. Use it on the right.',
  },
  log(templates, 'done', 13, '09:35'),
  log(winglet, 'started', 13, '10:10'),
  log(winglet, 'scrapped', 13, '10:30', 'Template slipped at the tip.'),
  log(winglet, 'started', 13, '11:00'),
  log(winglet, 'done', 13, '11:25'),
  inspect(winglet, 13, '11:40', 'Winglet 1', [...at('root', 0.12, 0.2, 0.18), ...at('tip', 0.05, 0.15)]),
  log(ribs, 'started', 9, '08:45'),
  log(ribs, 'done', 9, '09:50'),
  log(outer, 'started', 5, '08:30'),
  log(outer, 'done', 5, '09:15'),
  log(outer, 'started', 5, '09:30'),
  log(outer, 'scrapped', 5, '09:45', 'Wire broke behind the spar tube.'),
  log(outer, 'started', 5, '10:30'),
  log(outer, 'done', 5, '11:15'),
  inspect(outer, 4, '08:20', 'Second set, left', [
    ...at('root', 0.04, 0.07, 0.12, 0.08),
    ...at('tip', 0.06, 0.1, 0.19, 0.21),
  ]),
  inspect(
    outer,
    4,
    '08:35',
    'Second set, right',
    [...at('root', 0.02, 0.09, 0.15, 0.11), ...at('tip', 0.08, 0.17, 0.28, 0.43)],
    'Tip thicker towards the trailing edge, wire slower than planned?',
  ),
  log(outer, 'started', 1, '14:50'),
];
