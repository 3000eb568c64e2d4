import { type Polyline, at } from './arrays.ts';
import { moveSeconds } from './feed.ts';
import { type Controller, type WirePlan, type WireSetup } from './plan.ts';
import { comment, commentText, decimal } from './program-text.ts';
import { type Bench, benchOf, fromTowers, toTowers } from './towers.ts';
import { type WirePath } from './wire-path.ts';

/** What the program says of itself. */
export interface ProgramIdentity {
  readonly sheetName: string;
  readonly versionNumber: number;
  /** SHA-256 of the sheet's version, in hexadecimal. */
  readonly checksum: string;
  readonly part: string;
}

/** A machine program with what belongs to its lines. */
export interface Program {
  readonly text: string;
  /** The line (counted from 1) that moves to each node of the wire's path; 0 where the rounded move vanishes. */
  readonly lineOfNode: Int32Array;
  /** Seconds of the move to each node, at the rounded coordinates. */
  readonly seconds: Float64Array;
  /** All moves and waits together. */
  readonly totalSeconds: number;
}

/** On every program. */
const CAUTIONS = [
  comment('Caution', 'dry run with a cold wire first, emergency stop in reach'),
  comment('Caution', 'hot wire and styrene vapour, cut with ventilation'),
];
const FEED_DECIMALS = 6;
const CHECKSUM_DIGITS = 12;

/**
 * Writes the wire's path as a program after RS-274 (ISO 6983-1 word addresses; RS274/NGC, NISTIR 6556): millimetres, absolute, G93 or G94.
 * Every cutting line carries its F. Coordinates are rounded first and the times taken from the rounded ones, rounded to the slow side, so
 * that the program never runs faster than planned.
 */
export function writeProgram(plan: WirePlan, path: WirePath, identity: ProgramIdentity): Program {
  return programOf(plan, path, headerOf(plan, identity));
}

/**
 * The program of a path behind given comments, by the rules of `writeProgram`.
 * @param head comment lines in parentheses
 */
export function programOf(setup: WireSetup, path: WirePath, head: readonly string[]): Program {
  const { controller } = setup.machine;
  const bench = benchOf(setup);
  const towers = roundedTowers(bench, path, controller.decimals);
  const faces = {
    left: fromTowers(bench, towers, bench.leftFaceMm),
    right: fromTowers(bench, towers, bench.rightFaceMm),
  };
  const lines: string[] = [...head, ...CAUTIONS, 'G21 G90', ...controller.header];
  lines.push(controller.timeMode === 'inverse-time' ? 'G93' : 'G94');
  const lineOfNode = new Int32Array(path.nodes.length);
  const seconds = new Float64Array(path.nodes.length);
  let totalSeconds = 0;
  const speeds = { feedMmMin: setup.material.feedMmMin, machine: setup.machine };
  path.nodes.forEach((node, i) => {
    if (node.label !== undefined) lines.push(comment('Part', node.label));
    const way = i > 0 ? wayOf(towers, i) : null;
    if (way && way.all > 0) {
      const time = moveSeconds(speeds, node.kind, faces, towers, i);
      lines.push(`G1 ${wordsAt(controller, towers, i)} F${feedWord(controller, way, time)}`);
      lineOfNode[i] = lines.length;
      seconds[i] = time;
      totalSeconds += time;
    }
    if (node.waitS !== undefined && node.waitS > 0) {
      lines.push(`G4 P${decimal(controller.dwellUnit === 'seconds' ? node.waitS : node.waitS * 1000, 3)}`);
      totalSeconds += node.waitS;
    }
  });
  if (controller.timeMode === 'inverse-time') lines.push('G94');
  lines.push(...controller.footer);
  if (!controller.footer.some(endsProgram)) lines.push('M2');
  return {
    text: `${numbered(lines, controller.lineNumbers).join('\n')}\n`,
    lineOfNode,
    seconds,
    totalSeconds,
  };
}

