import { type Polyline, at, between, boxOf } from './arrays.ts';
import { type ExpectedCore } from './expected-core.ts';
import { stepLength } from './feed.ts';
import { type Finding, error, mm } from './findings.ts';
import { type WireSetup } from './plan.ts';
import { type ReadMove } from './read-program.ts';

/** Findings of one kind beyond this number are counted instead of listed. */
const LISTED = 12;
/** Rounding of times and places, relative and in mm. */
const RELATIVE = 1e-6;
const ROUNDING_MM = 1e-3;

interface Faces {
  readonly left: Polyline;
  readonly right: Polyline;
}

/** What the moves of a program overstep: travel, the machine's and the material's feed, and the block while a core is cut. */
export function limitBreaches(
  setup: WireSetup,
  moves: readonly ReadMove[],
  faces: Faces,
  cores: readonly ExpectedCore[],
): Finding[] {
  const findings: Finding[] = [];
  for (let i = 1; i < moves.length; i++) {
    const [from, to] = [moves[i - 1], moves[i]];
    if (!from || !to) continue;
    findings.push(...travelBreach(setup, to), ...feedBreaches(setup, from, to, faces, i));
  }
  findings.push(...blockBreaches(setup, moves, faces, cores));
  return shortened(findings);
}

function travelBreach({ machine }: WireSetup, { line, leftX, leftY, rightX, rightY }: ReadMove): Finding[] {
  const { axes } = machine.controller;
  const checks = [
    [axes.leftX, leftX, machine.travelXMm, 'travelXMm'],
    [axes.leftY, leftY, machine.travelYMm, 'travelYMm'],
    [axes.rightX, rightX, machine.travelXMm, 'travelXMm'],
    [axes.rightY, rightY, machine.travelYMm, 'travelYMm'],
  ] as const;
  return checks.flatMap(([letter, value, limit, field]) => {
    if (value >= 0 && value <= limit) return [];
    const message = `Line ${line}: ${letter} at ${mm(value)} lies outside the travel of 0 to ${mm(limit)}.`;
    return [error('outside-travel', `machine.${field}`, message, { line })];
  });
}

function feedBreaches(setup: WireSetup, from: ReadMove, to: ReadMove, faces: Faces, i: number): Finding[] {
  const { machine, material } = setup;
  const found: Finding[] = [];
  const speed = (way: number) => (way === 0 ? 0 : (60 * way) / to.seconds);
  const axis = Math.max(
    ...(['leftX', 'leftY', 'rightX', 'rightY'] as const).map((key) => speed(Math.abs(to[key] - from[key]))),
  );
  if (axis > machine.maxFeedMmMin * (1 + RELATIVE)) {
    const message = `Line ${to.line}: an axis runs at ${axis.toFixed(0)} mm/min, above the machine’s ${machine.maxFeedMmMin} mm/min.`;
    found.push(error('axis-too-fast', 'machine.maxFeedMmMin', message, { line: to.line }));
  }
  const wire = Math.max(
    ...([faces.left, faces.right] as const).map((face) =>
      inFoam(setup, face, i) ? speed(stepLength(face, i)) : 0,
    ),
  );
  if (wire > material.maxFeedMmMin * (1 + RELATIVE)) {
    const message = `Line ${to.line}: the wire runs through the foam at ${wire.toFixed(0)} mm/min, above the material’s ${material.maxFeedMmMin} mm/min.`;
    found.push(error('wire-too-fast', 'material.maxFeedMmMin', message, { line: to.line }));
  }
  return found;
}

interface Rectangle {
  readonly minX: number;
  readonly maxX: number;
  readonly minY: number;
  readonly maxY: number;
}

function blockOf({ machine, block }: WireSetup): Rectangle {
  return {
    minX: machine.blockXMm,
    maxX: machine.blockXMm + block.lengthMm,
    minY: machine.blockYMm,
    maxY: machine.blockYMm + block.heightMm,
  };
}

/** True when a segment of a face's path passes through the block (clipped against its sides). */
function inFoam(setup: WireSetup, { x, y }: Polyline, i: number): boolean {
  const { minX, maxX, minY, maxY } = blockOf(setup);
  let [from, to] = [0, 1];
  for (const [start, end, low, high] of [
    [at(x, i - 1), at(x, i), minX, maxX],
    [at(y, i - 1), at(y, i), minY, maxY],
  ] as const) {
    const way = end - start;
    if (way === 0) {
      if (start <= low || start >= high) return false;
      continue;
    }
    const [a, b] = [(low - start) / way, (high - start) / way];
    from = Math.max(from, Math.min(a, b));
    to = Math.min(to, Math.max(a, b));
  }
  return from < to;
}

/** Moves that cut the core's surface where there is no foam: the core would not come out whole. */
function blockBreaches(
  setup: WireSetup,
  moves: readonly ReadMove[],
  faces: Faces,
  cores: readonly ExpectedCore[],
): Finding[] {
  const block = blockOf(setup);
  return (['left', 'right'] as const).flatMap((side) => {
    const face = faces[side];
    return cores.flatMap((core) => {
      const half = side === 'left' ? core.halfKerfLeftMm : core.halfKerfRightMm;
      const outline = between(core.outline.left, core.outline.right, side === 'left' ? 0 : 1);
      const box = boxOf(outline);
      const reach = half + ROUNDING_MM;
      const leaves =
        box.minX < block.minX || box.maxX > block.maxX || box.minY < block.minY || box.maxY > block.maxY;
      if (!leaves) return [];
      return moves.flatMap(({ line }, i): Finding[] => {
        const [x, y] = [at(face.x, i), at(face.y, i)];
        const outside = Math.max(block.minX - x, x - block.maxX, block.minY - y, y - block.maxY);
        const near =
          x > box.minX - reach && x < box.maxX + reach && y > box.minY - reach && y < box.maxY + reach;
        if (outside <= half || !near) return [];
        const message = `Line ${line}: the wire cuts the core ${mm(outside - half)} outside the block at the ${side} face.`;
        return [error('outside-block', 'block', message, { line })];
      });
    });
  });
}

/** The first findings of each kind, and one that counts the rest. */
function shortened(findings: readonly Finding[]): Finding[] {
  const seen = new Map<string, number>();
  const kept = findings.filter(({ code }) => {
    const count = (seen.get(code) ?? 0) + 1;
    seen.set(code, count);
    return count <= LISTED;
  });
  for (const [code, count] of seen) {
    const last = kept.findLast((of) => of.code === code);
    if (count > LISTED && last) {
      kept.push({
        ...last,
        message: `${count - LISTED} further lines do the same as line ${last.at?.line ?? 0}.`,
      });
    }
  }
  return kept;
}
