import type { Drawing } from './drawing.ts';
import { writeR12 } from './dxf-r12.ts';
import { writeR2000 } from './dxf-r2000.ts';

type DxfRelease = 'r12' | 'r2000';

/**
 * A DXF drawing in mm: the outline as one closed polyline on layer OUTLINE, chord line and mean camber line as centre lines on
 * CHORD and CAMBER, and what the file says about itself on TEXT and as comments (group 999) before the first section,
 * where readers of both releases pass over them.
 *
 * `r12` (AC1009) writes POLYLINE, VERTEX and SEQEND; it knows no unit, so a comment and the file's name state it. `r2000` (AC1015)
 * writes LWPOLYLINE, the unit ($INSUNITS 4, millimetre) and line widths. The bytes depend on the drawing alone.
 *
 * Source: the DXF reference (group codes, header variables $ACADVER, $INSUNITS, $MEASUREMENT; LWPOLYLINE, POLYLINE, SEQEND);
 * codes of VERTEX and of the table records from memory.
 *
 * @throws RangeError when a coordinate is not finite
 */
export function writeDxf(drawing: Drawing, release: DxfRelease): string {
  return release === 'r12' ? writeR12(drawing) : writeR2000(drawing);
}
