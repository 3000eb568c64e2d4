import { expect, test, vi } from 'vitest';
import { type Contour } from '#geometry/contour/contour.ts';
import { inviscidFlow, panelSystem, strengthsAt } from '#geometry/flow/inviscid.ts';
import { panelOutline, panelsOf } from '#geometry/flow/panels.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { INVISCID_PRESSURES, INVISCID_SECTIONS, MEAN_LINES } from '#tests/reference/flow-sections.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';
import { exactSection } from './exact-flow.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const one = (contour: Contour, alphaDeg: number) => inviscidFlow(contour, [alphaDeg])[0]!;
const section = (digits: string, edge: 'open' | 'closed' = 'closed') =>
  panelOutline(outlineOf(naca4(digits, edge)), 160);

const EXACT = [
  ['Joukowski, symmetric', [-0.1, 0], 2],
  ['Joukowski, cambered', [-0.1, 0.1], 2],
  ['Kármán–Trefftz, symmetric, 10° edge', [-0.08, 0], 2 - 10 / 180],
  ['Kármán–Trefftz, cambered, 15° edge', [-0.1, 0.08], 2 - 15 / 180],
] as const;

function errors(mu: readonly [number, number], k: number, panels: number) {
  const exact = exactSection(mu, k, 5, panels);
  const found = one(exact.contour, 5);
  let [sum, circulation] = [0, 0];
  for (let i = 1; i < panels; i++) sum += (found.cp[i]! - exact.cp[i]!) ** 2;
  for (let i = 0; i < panels; i++) {
    const l = Math.hypot(found.x[i + 1]! - found.x[i]!, found.y[i + 1]! - found.y[i]!);
    circulation += ((found.speed[i]! + found.speed[i + 1]!) / 2) * l;
  }
  return {
    cl: Math.abs(found.cl / exact.cl - 1),
    circulation: Math.abs((2 * circulation) / exact.cl - 1),
    cp: Math.sqrt(sum / (panels - 1)),
  };
}

test.each(EXACT)(
  '%s: cp within 0.01 (root mean square) and cl within 0.5 % at 160 panels',
  (_name, mu, k) => {
    const { cp, cl } = errors(mu, k, 160);
    expect(cp).toBeLessThan(0.01);
    expect(cl).toBeLessThan(0.005);
  },
);

test.each(EXACT)(
  '%s: the error of the circulation falls by the square of the panel length, that of cp nearly so',
  (_name, mu, k) => {
    const order = (a: number, b: number) => Math.log2(a / b) / 2;
    const [coarse, fine] = [errors(mu, k, 40), errors(mu, k, 160)];
    expect(order(coarse.circulation, fine.circulation)).toBeGreaterThan(1.9);
    expect(order(coarse.cp, fine.cp)).toBeGreaterThan(1.75);
  },
);

test('the exact flow itself: lift and pressures of the symmetric Joukowski section at 5° (μ = −0.1, b = 1)', () => {
  const exact = exactSection([-0.1, 0], 2, 5, 24);
  expect(exact.cl).toBeCloseTo(0.5973989, 6);
  // Every 15°: at 90° and at 150°, 210° of the table of the mapping.
  expect(exact.cp[6]).toBeCloseTo(-0.42939, 5);
  expect(exact.cp[10]).toBeCloseTo(-1.520323, 5);
  expect(exact.cp[14]).toBeCloseTo(0.350329, 5);
});

test.each(Object.entries(INVISCID_SECTIONS))(
  '%s against conformal mapping at 0, 4, 8°: cl and cm within 0.001',
  (digits, exact) => {
    inviscidFlow(section(digits), [0, 4, 8]).forEach(({ cl, cm }, i) => {
      expect(Math.abs(cl - exact.cl[i]!)).toBeLessThan(1e-3);
      expect(Math.abs(cm - exact.cm[i]!)).toBeLessThan(1e-3);
    });
  },
);

