import type { Drawing } from '#geometry/formats/drawing.ts';
import type { DxfDocument } from '#geometry/formats/dxf-document.ts';

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

/** A document with one entity of each kind, its polyline with a vertex that stands twice. */
export const SMALL_DOCUMENT: DxfDocument = {
  comments: ['Reed wing v1'],
  layers: [
    { name: 'CUT', color: 1, centerLine: false, lineWeight: 25 },
    { name: 'TEXT', color: 3, centerLine: false, lineWeight: 25 },
  ],
  entities: [
    { kind: 'polyline', layer: 'CUT', chain: { x: [50, 50, 0, 50], y: [0, 0, 5, 0] }, closed: true },
    { kind: 'line', layer: 'CUT', from: { x: 0, y: 1 }, to: { x: 2, y: 3 } },
    { kind: 'circle', layer: 'CUT', center: { x: 20, y: 2 }, radius: 1.5 },
    { kind: 'text', layer: 'TEXT', text: { text: 'Reed wing v1', x: 0, y: -10, height: 2.5 } },
  ],
  extents: { minX: 0, maxX: 50, minY: 0, maxY: 5 },
};
