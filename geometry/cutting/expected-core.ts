import { type Polyline, at, polylineOf } from './arrays.ts';
import { type BlockPlace, toBlock, toMachine } from './block.ts';
import { type Core } from './core.ts';
import { type PlacedFeature } from './features.ts';
import { type End, type Plan } from './plan.ts';
import { PART } from './row.ts';

/** A line at both faces in step, in the machine's frame. */
export interface FacePair {
  readonly left: Polyline;
  readonly right: Polyline;
}

/** A place where the core's outline is open because a feature begins there. */
export interface Mouth extends FacePair {
  readonly parts: readonly number[];
}

/** What one core must come out as, on the machine. */
export interface ExpectedCore {
  readonly outline: FacePair;
  readonly part: Uint8Array;
  /** The mouth of each feature: its two edges on the core's surface. */
  readonly mouths: readonly Mouth[];
  /** Points of the features' walls that the kerf must just touch. */
  readonly walls: FacePair;
  readonly halfKerfLeftMm: number;
  readonly halfKerfRightMm: number;
}

/** The cores of a block in the machine's frame, as the simulated cut must leave them. */
export function expectedCores(
  plan: Plan,
  core: Core,
  features: readonly PlacedFeature[],
  places: readonly BlockPlace[],
): ExpectedCore[] {
  return places.map((place) => {
    const rootLeft = (plan.machine.rootFace === 'left') !== place.mirrored;
    const [leftEnd, rightEnd]: [End, End] = rootLeft ? ['root', 'tip'] : ['tip', 'root'];
    const placed = (line: Polyline) => toMachine(plan.machine, plan.block, toBlock(place, line));
    const pair = (of: (end: End) => Polyline): FacePair => ({
      left: placed(of(leftEnd)),
      right: placed(of(rightEnd)),
    });
    return {
      outline: pair((end) => core[end].core),
      part: core.panel.chain.part,
      mouths: features.map((feature) => ({
        ...pair((end) => polylineOf(feature[end].mouth)),
        parts: feature.feature.kind === 'strip' ? [PART.upper, PART.lower] : [PART[feature.surface]],
      })),
      walls: pair((end) => polylineOf(features.flatMap((feature) => feature[end].walls))),
      halfKerfLeftMm: core[leftEnd].halfKerfMm,
      halfKerfRightMm: core[rightEnd].halfKerfMm,
    };
  });
}

/** True when x lies between the two edges of a mouth, or within `by` of them. */
export function inMouth(mouth: Polyline, x: number, by: number): boolean {
  const [a, b] = [at(mouth.x, 0), at(mouth.x, 1)];
  return x > Math.min(a, b) - by && x < Math.max(a, b) + by;
}
