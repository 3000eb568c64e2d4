// @vitest-environment node
import { expect, test } from 'vitest';
import {
  type Player,
  type PlayerAction,
  reducePlayer,
  startPlayer,
} from '#client/cut-sheets/planner/player.ts';

const run = (player: Player, ...actions: PlayerAction[]) => actions.reduce(reducePlayer, player);
const TIMES = [0, 10, 20, 100];

test('runs with the clock times its speed, and stops at the end', () => {
  const running = run(startPlayer(100), { type: 'speed', speed: 5 }, { type: 'toggle' });
  expect(running.playing).toBe(true);
  expect(run(running, { type: 'tick', clockSeconds: 2 })).toMatchObject({ seconds: 10, playing: true });
  expect(run(running, { type: 'tick', clockSeconds: 50 })).toMatchObject({ seconds: 100, playing: false });
});

test('a tick moves nothing while it stands', () => {
  const standing = startPlayer(100);
  expect(run(standing, { type: 'tick', clockSeconds: 1 })).toBe(standing);
});

test('from the end it begins anew', () => {
  const ended = run(startPlayer(100), { type: 'seek', seconds: 100 });
  expect(run(ended, { type: 'toggle' })).toMatchObject({ seconds: 0, playing: true });
});

test('seeking and stepping stop it, within the cut', () => {
  const running = run(startPlayer(100), { type: 'toggle' });
  expect(run(running, { type: 'seek', seconds: 400 })).toMatchObject({ seconds: 100, playing: false });
  expect(run(running, { type: 'seek', seconds: -1 }).seconds).toBe(0);
});

test.each([
  [0, 1, 10],
  [10, 1, 20],
  [15, 1, 20],
  [15, -1, 10],
  [20, -1, 10],
  [5, 2, 20],
  [20, -10, 0],
  [90, 10, 100],
])('from %d s a step of %d goes to %d s', (from, by, to) => {
  expect(
    run(startPlayer(100), { type: 'seek', seconds: from }, { type: 'step', by, times: TIMES }).seconds,
  ).toBe(to);
});

test('another cut keeps the share of the way and the run', () => {
  const half = run(startPlayer(100), { type: 'seek', seconds: 50 }, { type: 'toggle' });
  expect(run(half, { type: 'load', totalSeconds: 300 })).toMatchObject({ seconds: 150, playing: true });
  expect(run(startPlayer(0), { type: 'load', totalSeconds: 300 }).seconds).toBe(0);
});

test('without a cut there is nothing to run', () => {
  expect(run(startPlayer(0), { type: 'toggle' }).playing).toBe(false);
});
