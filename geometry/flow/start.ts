import { type OuterFlow } from './coupling.ts';
import { type Layer, type Side } from './layer.ts';
import { type Change } from './growth.ts';
import { type March } from './march.ts';
import { joinWake, marchSide } from './project.ts';
import { LAMINAR, type Regime, WAKE } from './station.ts';

/** How far the prescribed shape factor moves per momentum thickness in the cold start, and its bounds [all own choices]. */
const RISE_LAMINAR = 0.02;
const RISE_TURBULENT = 0.03;
const DECAY = 0.05;
const DIRECT = { kind: 'speed', value: 0 } as const;
const SEPARATED = { laminar: 3.8, turbulent: 2.4 } as const;
const HIGHEST_LAMINAR = 6;
/** Behind this station the start continues the speed linearly to one value for both edges. */
const EDGE_FROM = 0.9;

/**
 * First state for an angle, from the flow without a layer: the layer is marched with that speed; where it would separate, its shape factor
 * is prescribed instead, rising as in a laminar bubble and falling behind transition, and the speed follows.
 */
export function coldStart(march: March, outer: OuterFlow): void {
  const { layer } = march;
  layer.startFrom(outer.inviscid);
  layer.measureWake(outer);
  softenEdge(layer);
  startSide(march, layer.upper, march.upperChange);
  startSide(march, layer.lower, march.lowerChange);
  const w = layer.panels.nodes;
  const atEdge = ((layer.ue[layer.upper.last] ?? 1) + (layer.ue[layer.lower.last] ?? 1)) / 2;
  for (let i = w; i < layer.size; i++) {
    const along = (layer.s[i] ?? 0) - (layer.s[w] ?? 0);
    layer.ue[i] = 1 - (1 - atEdge) * Math.exp(-along / 0.25);
  }
  joinWake(march);
  let scale = 1;
  for (let i = w + 1; i < layer.size; i++) {
    scale = startStation(march, i, WAKE, null, scale);
    march.advance();
  }
}

function softenEdge(layer: Layer): void {
  const { panels, ue } = layer;
  const ends = [layer.upper, layer.lower].map((side) => {
    let i = side.last;
    while ((panels.x[i - side.step] ?? 0) > EDGE_FROM && i - side.step !== side.first) i -= side.step;
    const before = i - side.step;
    const slope =
      ((ue[i] ?? 0) - (ue[before] ?? 0)) / Math.max(1e-9, (layer.s[i] ?? 0) - (layer.s[before] ?? 0));
    return {
      side,
      from: i,
      slope,
      value: (ue[i] ?? 0) + slope * ((layer.s[side.last] ?? 0) - (layer.s[i] ?? 0)),
    };
  });
  const common = Math.max(
    0.5,
    ends.reduce((sum, { value }) => sum + value / ends.length, 0),
  );
  for (const { side, from } of ends) {
    const [u0, s0] = [ue[from] ?? 1, layer.s[from] ?? 0];
    const span = Math.max(1e-9, (layer.s[side.last] ?? 0) - s0);
    for (let i = from; ; i += side.step) {
      ue[i] = u0 + ((common - u0) * ((layer.s[i] ?? 0) - s0)) / span;
      if (i === side.last) break;
    }
  }
}

function startSide(march: March, side: Side, change: Change): void {
  let scale = 1;
  marchSide(march, side, change, (i, regime, xi) => {
    scale = startStation(march, i, regime, xi, scale);
  });
}

/** Solves one station of the start. @param scale ratio of the speed found so far to the speed without a layer @returns the ratio here */
function startStation(march: March, i: number, regime: Regime, xi: number | null, scale: number): number {
  const { layer, before } = march;
  const wanted = layer.ue[i] ?? 1;
  const relaxed = scale + 0.03 * (1 - scale);
  const limit = regime === LAMINAR ? SEPARATED.laminar : SEPARATED.turbulent;
  const h1 = before.h;
  layer.ue[i] = wanted * relaxed;
  layer.theta[i] = before.theta;
  layer.dstar[i] = xi === null ? before.dstar : Math.min(before.dstar, 2 * before.theta);
  if (regime !== LAMINAR) layer.c[i] = xi === null ? before.c : 0.05;
  if (march.solve(i, regime, xi, DIRECT) && march.here.h < limit) return relaxed;
  const along = ((layer.s[i] ?? 0) - before.s) / before.theta;
  const h = prescribedShape(regime, h1, along);
  layer.ue[i] = before.ue;
  layer.theta[i] = before.theta;
  layer.dstar[i] = h * before.theta;
  if (regime !== LAMINAR) layer.c[i] = xi === null ? before.c : 0.05;
  if (march.solve(i, regime, xi, { kind: 'shape', value: h })) return (layer.ue[i] ?? wanted) / wanted;
  layer.ue[i] = wanted * relaxed;
  march.load(march.here, i, regime);
  return relaxed;
}

function prescribedShape(regime: Regime, h1: number, along: number): number {
  if (regime === LAMINAR) return Math.min(HIGHEST_LAMINAR, Math.max(h1, 2.2) + RISE_LAMINAR * along);
  if (h1 > SEPARATED.turbulent) return Math.max(2, 1.5 + (h1 - 1.5) / (1 + DECAY * along));
  return Math.min(SEPARATED.turbulent, h1 + RISE_TURBULENT * along);
}
