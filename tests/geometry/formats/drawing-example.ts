import type { Drawing } from '#geometry/formats/drawing.ts';

/** A drawing small enough to be read by eye: a five-point outline with one arc. */
export const SMALL_DRAWING: Drawing = {
  title: 'Marsh 2412 v3',
  header: [
    'Marsh 2412 v3, released',
    'NACA 2412',
    'chord 100 mm, unit mm, tolerance 1 mm',
    'checksum 3f2a9c81b0de',
  ],
  layers: ['OUTLINE', 'CHORD', 'CAMBER', 'TEXT'],
  outline: { x: [100, 40, 0, 40, 100], y: [0.25, 9.5, 0, -4, -0.25], bulge: [0.0625, 0, 0, 0, 0] },
  chordLine: [
    { x: 0, y: 0 },
    { x: 100, y: 0 },
  ],
  camberLine: { x: [0, 40, 100], y: [0, 2, 0] },
  texts: [{ text: 'Marsh 2412 v3, released', x: 0, y: -10, height: 2.5 }],
  extents: { minX: 0, maxX: 100, minY: -4, maxY: 9.5 },
};