/** Whether a footer line ends the program by itself: without M2 or M30 a file is not one (NISTIR 6556, 3.6.1). */
function endsProgram(line: string): boolean {
  return /\bM(?:0?2|30)\b/.test(line.replace(/\(.*/, ''));
}

function headerOf({ machine, panel, block, cut }: WirePlan, identity: ProgramIdentity): string[] {
  const trailing = machine.trailingEdge === 'origin' ? 'toward the origin' : 'away from the origin';
  return [
    comment('Sheet', `${commentText(identity.sheetName)} v${identity.versionNumber}`),
    comment('Made part', identity.part),
    comment('Checksum', identity.checksum.slice(0, CHECKSUM_DIGITS)),
    comment('Chords', `root ${panel.root.chordMm} mm, tip ${panel.tip.chordMm} mm, span ${panel.spanMm} mm`),
    ...setupComments({ machine, block }),
    comment('Direction', `root ${machine.rootFace}, trailing edge ${trailing}`),
    comment('Order', `upper surface first, ${cut.order}`),
  ];
}

/** Where the origin, the foam and the axes are. */
export function setupComments({ machine, block }: Pick<WireSetup, 'machine' | 'block'>): string[] {
  const { axes } = machine.controller;
  const { lengthMm, heightMm } = block;
  return [
    comment('Origin', 'both towers at zero, unit mm'),
    comment(
      'Block',
      `front corner at ${machine.blockXMm} / ${machine.blockYMm}, ${lengthMm} x ${heightMm} mm`,
    ),
    comment('Axes', `left tower ${axes.leftX} ${axes.leftY}, right tower ${axes.rightX} ${axes.rightY}`),
  ];
}

function roundedTowers(bench: Bench, path: WirePath, decimals: number): { left: Polyline; right: Polyline } {
  const { left, right } = toTowers(bench, path.left, path.right);
  const scale = 10 ** decimals;
  const round = ({ x, y }: Polyline): Polyline => ({
    x: x.map((value) => Math.round(value * scale) / scale),
    y: y.map((value) => Math.round(value * scale) / scale),
  });
  return { left: round(left), right: round(right) };
}

interface Way {
  readonly left: number;
  readonly right: number;
  readonly all: number;
}

function wayOf({ left, right }: { left: Polyline; right: Polyline }, i: number): Way {
  const of = ({ x, y }: Polyline) => Math.hypot(at(x, i) - at(x, i - 1), at(y, i) - at(y, i - 1));
  const [l, r] = [of(left), of(right)];
  return { left: l, right: r, all: Math.hypot(l, r) };
}

function wordsAt(
  { axes, decimals }: Controller,
  { left, right }: { left: Polyline; right: Polyline },
  i: number,
): string {
  const word = (letter: string, value: number) => `${letter}${decimal(value, decimals)}`;
  return [
    word(axes.leftX, at(left.x, i)),
    word(axes.leftY, at(left.y, i)),
    word(axes.rightX, at(right.x, i)),
    word(axes.rightY, at(right.y, i)),
  ].join(' ');
}

/** The F of a move that must take at least `time` seconds, rounded to the slow side. */
function feedWord(controller: Controller, way: Way, time: number): string {
  const scale = 10 ** FEED_DECIMALS;
  const slower = (feed: number) => decimal(Math.max(1, Math.floor(feed * scale)) / scale, FEED_DECIMALS);
  if (controller.timeMode === 'feed-per-minute') return slower((60 * feedWay(controller, way)) / time);
  if (controller.inverseTime === 'seconds') return decimal(Math.ceil(time * scale) / scale, FEED_DECIMALS);
  return slower((controller.inverseTime === 'per-minute' ? 60 : 1) / time);
}

/** The length that F speaks of under G94. */
export function feedWay(controller: Controller, way: Way): number {
  if (controller.feedOver === 'all-axes') return way.all;
  return way.left > 0 ? way.left : way.right;
}

/** N words in steps of ten; comment lines stay without. */
function numbered(lines: readonly string[], number: boolean): string[] {
  let n = 0;
  return lines.map((line) => {
    if (!number || line.startsWith('(') || line === '') return line;
    n += 10;
    return `N${n} ${line}`;
  });
}
