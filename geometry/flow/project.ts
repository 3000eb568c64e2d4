import { type Side } from './layer.ts';
import { type March } from './march.ts';
import { type Change } from './growth.ts';
import { LAMINAR, TURBULENT, WAKE } from './station.ts';
import { START_SHARE } from './turbulent.ts';

const START = Math.sqrt(START_SHARE);

/**
 * Brings the whole layer onto its equations, side by side and then the wake, each station along the line of its own interaction law;
 * transition moves as far as the march finds it.
 * @param selfInfluence change of a node's speed per mass defect of its own, one for each node
 */
export function project(march: March, selfInfluence: Float64Array): void {
  march.failures = 0;
  const { layer } = march;
  projectSide(march, layer.upper, march.upperChange, selfInfluence);
  projectSide(march, layer.lower, march.lowerChange, selfInfluence);
  joinWake(march);
  for (let i = layer.panels.nodes + 1; i < layer.size; i++) {
    march.solve(i, WAKE, null, { kind: 'line', value: selfInfluence[i] ?? 0 });
    march.advance();
  }
}

function projectSide(march: March, side: Side, change: Change, selfInfluence: Float64Array): void {
  marchSide(march, side, change, (i, regime, xi) =>
    march.solve(i, regime, xi, { kind: 'line', value: selfInfluence[i] ?? 0 }),
  );
}

/** Marches one side; `solve` meets the equations of node i behind `march.before`. */
export function marchSide(
  march: March,
  side: Side,
  change: Change,
  solve: (i: number, regime: typeof LAMINAR | typeof TURBULENT, xi: number | null) => unknown,
): void {
  const { layer } = march;
  let i = march.stagnate(side);
  march.advance();
  change.node = -1;
  side.transitionS = Infinity;
  side.tripped = false;
  while (i !== side.last) {
    i += side.step;
    const was = layer.regime[i];
    const turbulent = change.node !== -1;
    const turnsHere = !turbulent && march.growth.turns(side, change, i);
    if (turbulent || turnsHere) {
      if (was === LAMINAR) layer.c[i] = turnsHere ? startStress(march, i) : march.before.c;
      solve(i, TURBULENT, turnsHere ? change.xi : null);
    } else {
      if (was !== LAMINAR && (layer.dstar[i] ?? 0) < 2 * (layer.theta[i] ?? 0)) {
        layer.theta[i] = march.before.theta;
        layer.dstar[i] = march.before.dstar;
      }
      solve(i, LAMINAR, null);
    }
    march.advance();
  }
}

/** Shear stress of a station that was laminar so far, within bounds that a start can have. */
function startStress(march: March, i: number): number {
  march.load(march.here, i, TURBULENT);
  return Math.min(0.15, Math.max(0.01, START * march.here.equilibrium.value));
}

/**
 * √CT with which a side enters the wake, with its slopes against θ, δ*, ue and c: a side still laminar at the edge brings the stress of a
 * start.
 */
export interface EdgeStress {
  value: number;
  t: number;
  d: number;
  u: number;
  c: number;
}

/** The stress of a side at the trailing edge. */
export function edgeStress(march: March, side: Side): EdgeStress {
  const { layer, here } = march;
  if (layer.regime[side.last] !== LAMINAR) return { value: layer.c[side.last] ?? 0, t: 0, d: 0, u: 0, c: 1 };
  march.load(here, side.last, TURBULENT);
  const e = here.equilibrium;
  return { value: START * e.value, t: START * e.t, d: START * e.d, u: START * e.u, c: 0 };
}

/** The wake's first station: thicknesses of both sides added, stress as their mean weighted by θ. */
export function joinWake(march: March): void {
  const { layer } = march;
  const { theta, dstar, c } = layer;
  const [u, l, w] = [layer.upper.last, layer.lower.last, layer.panels.nodes];
  const [t1, t2] = [theta[u] ?? 0, theta[l] ?? 0];
  theta[w] = t1 + t2;
  dstar[w] = (dstar[u] ?? 0) + (dstar[l] ?? 0);
  c[w] = (t1 * edgeStress(march, layer.upper).value + t2 * edgeStress(march, layer.lower).value) / (t1 + t2);
  march.load(march.here, w, WAKE);
  march.advance();
}
