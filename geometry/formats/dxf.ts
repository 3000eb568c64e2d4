import type { Drawing } from './drawing.ts';
import type { DxfDocument, DxfEntity } from './dxf-document.ts';
import { SECTION_LAYERS } from './dxf-layers.ts';
import { writeR12 } from './dxf-r12.ts';
import { writeR2000 } from './dxf-r2000.ts';

export type DxfRelease = 'r12' | 'r2000';

/**
 * A DXF drawing in mm: the outline as one closed polyline on layer OUTLINE, chord line and mean camber line as centre lines on
 * CHORD and CAMBER, and what the file says about itself on TEXT and as comments (group 999) before the first section,
 * where readers of both releases pass over them.
 *
 * @throws RangeError when a coordinate is not finite
 */
export function writeDxf(drawing: Drawing, release: DxfRelease): string {
  return writeDxfDocument(documentOf(drawing), release);
}

/**
 * A DXF file in mm.
 *
 * `r12` (AC1009) writes POLYLINE, VERTEX and SEQEND; it knows no unit, so a comment, a line of known length below the last text and the file's
 * name state it. `r2000` (AC1015) writes LWPOLYLINE, the unit ($INSUNITS 4, millimetre) and line widths. The bytes depend on the document alone.
 *
 * Source: the DXF reference (group codes, header variables $ACADVER, $INSUNITS, $MEASUREMENT; LWPOLYLINE, POLYLINE, SEQEND);
 * codes of VERTEX, CIRCLE and of the table records from memory.
 *
 * @throws RangeError when a coordinate is not finite
 */
export function writeDxfDocument(document: DxfDocument, release: DxfRelease): string {
  return release === 'r12' ? writeR12(document) : writeR2000(document);
}

function documentOf(drawing: Drawing): DxfDocument {
  const [nose, edge] = drawing.chordLine;
  const entities: readonly DxfEntity[] = [
    { kind: 'polyline', layer: 'OUTLINE', chain: drawing.outline, closed: true },
    { kind: 'line', layer: 'CHORD', from: nose, to: edge },
    { kind: 'polyline', layer: 'CAMBER', chain: drawing.camberLine, closed: false },
    ...drawing.texts.map((text) => ({ kind: 'text', layer: 'TEXT', text }) as const),
  ];
  const layers = drawing.layers.map((name) => SECTION_LAYERS[name]);
  const written = new Set(layers.map(({ name }) => name));
  return {
    comments: drawing.header,
    layers,
    entities: entities.filter(({ layer }) => written.has(layer)),
    extents: drawing.extents,
  };
}