test('pressures of 0012 and 4412 at 4° against conformal mapping within 0.01', () => {
  const at = (digits: string) => {
    const flow = one(section(digits), 4);
    const nose = flow.x.reduce((best, x, i) => (x < flow.x[best]! ? i : best), 0);
    return (station: number, upper: boolean) => {
      const step = upper ? -1 : 1;
      let i = nose;
      while (flow.x[i + step]! < station) i += step;
      // Quadratic through three nodes, in the square root of the station.
      const nodes = [i - step, i, i + step].map(
        (k) => [Math.sqrt(Math.max(0, flow.x[k]!)), flow.cp[k]!] as const,
      );
      const x = Math.sqrt(station);
      return nodes.reduce((sum, [xi, value], k) => sum + nodes.reduce((product, [xj], j) => (j === k ? product : (product * (x - xj)) / (xi - xj)), value), 0); // prettier-ignore
    };
  };
  const [a, b] = [at('0012'), at('4412')];
  for (const [x, u1, l1, u2, l2] of INVISCID_PRESSURES) {
    const found = [a(x, true), a(x, false), b(x, true), b(x, false)];
    const bound = x < 0.02 ? 0.05 : 0.01;
    [u1, l1, u2, l2].forEach((cp, i) =>
      expect(Math.abs(found[i]! - cp), `x = ${x}, ${i}`).toBeLessThan(bound),
    );
  }
});

test.each(MEAN_LINES)(
  'thin-airfoil theory of the mean line 1%d: the section of 1 per cent thickness comes to it',
  (tenths, zeroLiftDeg, cm) => {
    // Theory is linear in the camber; a section of thickness t has about (1 + 0.77 t) times its slope.
    const flows = inviscidFlow(section(`1${tenths}01`), [zeroLiftDeg / 6, zeroLiftDeg / 6 + 4]);
    expect(Math.abs(flows[0]!.cl)).toBeLessThan(0.002);
    expect(Math.abs(flows[0]!.cm - cm / 6)).toBeLessThan(0.0005);
    const slope = (flows[1]!.cl - flows[0]!.cl) / (2 * Math.PI * Math.sin((4 * Math.PI) / 180));
    expect(Math.abs(slope - 1.0077)).toBeLessThan(0.005);
  },
);

test('the thinner the blunt edge, the nearer the flow to that of the sharp one', () => {
  const shape = {
    kind: 'cst',
    upper: [0.18, 0.2, 0.19],
    lower: [-0.14, -0.1, -0.12],
    n1: 0.5,
    n2: 1,
  } as const;
  const lift = (trailingEdgeGap: number) =>
    one(panelOutline(outlineOf({ ...shape, trailingEdgeGap }), 160), 4).cl;
  const [sharp, thin, thick] = [lift(0), lift(2e-5), lift(0.01)];
  expect(Math.abs(thin - sharp)).toBeLessThan(1e-3);
  expect(Math.abs(thick - sharp)).toBeLessThan(0.03);
});

test('every angle is a mixture of 0° and 90°, and the Kutta condition holds', () => {
  const system = panelSystem(panelsOf(section('2412', 'open')), false);
  const strengths = strengthsAt(system, 0.1);
  expect(strengths[0]! + strengths.at(-1)!).toBeCloseTo(0, 10);
  expect(strengths[40]).toBeCloseTo(Math.cos(0.1) * system.at0[40]! + Math.sin(0.1) * system.at90[40]!, 12);
});

test('a Mach number strengthens the pressures, beyond its range it is refused', () => {
  const [low] = inviscidFlow(section('2412'), [2]);
  const [fast] = inviscidFlow(section('2412'), [2], 0.3);
  expect(fast!.cl / low!.cl).toBeGreaterThan(1 / Math.sqrt(1 - 0.09) - 0.002);
  expect(fast!.lowestCp).toBeLessThan(low!.lowestCp);
  expect(() => inviscidFlow(section('2412'), [2], 0.7)).toThrow(/mach/);
});
