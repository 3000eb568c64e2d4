// @vitest-environment node
import { expect, test } from 'vitest';
import { LatestRunner } from '#client/cut-sheets/views/latest-runner.ts';

/** A run whose answers are given by the test. */
function controlled() {
  const started: { input: number; answer: (output: string) => void; fail: (error: Error) => void }[] = [];
  const runner = new LatestRunner(
    (input: number) =>
      new Promise<string>((answer, fail) => {
        started.push({ input, answer, fail });
      }),
  );
  const settled = async () => {
    for (let i = 0; i < 5; i++) await Promise.resolve();
  };
  return { runner, started, settled };
}

test('one at a time, and of those that wait only the newest', async () => {
  const { runner, started, settled } = controlled();
  runner.ask(1);
  runner.ask(2);
  runner.ask(3);
  expect(started.map(({ input }) => input)).toEqual([1]);
  started[0]!.answer('one');
  await settled();
  expect(started.map(({ input }) => input)).toEqual([1, 3]);
  expect(runner.state()).toEqual({ output: 'one', stale: true, error: null });
  started[1]!.answer('three');
  await settled();
  expect(runner.state()).toEqual({ output: 'three', stale: false, error: null });
});

test('the last result stays while a newer one is worked out', async () => {
  const { runner, started, settled } = controlled();
  runner.ask(1);
  started[0]!.answer('one');
  await settled();
  runner.ask(2);
  expect(runner.state()).toEqual({ output: 'one', stale: true, error: null });
});

test('a failure keeps the last result, says why, and does not end the work', async () => {
  const { runner, started, settled } = controlled();
  runner.ask(1);
  started[0]!.answer('one');
  await settled();
  runner.ask(2);
  const error = new Error('the worker is gone');
  started[1]!.fail(error);
  await settled();
  expect(runner.state()).toEqual({ output: 'one', stale: false, error });
  runner.ask(3);
  started[2]!.answer('three');
  await settled();
  expect(runner.state()).toEqual({ output: 'three', stale: false, error: null });
});

test('listeners hear of every change until they leave', async () => {
  const { runner, started, settled } = controlled();
  let heard = 0;
  const leave = runner.subscribe(() => heard++);
  runner.ask(1);
  started[0]!.answer('one');
  await settled();
  expect(heard).toBe(2);
  leave();
  runner.ask(2);
  expect(heard).toBe(2);
});
