import { z } from 'zod';
import { type Point } from '../point.ts';
import { polylineOf } from './arrays.ts';
import { type ExpectedCore } from './expected-core.ts';
import { length, number } from './fields.ts';
import { type Finding, error, findingsOf, hasErrors, mm } from './findings.ts';
import {
  PLAN_LIMITS,
  type WireSetup,
  blockSchema,
  cutSchema,
  machineSchema,
  materialSchema,
} from './plan.ts';
import { type Program, programOf, setupComments } from './program.ts';
import { comment } from './program-text.ts';
import { PART } from './row.ts';
import { type Simulation, simulate } from './simulate.ts';
import { checkBench } from './towers.ts';
import { type MoveKind, type WireNode, type WirePath, pathOf } from './wire-path.ts';

/** Widths of test pieces in mm, and how many there may be. */
export const STRIP_LIMITS = { widthMm: { min: 3, max: 200 }, pieces: 8 } as const;
/** The widths to begin with: a kerf that is right comes out alike at all of them. */
export const STRIP_WIDTHS_MM: readonly number[] = [10, 20, 40];

export const stripWidthsSchema = z
  .array(length('A test piece’s width', STRIP_LIMITS.widthMm.min, STRIP_LIMITS.widthMm.max))
  .min(1, { error: 'The test strip needs a piece.' })
  .max(STRIP_LIMITS.pieces, { error: `At most ${STRIP_LIMITS.pieces} pieces.` });

/** A test strip on a wire machine. */
export const wireStripSchema = z.strictObject({
  machine: machineSchema,
  material: materialSchema,
  /** The piece of foam, at the block's place on the machine. */
  block: blockSchema.pick({ lengthMm: true, heightMm: true, spanMm: true }),
  /** From the top downwards. */
  widthsMm: stripWidthsSchema,
  /** The kerf expected, for the simulation and the widths to be looked for; 0 when nothing is known of it. */
  kerfMm: number('The expected kerf', ' mm', PLAN_LIMITS.kerfMm.min, PLAN_LIMITS.kerfMm.max),
  clearanceMm: cutSchema.shape.clearanceMm,
  warmUpS: cutSchema.shape.warmUpS,
});
type WireStripPlan = z.infer<typeof wireStripSchema>;

/** One piece between two cuts. */
export interface StripPiece {
  /** Counted from 1 at the top. */
  readonly number: number;
  /** Distance between the wire's centre on both sides, mm. */
  readonly commandedMm: number;
  /** What it measures if the expected kerf is right, mm. */
  readonly expectedMm: number;
  /** Heights of its two cuts above the foam's underside, mm. */
  readonly topMm: number;
  readonly bottomMm: number;
}

export interface WireStrip {
  readonly pieces: readonly StripPiece[];
  readonly path: WirePath;
  readonly program: Program;
  readonly simulation: Simulation;
}

/** Foam above the first and below the last cut, mm: the lower part is what the foam is held by. */
const ABOVE_MM = 5;
const BELOW_MM = 10;
/** A piece must keep at least this width, mm. */
const LEAST_PIECE_MM = 1;

/**
 * A test strip for the kerf: straight level cuts through a piece of foam, both towers at the same speed, so that each piece between two cuts
 * is narrower than commanded by one kerf, at either end by the kerf there. The cuts go from the top downwards: a part that
 * is cut off sinks by the kerf onto the foam below it, and a cut above it afterwards would make the kerf vanish from the measure.
 * @returns no strip while its values are refused or it does not stand between the towers
 */
export function planWireStrip(values: unknown): {
  readonly strip: WireStrip | null;
  readonly findings: readonly Finding[];
} {
  const parsed = wireStripSchema.safeParse(values);
  if (!parsed.success) return { strip: null, findings: findingsOf(parsed.error) };
  const plan = parsed.data;
  const setup: WireSetup = { ...plan, panel: { spanMm: plan.block.spanMm } };
  const before = [...checkBench(setup), ...sizeFindings(plan)];
  if (hasErrors(before)) return { strip: null, findings: before };
  const pieces = piecesOf(plan);
  const path = pathThrough(plan, pieces);
  const program = programOf(setup, path, headOf(plan));
  const simulation = simulate(
    program.text,
    setup,
    pieces.map((piece) => expectedPiece(plan, piece)),
  );
  return { strip: { pieces, path, program, simulation }, findings: simulation.findings };
}

