import { corners } from './marks.ts';
import { type Mark, type Rect } from './page.ts';

/** Clear modules on each side (ISO/IEC 18004). */
export const QUIET_MODULES = 4;

/**
 * A QR code in a square of the page, its quiet zone included. Dark modules that follow one another in a row are one rectangle.
 * @param modules rows of the code, true where dark; none draws nothing
 */
export function qrMarks(modules: readonly (readonly boolean[])[], { x, y, width, height }: Rect): Mark[] {
  const count = modules.length;
  if (count === 0) return [];
  const size = Math.min(width, height) / (count + 2 * QUIET_MODULES);
  const rings = modules.flatMap((row, k) =>
    runsOf(row).map(([from, to]) =>
      corners({
        x: x + (QUIET_MODULES + from) * size,
        y: y + (QUIET_MODULES + k) * size,
        width: (to - from) * size,
        height: size,
      }),
    ),
  );
  return [{ kind: 'area', rings, ink: 'ink' }];
}

function runsOf(row: readonly boolean[]): [number, number][] {
  const runs: [number, number][] = [];
  row.forEach((dark, i) => {
    const last = runs.at(-1);
    if (!dark) return;
    if (last && last[1] === i) last[1] = i + 1;
    else runs.push([i, i + 1]);
  });
  return runs;
}
