import { Interval } from '#geometry/flow/interval.ts';
import { type Regime, Station } from '#geometry/flow/station.ts';

/** State of the layer at one station. */
export interface Plain {
  readonly theta: number;
  readonly dstar: number;
  readonly c: number;
}

/** Marches the integral equations along given speeds by Newton's method at each station: no coupling, for comparison with exact layers. */
export function marchPlain(
  regime: Regime,
  s: readonly number[],
  ue: readonly number[],
  nu: number,
  first: Plain,
): Plain[] {
  const [a, b, interval] = [new Station(), new Station(), new Interval()];
  const states = [first];
  for (let i = 1; i < s.length; i++) {
    const before = states[i - 1]!;
    let { theta, dstar, c } = before;
    for (let iteration = 0; ; iteration++) {
      if (iteration > 50) throw new Error(`no solution at station ${i}`);
      a.set(regime, s[i - 1]!, before.theta, before.dstar, ue[i - 1]!, before.c, nu, 0);
      b.set(regime, s[i]!, theta, dstar, ue[i]!, c, nu, 0);
      interval.between(a, b);
      const step = solve(interval, regime);
      const largest = Math.max(
        Math.abs(step[0] / theta),
        Math.abs(step[1] / dstar),
        regime ? Math.abs(step[2] / c) : 0,
      );
      const part = Math.min(1, 0.3 / largest);
      theta += part * step[0];
      dstar += part * step[1];
      c += part * step[2];
      if (largest < 1e-10) break;
    }
    states.push({ theta, dstar, c });
  }
  return states;
}

function solve({ down, residual }: Interval, regime: Regime): readonly [number, number, number] {
  const rows = (regime ? [0, 1, 2] : [0, 1]).map((q) => [down[q * 5]!, down[q * 5 + 1]!, regime ? down[q * 5 + 3]! : 0, -residual[q]!]); // prettier-ignore
  if (!regime) rows.push([0, 0, 1, 0]);
  for (let k = 0; k < 3; k++) {
    for (let i = 0; i < 3; i++) {
      if (i === k) continue;
      const factor = rows[i]![k]! / rows[k]![k]!;
      rows[i] = rows[i]!.map((value, j) => value - factor * rows[k]![j]!);
    }
  }
  return [rows[0]![3]! / rows[0]![0]!, rows[1]![3]! / rows[1]![1]!, rows[2]![3]! / rows[2]![2]!];
}
