import { expect, test } from 'vitest';
import { panelSystem, strengthsAt } from '#geometry/flow/inviscid.ts';
import { panelOutline, panelsOf } from '#geometry/flow/panels.ts';
import { WAKE_NODES, ownWakeSpeed, traceWake, wakeSpeed, wakeStream } from '#geometry/flow/wake.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

const panels = panelsOf(panelOutline(outlineOf(naca4('4412')), 120));
const alpha = 0.1;
const wake = traceWake(panels, strengthsAt(panelSystem(panels, false), alpha), alpha);

test('the wake leaves along the bisector, is a chord long and turns towards the stream', () => {
  expect([wake.x[0], wake.y[0]]).toEqual([panels.edge.x, panels.edge.y]);
  expect(wake.s[WAKE_NODES - 1]).toBeCloseTo(1, 6);
  expect(wake.tx[0]! * panels.edge.bx + wake.ty[0]! * panels.edge.by).toBeGreaterThan(0.999);
  const last = Math.atan2(wake.uy[WAKE_NODES - 1]!, wake.ux[WAKE_NODES - 1]!);
  expect(last).toBeGreaterThan(0.02);
  expect(last).toBeLessThan(alpha);
  expect(wake.length[0]).toBeCloseTo((panels.length[0]! + panels.length.at(-1)!) / 2, 9);
});

test('the speed of a wake panel is the slope of its stream function', () => {
  const [x, y, step] = [0.7, 0.2, 1e-5];
  for (const panel of [0, 5, 18]) {
    const slopeX = (wakeStream(wake, panel, x + step, y) - wakeStream(wake, panel, x - step, y)) / (2 * step);
    const slopeY = (wakeStream(wake, panel, x, y + step) - wakeStream(wake, panel, x, y - step)) / (2 * step);
    expect(wakeSpeed(wake, panel, x, y, 1, 0)).toBeCloseTo(slopeY, 7);
    expect(wakeSpeed(wake, panel, x, y, 0, 1)).toBeCloseTo(-slopeX, 7);
  }
});

test('the mean speed from a panel of its own is the mean of the speeds between both middles', () => {
  const node = 8;
  const [before, after] = [wake.length[node - 1]! / 2, wake.length[node]! / 2];
  // On a straight line: ∫ u dx of panel node − 1, singular at its ends only like a logarithm.
  const l = 2 * before;
  let sum = 0;
  const n = 20_000;
  for (let k = 0; k < n; k++) {
    const x = -before + ((k + 0.5) * (before + after)) / n;
    sum += Math.log(Math.abs((x + l) / x)) / (2 * Math.PI) / n;
  }
  expect(ownWakeSpeed(wake, node, node - 1)).toBeCloseTo(sum, 3);
  expect(ownWakeSpeed(wake, node, node)).toBeLessThan(0);
  expect(ownWakeSpeed(wake, WAKE_NODES - 1, WAKE_NODES - 2)).toBeCloseTo(Math.LN2 / Math.PI, 12);
});
