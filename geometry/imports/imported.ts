import {
  type Chain,
  joinChains,
  oneLoop,
  sizeOf,
  withoutDuplicates,
  withoutReversedPairs,
} from './chains.ts';
import { type SourceUnit, normalise } from './normalise.ts';
import { IMPORT_LIMITS, ImportRefusal } from './refusal.ts';
import { type OrderedLoop, orderLoop } from './section-loop.ts';

/** A section outline from outside, repaired and laid on the unit chord. */
export interface ImportedContour {
  /** What the file calls the section; null when it does not say. */
  readonly name: string | null;
  /**
   * Fractions of chord, upper trailing edge → nose → lower trailing edge; the chord runs from (0, 0) to (1, 0). A sharp trailing edge
   * stands at both ends. 10 to 10 000 points.
   */
  readonly x: readonly number[];
  readonly y: readonly number[];
  /** All that was done to what the file holds, in the order it was done: “removed 2 duplicate points”. */
  readonly repairs: readonly string[];
  /** The chord of the file in mm; null when its unit is not a length. */
  readonly sourceChordMm: number | null;
}

/** What a reader found in a file. */
export interface FoundChains {
  readonly name: string | null;
  /** The chains of the file; only those of one group are joined where their ends meet. */
  readonly groups: readonly (readonly Chain[])[];
  readonly unit: SourceUnit;
  readonly notes: readonly string[];
  /** Lines of the file whose straight line was divided into pieces. */
  readonly divided: ReadonlySet<number>;
  /** Share of the size within which ends of chains meet. */
  readonly joint: number;
  /** Whether open lines beside a closed outline are passed over. */
  readonly extras: boolean;
  /** Whether the order of the points says something to people: in a list it does, in a drawing not. */
  readonly ordered: boolean;
}

/**
 * The section outline that the chains of a file make up.
 * @throws ImportRefusal when they are no outline of a section
 */
export function contourOf(found: FoundChains): ImportedContour {
  const all = found.groups.flat();
  const size = sizeOf(all);
  refuseCount(all.reduce((sum, chain) => sum + chain.length, 0));
  const repaired = repairedGroups(found.groups, size);
  const joined = repaired.groups.flatMap((chains) => joinChains(chains, found.joint * size));
  const loop = oneLoop(joined, size, found.extras);
  const once = withoutClosing(withoutDuplicates(loop.points, size).chain, size);
  refuseCount(once.length);
  const ordered = orderLoop(once, found.ordered && all.length === 1);
  const { x, y, sourceChordMm, notes } = normalise(ordered, found.unit);
  return {
    name: found.name,
    x,
    y,
    sourceChordMm,
    repairs: [
      ...found.notes,
      ...counted(repaired.removed, 'removed', 'duplicate point', 'duplicate points'),
      ...counted(repaired.pairs, 'exchanged', 'pair of reversed points', 'pairs of reversed points'),
      ...loop.notes,
      ...dividedNote(once, found.divided),
      ...(ordered.mirrored ? ['mirrored, for the nose pointed right'] : []),
      ...(found.ordered ? orderNotes(repaired.groups.flat(), ordered, size) : []),
      ...counted(ordered.facePoints, 'removed', 'point', 'points', ' on the trailing-edge face'),
      ...notes,
    ],
  };
}

/** The points of a loop without a last one that repeats the first. */
function withoutClosing(points: Chain, size: number): Chain {
  const ends = [...points.slice(-1), ...points.slice(0, 1)];
  return withoutDuplicates(ends, size).removed === 1 ? points.slice(0, -1) : points;
}

function dividedNote(points: Chain, divided: ReadonlySet<number>): string[] {
  const used = new Set(points.map(({ line }) => line).filter((line) => divided.has(line)));
  return counted(used.size, 'divided', 'long straight line', 'long straight lines', ' into short pieces');
}

/** What is said about the order in which a text lists its points. */
function orderNotes(chains: readonly Chain[], ordered: OrderedLoop, size: number): string[] {
  const [first, last] = [ordered.points[0], ordered.points.at(-1)];
  const begins = chains[0]?.[0]?.line;
  const notes: string[] = [];
  if (chains.length > 1) notes.push('joined the surfaces: upper trailing edge, nose, lower trailing edge');
  else {
    if (ordered.reversed !== ordered.mirrored) notes.push('reversed the direction of the points');
    if (begins !== first?.line && begins !== last?.line) notes.push('began the outline at its trailing edge');
  }
  const edges = chains
    .flat()
    .filter((point) => withoutDuplicates([point, first ?? point], size).removed === 1);
  if (ordered.sharp && edges.length < 2) notes.push('added the missing trailing-edge point of one surface');
  return notes;
}

function counted(count: number, what: string, one: string, many: string, where = ''): string[] {
  return count === 0 ? [] : [`${what} ${count} ${count === 1 ? one : many}${where}`];
}

function refuseCount(count: number): void {
  const { min, max } = IMPORT_LIMITS.points;
  if (count < min) {
    throw new ImportRefusal(
      'too-few-points',
      `The outline has ${count} different points; ${min} are needed.`,
    );
  }
  if (count > max) {
    throw new ImportRefusal('too-many-points', `The file has more than ${max} points.`);
  }
}

/** The groups without duplicate points and reversed pairs, and how many of them there were. */
function repairedGroups(groups: readonly (readonly Chain[])[], size: number) {
  let [removed, pairs] = [0, 0];
  const repair = (chain: Chain) => {
    const single = withoutDuplicates(chain, size);
    const ordered = withoutReversedPairs(single.chain);
    removed += single.removed;
    pairs += ordered.pairs;
    return ordered.chain;
  };
  const repaired = groups.map((chains) => chains.map(repair).filter((chain) => chain.length > 1));
  return { groups: repaired, removed, pairs };
}
