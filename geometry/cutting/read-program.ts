import { type Finding, error } from './findings.ts';
import { type Controller, type Machine } from './plan.ts';

/** A place of both towers that the program moves to. */
export interface ReadMove {
  /** Line number, counted from 1. */
  readonly line: number;
  readonly leftX: number;
  readonly leftY: number;
  readonly rightX: number;
  readonly rightY: number;
  /** Time of the move, s. */
  readonly seconds: number;
}

export interface ReadProgram {
  /** Beginning with the origin, as line 0. */
  readonly moves: readonly ReadMove[];
  /** Moves and waits together, s. */
  readonly totalSeconds: number;
  readonly findings: readonly Finding[];
}

const WORD = /([A-Z])([+-]?(?:\d+\.?\d*|\.\d+))/gy;
/** Groups of RS-274 that change nothing this reader has to know. */
const WITHOUT_EFFECT = new Set([17, 40, 49, 54, 61, 64, 80]);
const IGNORED_LETTERS = new Set(['N', 'M', 'S', 'T']);

interface Modal {
  motion: 0 | 1 | null;
  metric: boolean;
  absolute: boolean;
  inverseTime: boolean;
  feed: number;
  at: Record<'leftX' | 'leftY' | 'rightX' | 'rightY', number>;
}

/**
 * Reads a program back: what a controller of the given settings would do with the text, and nothing else. Units and distance mode must be stated
 * before the first move; what this reader does not know is a finding with its line.
 */
export function readProgram(text: string, machine: Machine): ReadProgram {
  const modal: Modal = {
    motion: null,
    metric: false,
    absolute: false,
    inverseTime: false,
    feed: 0,
    at: { leftX: 0, leftY: 0, rightX: 0, rightY: 0 },
  };
  const moves: ReadMove[] = [{ line: 0, ...modal.at, seconds: 0 }];
  const findings: Finding[] = [];
  let totalSeconds = 0;
  text.split(/\r?\n/).forEach((source, index) => {
    const line = index + 1;
    const fault = (code: string, message: string) =>
      findings.push(error(code, 'machine.controller', `Line ${line}: ${message}`, { line }));
    const words = wordsOf(source);
    if (words === null) return fault('unreadable-line', 'not readable as RS-274 words.');
    const problem = applyModes(words, modal);
    if (problem) return fault('unsupported-code', problem);
    if (words.some(({ letter, value }) => letter === 'G' && value === 4)) {
      const wait = words.find(({ letter }) => letter === 'P')?.value ?? 0;
      totalSeconds += machine.controller.dwellUnit === 'seconds' ? wait : wait / 1000;
      return;
    }
    const move = moveOf(words, modal, machine, line);
    if (move === null) return;
    if (typeof move === 'string') return fault('unclear-move', move);
    moves.push(move);
    totalSeconds += move.seconds;
  });
  return { moves, totalSeconds, findings };
}

interface Word {
  readonly letter: string;
  readonly value: number;
}

/** The words of a line without comments and blanks; null when something else stands there. */
function wordsOf(source: string): Word[] | null {
  const code = source
    .replace(/\([^()]*\)/g, '')
    .replace(/;.*$/, '')
    .replace(/\s+/g, '')
    .toUpperCase();
  const words: Word[] = [];
  WORD.lastIndex = 0;
  let end = 0;
  for (let match = WORD.exec(code); match; match = WORD.exec(code)) {
    words.push({ letter: match[1] ?? '', value: Number(match[2]) });
    end = WORD.lastIndex;
  }
  return end === code.length ? words : null;
}

function applyModes(words: readonly Word[], modal: Modal): string | null {
  let problem: string | null = null;
  for (const { letter, value } of words) {
    if (letter === 'F') modal.feed = value;
    if (letter !== 'G') continue;
    if (value === 0 || value === 1) modal.motion = value;
    else if (value === 20 || value === 21) modal.metric = value === 21;
    else if (value === 90 || value === 91) modal.absolute = value === 90;
    else if (value === 93 || value === 94) modal.inverseTime = value === 93;
    else if (value !== 4 && !WITHOUT_EFFECT.has(value)) problem = `G${value} is not part of these programs.`;
  }
  return problem;
}

/** The move of a line; null when no axis is named; a sentence when it is unclear what the machine would do. */
function moveOf(
  words: readonly Word[],
  modal: Modal,
  machine: Machine,
  line: number,
): ReadMove | string | null {
  const { axes } = machine.controller;
  const letters = Object.values<string>(axes);
  const unknown = words.find(
    ({ letter }) =>
      !letters.includes(letter) && !IGNORED_LETTERS.has(letter) && !['G', 'F', 'P'].includes(letter),
  );
  if (unknown) return `the letter ${unknown.letter} is no axis of this machine.`;
  if (!words.some(({ letter }) => letters.includes(letter))) return null;
  if (!modal.metric || !modal.absolute) return 'a move before G21 and G90, or in other units.';
  if (modal.motion === null) return 'a move without G0 or G1.';
  const from = { ...modal.at };
  for (const [axis, letter] of Object.entries(axes) as [keyof Modal['at'], string][]) {
    const word = words.find((of) => of.letter === letter);
    if (word) modal.at[axis] = word.value;
  }
  const own = words.some(({ letter }) => letter === 'F');
  if (modal.motion === 1 && modal.inverseTime && !own) return 'a G93 move without its F.';
  if (modal.motion === 1 && modal.feed <= 0) return 'a move without a feed.';
  return { line, ...modal.at, seconds: secondsOf(from, modal, machine) };
}

function secondsOf(
  from: Modal['at'],
  { at: to, motion, inverseTime, feed }: Modal,
  machine: Machine,
): number {
  const left = Math.hypot(to.leftX - from.leftX, to.leftY - from.leftY);
  const right = Math.hypot(to.rightX - from.rightX, to.rightY - from.rightY);
  if (motion === 0) {
    const axis = Math.max(
      ...(['leftX', 'leftY', 'rightX', 'rightY'] as const).map((key) => Math.abs(to[key] - from[key])),
    );
    return (60 * axis) / machine.maxFeedMmMin;
  }
  const { controller } = machine;
  if (!inverseTime) return (60 * feedLength(controller, left, right)) / feed;
  if (controller.inverseTime === 'seconds') return feed;
  return (controller.inverseTime === 'per-minute' ? 60 : 1) / feed;
}

function feedLength(controller: Controller, left: number, right: number): number {
  if (controller.feedOver === 'all-axes') return Math.hypot(left, right);
  return left > 0 ? left : right;
}
