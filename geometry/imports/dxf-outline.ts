import { type Chain, sizeOf } from './chains.ts';
import { definingPoints, drawnPoints } from './dxf-drawn.ts';
import { type DxfContent, readDxf } from './dxf-entities.ts';
import { type ImportedContour, contourOf } from './imported.ts';
import { IMPORT_LIMITS, ImportRefusal } from './refusal.ts';
import { textOf } from './text.ts';

/** Millimetres in the units that $INSUNITS can name (DXF reference, header variables); 0 is no unit. */
const UNIT_MM: Readonly<Record<number, number>> = {
  1: 25.4,
  2: 304.8,
  4: 1,
  5: 10,
  6: 1000,
  8: 25.4e-6,
  9: 0.0254,
  10: 914.4,
  13: 0.001,
  14: 100,
};

/** Ends of lines meet within this share of the size of the drawing. */
const JOINT = 1e-4;

/**
 * Reads a section from a DXF drawing: an outline of LWPOLYLINE or POLYLINE (with bulges), LINE and ARC in any order and direction, or
 * SPLINE (control points of any degree, or fit points). Open lines beside a closed outline, such as a chord line, are passed over.
 * @throws ImportRefusal when the file is no DXF or its lines are no outline of one section
 */
export function readDxfOutline(bytes: Uint8Array): ImportedContour {
  const { text, note } = textOf(bytes);
  if (text.trimStart().startsWith('<')) {
    throw new ImportRefusal('markup', 'The file is HTML or XML, not a DXF drawing.', 1);
  }
  const content = readDxf(text);
  refuseWithoutOutline(content);
  const defining = content.entities.map(definingPoints);
  const size = sizeOf(defining.map((points) => points.map((point) => ({ ...point, line: 0 }))));
  const layers = new Map<string, Chain[]>();
  const divided = new Set<number>();
  let points = 0;
  for (const entity of content.entities) {
    const drawn = drawnPoints(entity, size);
    if (drawn.divided) divided.add(entity.line);
    points += drawn.points.length;
    refuseTooMany(points);
    const chain = drawn.points.map(({ x, y }) => ({ x, y, line: entity.line }));
    const layer = layers.get(entity.layer);
    if (layer) layer.push(chain);
    else layers.set(entity.layer, [chain]);
  }
  return contourOf({
    name: null,
    groups: [...layers.values()],
    unit: { mm: UNIT_MM[content.unitCode ?? 0] ?? null, hundred: 'mm' },
    notes: [...(note === null ? [] : [note]), ...othersNote(content.others)],
    divided,
    joint: JOINT,
    extras: true,
    ordered: false,
  });
}

function refuseTooMany(points: number): void {
  const { max } = IMPORT_LIMITS.points;
  if (points > max) throw new ImportRefusal('too-many-points', `The drawing has more than ${max} points.`);
}

function refuseWithoutOutline({ entities, others }: DxfContent): void {
  if (entities.length > 0) return;
  const blocks = others.has('INSERT') ? ' Its blocks are not read: explode them first.' : '';
  const message = `The drawing holds no lines, arcs, polylines or splines.${blocks}`;
  throw new ImportRefusal('no-outline', message);
}

const MOST_KINDS = 5;

function othersNote(others: ReadonlyMap<string, number>): string[] {
  const count = [...others.values()].reduce((sum, value) => sum + value, 0);
  if (count === 0) return [];
  const kinds = [...others.keys()].slice(0, MOST_KINDS).map((kind) => kind.slice(0, 20));
  const more = others.size > MOST_KINDS ? ', …' : '';
  return [`passed over ${count} other ${count === 1 ? 'entity' : 'entities'} (${kinds.join(', ')}${more})`];
}
