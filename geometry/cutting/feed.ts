import { type Polyline, at } from './arrays.ts';
import { type Finding, error, mm, stationText, warning } from './findings.ts';
import { ENDS, type End, type Machine, type WirePlan } from './plan.ts';
import { type MoveKind, type WirePath } from './wire-path.ts';

/** The length of the segment that ends at point i, mm. */
export function stepLength({ x, y }: Polyline, i: number): number {
  return Math.hypot(at(x, i) - at(x, i - 1), at(y, i) - at(y, i - 1));
}

/**
 * Seconds for a move from point i − 1 to point i; common practice: the speed belongs at the foam, not at the carriages. In the foam the wire has the wanted speed at its faster face; on travel the faster tower has the
 * travel feed; no axis goes faster than the machine allows.
 */
export function moveSeconds(
  speeds: { readonly feedMmMin: number; readonly machine: Machine },
  kind: MoveKind,
  faces: { readonly left: Polyline; readonly right: Polyline },
  towers: { readonly left: Polyline; readonly right: Polyline },
  i: number,
): number {
  const { feedMmMin, machine } = speeds;
  const axis = Math.max(
    ...[towers.left.x, towers.left.y, towers.right.x, towers.right.y].map((of) =>
      Math.abs(at(of, i) - at(of, i - 1)),
    ),
  );
  const [lines, feed] = kind === 'travel' ? [towers, machine.travelFeedMmMin] : [faces, feedMmMin];
  const way = Math.max(stepLength(lines.left, i), stepLength(lines.right, i));
  return 60 * Math.max(way / feed, axis / machine.maxFeedMmMin);
}

/** How unevenly the wire's two ends move along the contour: the slower end melts more. */
export interface MeltReport {
  readonly slowerEnd: End;
  /** Length cut at the faster end over that at the slower end. */
  readonly ratio: number;
  /** The largest ratio over a stretch of a fiftieth of the contour, and the station where it is. */
  readonly largestRatio: number;
  readonly largestAtStation: number;
  /** The longest time that one end stands still while the other moves, and where. */
  readonly longestStandS: number;
  readonly standsAtStation: number;
}

/** One end standing for longer than this is warned of, in seconds. Common practice. */
const LONGEST_STAND_S = 2;
const STRETCHES = 50;

/** Compares both ends along the contour of the first core. */
export function meltReport(plan: WirePlan, path: WirePath, seconds: Float64Array): MeltReport {
  const rootLeft = plan.machine.rootFace === 'left';
  const [root, tip] = rootLeft ? [path.left, path.right] : [path.right, path.left];
  const ways: { root: number; tip: number; station: number; seconds: number }[] = [];
  path.nodes.forEach(({ kind, station, core }, i) => {
    if (kind !== 'cut' || station === null || core !== 0 || i === 0) return;
    ways.push({ root: stepLength(root, i), tip: stepLength(tip, i), station, seconds: at(seconds, i) });
  });
  const sum = (end: End) => ways.reduce((total, way) => total + way[end], 0);
  const [rootMm, tipMm] = [sum('root'), sum('tip')];
  const slower = Math.max(Number.MIN_VALUE, Math.min(rootMm, tipMm));
  return {
    slowerEnd: rootMm < tipMm ? 'root' : 'tip',
    ratio: slower > Number.MIN_VALUE ? Math.max(rootMm, tipMm) / slower : 1,
    ...largestRatio(ways, Math.max(rootMm, tipMm) / STRETCHES),
    ...longestStand(ways),
  };
}

type Ways = readonly { root: number; tip: number; station: number; seconds: number }[];

function largestRatio(ways: Ways, stretch: number): Pick<MeltReport, 'largestRatio' | 'largestAtStation'> {
  let [largest, station] = [1, 0];
  let [root, tip, from] = [0, 0, 0];
  ways.forEach((way) => {
    root += way.root;
    tip += way.tip;
    for (
      let first = ways[from];
      first && Math.max(root - first.root, tip - first.tip) >= stretch;
      first = ways[from]
    ) {
      root -= first.root;
      tip -= first.tip;
      from += 1;
    }
    const slower = Math.min(root, tip);
    if (Math.max(root, tip) < stretch || slower <= 0) return;
    const ratio = Math.max(root, tip) / slower;
    if (ratio > largest) [largest, station] = [ratio, way.station];
  });
  return { largestRatio: largest, largestAtStation: station };
}

const STANDS = 1e-6;

function longestStand(ways: Ways): Pick<MeltReport, 'longestStandS' | 'standsAtStation'> {
  let [longest, station] = [0, 0];
  for (const end of ENDS) {
    let stands = 0;
    for (const way of ways) {
      stands = way[end] < STANDS ? stands + way.seconds : 0;
      if (stands > longest) [longest, station] = [stands, way.station];
    }
  }
  return { longestStandS: longest, standsAtStation: station };
}

/** What the feed and the melt report give reason to say. */
export function feedFindings(plan: WirePlan, melt: MeltReport): Finding[] {
  const { feedMmMin, maxFeedMmMin } = plan.material;
  const findings: Finding[] = [];
  if (feedMmMin > maxFeedMmMin) {
    const message = `The cutting feed of ${feedMmMin} mm/min is above the material’s limit of ${maxFeedMmMin} mm/min.`;
    findings.push(error('feed-above-limit', 'material.feedMmMin', message));
  }
  if (melt.largestRatio > plan.limits.speedRatio) {
    const message = `Near ${stationText(melt.largestAtStation)} of the chord one end of the wire is ${melt.largestRatio.toFixed(1)} times as fast as the other: the slower one melts more.`;
    findings.push(warning('uneven-speed', 'panel.tip.chordMm', message, { station: melt.largestAtStation }));
  }
  if (melt.longestStandS > LONGEST_STAND_S) {
    const message = `Near ${stationText(melt.standsAtStation)} of the chord one end of the wire stands for ${melt.longestStandS.toFixed(1)} s at ${mm(feedMmMin)}/min and burns a hole.`;
    findings.push(warning('wire-stands', 'material.feedMmMin', message, { station: melt.standsAtStation }));
  }
  return findings;
}
