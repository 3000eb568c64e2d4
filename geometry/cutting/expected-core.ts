import { type Point } from '../point.ts';
import { type Polyline, at, polylineOf } from './arrays.ts';
import { type BlockPlace, toBlock, toMachine } from './block.ts';
import { type Core } from './core.ts';
import { type PlacedFeature } from './features.ts';
import { type End, type WirePlan } from './plan.ts';
import { PART } from './row.ts';

/** A line at both faces in step, in the machine's frame. */
export interface FacePair {
  readonly left: Polyline;
  readonly right: Polyline;
}

/** A place where the core's outline is open because a feature begins there. */
export interface OpenPlace extends FacePair {
  /** The part of the chain it is in, as in `PART`. */
  readonly part: number;
}

/** What one core must come out as, on the machine. */
export interface ExpectedCore {
  readonly outline: FacePair;
  readonly part: Uint8Array;
  /** The mouth of each feature: its two edges on the core's surface. */
  readonly mouths: readonly OpenPlace[];
  /** Points of the features' walls that the kerf must just touch. */
  readonly walls: FacePair;
  readonly halfKerfLeftMm: number;
  readonly halfKerfRightMm: number;
}

/** The cores of a block in the machine's frame, as the simulated cut must leave them. */
export function expectedCores(
  plan: WirePlan,
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
      mouths: features.flatMap((feature) =>
        feature.root.mouths.map(({ surface }, i) => ({
          ...pair((end) => polylineOf(feature[end].mouths[i]?.edges ?? [])),
          part: PART[surface],
        })),
      ),
      walls: pair((end) => polylineOf(features.flatMap((feature) => wallsOf(feature, end)))),
      halfKerfLeftMm: core[leftEnd].halfKerfMm,
      halfKerfRightMm: core[rightEnd].halfKerfMm,
    };
  });
}

/** A feature's wall points at one end, without those that either end lacks. */
function wallsOf(feature: PlacedFeature, end: End): Point[] {
  const other = feature[end === 'root' ? 'tip' : 'root'].walls;
  return feature[end].walls.filter((point, i): point is Point => point !== null && other[i] !== null);
}

/** True when x lies between the two edges of a mouth, or within `by` of them. */
export function inMouth(mouth: Polyline, x: number, by: number): boolean {
  const [a, b] = [at(mouth.x, 0), at(mouth.x, 1)];
  return x > Math.min(a, b) - by && x < Math.max(a, b) + by;
}
