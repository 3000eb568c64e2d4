import { DXF_DECIMALS } from '../../formats/dxf-tags.ts';
import { type Polyline, at } from '../arrays.ts';
import { type Core } from '../core.ts';

/**
 * The pairs of the core's outlines that a file carries, in order: all but those whose two points a file cannot tell from the two before them. A corner
 * stands in the chain as several pairs at one place, of which one is enough; nothing else is left out, and both ends keep the same pairs.
 */
export function pairsInStep({ root, tip }: Core): readonly number[] {
  const [a, b] = [root.core, tip.core];
  const same = (i: number, k: number) => coincide(a, i, k) && coincide(b, i, k);
  const kept: number[] = [];
  for (let i = 0; i < a.x.length; i += 1) {
    const last = kept.at(-1);
    if (last === undefined || !same(i, last)) kept.push(i);
  }
  while (kept.length > 1 && same(kept.at(-1) ?? 0, kept[0] ?? 0)) kept.pop();
  return kept;
}

const UNIT = 10 ** DXF_DECIMALS;

function coincide({ x, y }: Polyline, i: number, k: number): boolean {
  const equal = (of: Float64Array) => Math.round(at(of, i) * UNIT) === Math.round(at(of, k) * UNIT);
  return equal(x) && equal(y);
}

/** Chosen points of a line. */
export function pick({ x, y }: Polyline, indices: readonly number[]): Polyline {
  return {
    x: Float64Array.from(indices, (i) => at(x, i)),
    y: Float64Array.from(indices, (i) => at(y, i)),
  };
}
