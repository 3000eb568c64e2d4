import { type Surface } from '#geometry/shapes/cst.ts';
import { type Shape } from '#geometry/shapes/shape.ts';

/** The points of a section that can be taken hold of. A weight handle is named by surface and index. */
export type HandleId =
  'camber' | 'thickness-upper' | 'thickness-lower' | 'nose' | 'edge' | `${Surface}-${number}`;

/** The handles that a shape has, in reading order: nose first, then along the upper and the lower surface. */
export function handleIds(shape: Shape): HandleId[] {
  if (shape.kind === 'naca4') return ['nose', 'camber', 'thickness-upper', 'thickness-lower', 'edge'];
  const weights = (surface: Surface) => shape[surface].map((_, index): HandleId => `${surface}-${index}`);
  return ['nose', ...weights('upper'), ...weights('lower'), 'edge'];
}

/** Surface and index of a weight handle, null for the other handles. */
export function weightOf(handle: HandleId): { surface: Surface; index: number } | null {
  const match = /^(upper|lower)-(\d+)$/.exec(handle);
  if (!match) return null;
  return { surface: match[1] === 'upper' ? 'upper' : 'lower', index: Number(match[2]) };
}