function sizeFindings({ block, widthsMm, kerfMm }: WireStripPlan): Finding[] {
  const needed = widthsMm.reduce((sum, width) => sum + width, ABOVE_MM + BELOW_MM);
  const height =
    needed <= block.heightMm
      ? []
      : [
          error(
            'larger-than-block',
            'block.heightMm',
            `The pieces need foam ${mm(needed)} high, this one has ${mm(block.heightMm)}.`,
          ),
        ];
  const thin = widthsMm.flatMap((width, i) =>
    width - kerfMm >= LEAST_PIECE_MM
      ? []
      : [error('piece-too-thin', `widthsMm.${i}`, `A kerf of ${mm(kerfMm)} leaves nothing of ${mm(width)}.`)],
  );
  return [...height, ...thin];
}

function piecesOf({ block, widthsMm, kerfMm }: WireStripPlan): StripPiece[] {
  let topMm = block.heightMm - ABOVE_MM;
  return widthsMm.map((commandedMm, i) => {
    const bottomMm = topMm - commandedMm;
    const piece = { number: i + 1, commandedMm, expectedMm: commandedMm - kerfMm, topMm, bottomMm };
    topMm = bottomMm;
    return piece;
  });
}

/** To and fro through the foam, a level lower each time, and home again clear of it. */
function pathThrough({ machine, block, clearanceMm, warmUpS }: WireStripPlan, pieces: readonly StripPiece[]) {
  const [front, rear] = [machine.blockXMm, machine.blockXMm + block.lengthMm];
  const [near, far] = [front - clearanceMm, rear + clearanceMm];
  const levels = [pieces[0]?.topMm ?? 0, ...pieces.map(({ bottomMm }) => bottomMm)];
  const heights = levels.map((level) => machine.blockYMm + level);
  const first = heights[0] ?? 0;
  const nodes: WireNode[] = [
    nodeAt({ x: 0, y: 0 }, 'travel'),
    nodeAt({ x: 0, y: first }, 'travel'),
    { ...nodeAt({ x: near, y: first }, 'travel'), label: 'Travel to the foam', waitS: warmUpS },
  ];
  heights.forEach((y, i) => {
    const there = i % 2 === 0;
    const [start, enter, leave, end] = there ? [near, front, rear, far] : [far, rear, front, near];
    const label = `Cut ${i + 1}, ${mm(levels[i] ?? 0)} above the underside`;
    if (i > 0) nodes.push(nodeAt({ x: start, y }, 'travel'));
    nodes.push({ ...nodeAt({ x: enter, y }, 'lead'), label });
    nodes.push(nodeAt({ x: leave, y }, 'cut'), nodeAt({ x: end, y }, 'lead'));
  });
  const last = heights.at(-1) ?? 0;
  const over = machine.blockYMm + block.heightMm + clearanceMm;
  const back =
    heights.length % 2 === 0
      ? [{ x: 0, y: last }]
      : [
          { x: far, y: over },
          { x: 0, y: over },
        ];
  nodes.push(...[...back, { x: 0, y: 0 }].map((point) => nodeAt(point, 'travel')));
  return pathOf(nodes);
}

function nodeAt(point: Point, kind: MoveKind): WireNode {
  return { left: point, right: point, kind, station: null, core: 0 };
}

function headOf(plan: WireStripPlan): string[] {
  return [
    comment('Test strip', 'for the kerf'),
    comment('Machine', plan.machine.name),
    comment('Material', `${plan.material.name}, ${plan.material.feedMmMin} mm per min`),
    comment('Pieces', `${plan.widthsMm.join(', ')} mm, from the top`),
    comment('Kerf', 'commanded less measured width, at the left and the right end'),
    ...setupComments(plan),
    comment('Hold', 'the foam by its lowest part, so that the pieces can sink'),
  ];
}

const CHECKED = 5;

/** The two cut faces of a piece, as the simulated kerf must just touch them. */
function expectedPiece(plan: WireStripPlan, { topMm, bottomMm }: StripPiece): ExpectedCore {
  const { machine, block, kerfMm } = plan;
  const half = kerfMm / 2;
  const along = Array.from(
    { length: CHECKED },
    (_, i) => machine.blockXMm + (block.lengthMm * i) / (CHECKED - 1),
  );
  const line = polylineOf([
    ...along.map((x) => ({ x, y: machine.blockYMm + bottomMm + half })),
    ...along.map((x) => ({ x, y: machine.blockYMm + topMm - half })).reverse(),
  ]);
  const none = polylineOf([]);
  return {
    outline: { left: line, right: line },
    part: new Uint8Array(2 * CHECKED).fill(PART.lower, 0, CHECKED).fill(PART.upper, CHECKED),
    mouths: [],
    walls: { left: none, right: none },
    halfKerfLeftMm: half,
    halfKerfRightMm: half,
  };
}
