import { type Polyline, at } from '#geometry/cutting/arrays.ts';
import { stepLength } from '#geometry/cutting/feed.ts';
import { type Point } from '#geometry/point.ts';
import { type MoveKind } from '#geometry/cutting/wire-path.ts';
import { type CutModel } from './plan-model.ts';

/** Where the wire is at a moment of the cut. */
export interface WirePosition {
  readonly seconds: number;
  /** The node it is on its way to, and how much of that way is behind it, 0 … 1. */
  readonly node: number;
  readonly share: number;
  readonly kind: MoveKind;
  /** It stands and warms up. */
  readonly waits: boolean;
  /** The part of the cut, in the words of the program. */
  readonly part: string;
  /** The program's line, counted from 1; 0 before the first. */
  readonly line: number;
  /** Wire speed in the planes of the panel's left and right face, mm/min. */
  readonly leftFeed: number;
  readonly rightFeed: number;
}

/** The wire at a moment, held between the beginning and the end of the cut. */
export function positionAt(cut: CutModel, seconds: number): WirePosition {
  const time = Math.min(cut.totalSeconds, Math.max(0, seconds));
  const node = nodeAt(cut, time);
  const began = node === 0 ? 0 : at(cut.leaves, node - 1);
  const way = at(cut.arrives, node) - began;
  const share = way > 0 ? Math.min(1, (time - began) / way) : 1;
  const waits = time > at(cut.arrives, node) && at(cut.leaves, node) > at(cut.arrives, node);
  const feed = (line: Polyline) => (node > 0 && way > 0 && !waits ? (60 * stepLength(line, node)) / way : 0);
  return {
    seconds: time,
    node,
    share,
    kind: cut.kinds[node] ?? 'travel',
    waits,
    part: partAt(cut, node),
    line: lineAt(cut, node),
    leftFeed: feed(cut.left),
    rightFeed: feed(cut.right),
  };
}

/** The first node that the wire has not left yet at a moment. */
function nodeAt({ leaves }: CutModel, time: number): number {
  let [low, high] = [0, leaves.length - 1];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (at(leaves, middle) < time) low = middle + 1;
    else high = middle;
  }
  return low;
}

function partAt({ labels, kinds }: CutModel, node: number): string {
  const own = labels.slice(0, node + 1).findLast((label) => label !== null);
  if (kinds[node] === 'travel')
    return own === undefined || node === 0 ? 'Travel' : (labels[node] ?? 'Travel back');
  return own ?? 'Travel';
}

function lineAt({ lineOfNode }: CutModel, node: number): number {
  for (let i = node; i >= 0; i--) {
    const line = at(lineOfNode, i);
    if (line > 0) return line;
  }
  return 0;
}

/** The moment at which the wire has gone through a line of the program; null when no move belongs to it. */
export function secondsOfLine({ lineOfNode, arrives }: CutModel, line: number): number | null {
  const node = lineOfNode.indexOf(line);
  return node < 0 ? null : at(arrives, node);
}

/** The moments at which a new part of the cut begins. */
export function partTimes({ labels, arrives }: CutModel): readonly number[] {
  return labels.flatMap((label, i) => (label === null ? [] : [at(arrives, Math.max(0, i - 1))]));
}

/** The point of a line of nodes that belongs to a position. */
export function pointAt({ x, y }: Polyline, { node, share }: Pick<WirePosition, 'node' | 'share'>): Point {
  const before = Math.max(0, node - 1);
  return {
    x: at(x, before) + share * (at(x, node) - at(x, before)),
    y: at(y, before) + share * (at(y, node) - at(y, before)),
  };
}
