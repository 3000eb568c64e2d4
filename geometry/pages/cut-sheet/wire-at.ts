import { type Polyline, polylineOf } from '../../cutting/arrays.ts';
import { type End } from '../../cutting/plan.ts';
import { type CorePlan } from '../../cutting/planner.ts';
import { type Point } from '../../point.ts';

/** The wire's way round one core in the plane of a face of the block. */
export interface WireInFace {
  /** In the block's frame, mm; begins and ends where the wire hangs clear of the foam. */
  readonly line: Polyline;
  /** Points, by their index, towards which an arrow shows the direction. */
  readonly arrows: readonly number[];
}

/** Arrows stand where the wire passes this part of the chord. */
const ARROW_STATION = 0.5;

/**
 * The wire's way round one core of the block, without the travel outside of the foam; null without a machine.
 * @param core which core of the block, from 0
 */
export function wireAt({ plan, cut }: CorePlan, end: End, core: number): WireInFace | null {
  const { machine, block } = plan;
  if (!cut || !machine || !block) return null;
  const left = (machine.rootFace === 'left') === (end === 'root');
  const inBlock = ({ x, y }: Point): Point => ({
    x: machine.trailingEdge === 'origin' ? machine.blockXMm + block.lengthMm - x : x - machine.blockXMm,
    y: y - machine.blockYMm,
  });
  const nodes = cut.path.nodes.filter((node) => node.core === core);
  const first = nodes.findIndex(({ kind }) => kind !== 'travel');
  if (first < 1) return null;
  // The node before the first lead is where the wire hangs clear of the block.
  const last = nodes.findLastIndex(({ kind }) => kind !== 'travel');
  const way = nodes.slice(first - 1, last + 1);
  const passes = way.flatMap(({ kind, station }, i) => {
    const before = way[i - 1]?.station ?? null;
    if (kind !== 'cut' || station === null || before === null) return [];
    return (station - ARROW_STATION) * (before - ARROW_STATION) <= 0 ? [i] : [];
  });
  return {
    line: polylineOf(way.map((node) => inBlock(left ? node.left : node.right))),
    arrows: [1, ...passes],
  };
}
