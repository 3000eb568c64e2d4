import jsQR from 'jsqr';
import { expect, test } from 'vitest';
import { qrModules } from '#server/cut-sheets/files/qr.ts';

/** The modules as a picture, 4 dots each with 4 clear modules around. */
function pictureOf(modules: readonly (readonly boolean[])[]): [Uint8ClampedArray, number] {
  const size = 4 * (modules.length + 8);
  const data = new Uint8ClampedArray(4 * size * size).fill(255);
  for (let y = 0; y < size; y += 1)
    for (let x = 0; x < size; x += 1)
      if (modules[(y >> 2) - 4]?.[(x >> 2) - 4]) data.fill(0, 4 * (y * size + x), 4 * (y * size + x) + 3);
  return [data, size];
}

test.each(['https://wings.example/c/K7QM-3F2X', `https://wings.example/${'a'.repeat(200)}`, 'Grüße, 翼'])(
  '%s is read back',
  (text) => {
    const modules = qrModules(text);
    expect(modules.every((row) => row.length === modules.length)).toBe(true);
    const [data, size] = pictureOf(modules);
    expect(jsQR(data, size, size)?.data).toBe(text);
  },
);

test('some modules may be lost', () => {
  const modules = qrModules('https://wings.example/c/K7QM-3F2X');
  const middle = modules.length >> 1;
  const [data, size] = pictureOf(
    modules.map((row, y) => row.map((of, x) => (y === middle && x > 9 && x < 20 ? !of : of))),
  );
  expect(jsQR(data, size, size)?.data).toBe('https://wings.example/c/K7QM-3F2X');
});

test('what no code holds is refused', () => {
  expect(() => qrModules('x'.repeat(5000))).toThrow(/too big/i);
});
