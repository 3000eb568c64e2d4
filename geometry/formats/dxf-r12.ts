import type { DxfDocument, DxfEntity, DxfLayer } from './dxf-document.ts';
import { CENTER } from './dxf-layers.ts';
import { type DxfPolyline, DxfTags, dxfVertices } from './dxf-tags.ts';

const CLOSED = 1;
const PATTERN_OVER_VERTICES = 128;
const SOLID_LINE = 65;
/** R12 states no unit in its data, so the drawing carries a line of known length. */
const TEST_LINE_MM = 100;

export function writeR12(document: DxfDocument): string {
  const tags = new DxfTags();
  for (const line of document.comments) tags.text(999, line);
  tags.word(999, 'All lengths in millimetres');
  header(tags, document);
  tables(tags, document.layers);
  tags.word(0, 'SECTION').word(2, 'BLOCKS').word(0, 'ENDSEC');
  tags.word(0, 'SECTION').word(2, 'ENTITIES');
  for (const entity of document.entities) writeEntity(tags, entity);
  testLine(tags, document.entities);
  return tags.word(0, 'ENDSEC').word(0, 'EOF').toString();
}

function header(tags: DxfTags, { extents }: DxfDocument): void {
  tags.word(0, 'SECTION').word(2, 'HEADER');
  tags.word(9, '$ACADVER').word(1, 'AC1009');
  tags.word(9, '$INSBASE').point(10, 0, 0);
  tags.word(9, '$EXTMIN').point(10, extents.minX, extents.minY);
  tags.word(9, '$EXTMAX').point(10, extents.maxX, extents.maxY);
  tags.word(9, '$LTSCALE').real(40, 1);
  tags.word(0, 'ENDSEC');
}

function tables(tags: DxfTags, layers: readonly DxfLayer[]): void {
  tags.word(0, 'SECTION').word(2, 'TABLES');
  tags.word(0, 'TABLE').word(2, 'LTYPE').whole(70, 2);
  lineType(tags, 'CONTINUOUS', 'Solid line', [], 0);
  lineType(tags, CENTER.name, CENTER.description, CENTER.pattern, CENTER.length);
  tags.word(0, 'ENDTAB');
  tags
    .word(0, 'TABLE')
    .word(2, 'LAYER')
    .whole(70, layers.length + 1);
  layerRecord(tags, '0', 7, 'CONTINUOUS');
  for (const { name, color, centerLine } of layers) {
    layerRecord(tags, name, color, centerLine ? CENTER.name : 'CONTINUOUS');
  }
  tags.word(0, 'ENDTAB');
  tags.word(0, 'TABLE').word(2, 'STYLE').whole(70, 1);
  tags.word(0, 'STYLE').word(2, 'STANDARD').whole(70, 0).real(40, 0).real(41, 1).real(50, 0);
  tags.whole(71, 0).real(42, 2.5).word(3, 'txt').word(4, '');
  tags.word(0, 'ENDTAB').word(0, 'ENDSEC');
}

function lineType(
  tags: DxfTags,
  name: string,
  description: string,
  pattern: readonly number[],
  length: number,
) {
  tags.word(0, 'LTYPE').word(2, name).whole(70, 0).word(3, description);
  tags.whole(72, SOLID_LINE).whole(73, pattern.length).real(40, length);
  for (const dash of pattern) tags.real(49, dash);
}

function layerRecord(tags: DxfTags, name: string, color: number, lineTypeName: string): void {
  tags.word(0, 'LAYER').word(2, name).whole(70, 0).whole(62, color).word(6, lineTypeName);
}

function writeEntity(tags: DxfTags, entity: DxfEntity): void {
  switch (entity.kind) {
    case 'polyline':
      polyline(tags, entity);
      break;
    case 'line':
      tags.word(0, 'LINE').word(8, entity.layer);
      tags.point(10, entity.from.x, entity.from.y).point(11, entity.to.x, entity.to.y);
      break;
    case 'circle':
      tags.word(0, 'CIRCLE').word(8, entity.layer).point(10, entity.center.x, entity.center.y);
      tags.real(40, entity.radius);
      break;
    case 'text': {
      const { text, x, y, height } = entity.text;
      tags.word(0, 'TEXT').word(8, entity.layer).point(10, x, y).real(40, height).text(1, text);
      tags.word(7, 'STANDARD');
    }
  }
}

function polyline(tags: DxfTags, entity: DxfPolyline): void {
  const { layer, closed } = entity;
  tags.word(0, 'POLYLINE').word(8, layer).whole(66, 1).point(10, 0, 0);
  tags.whole(70, closed ? CLOSED : PATTERN_OVER_VERTICES);
  for (const vertex of dxfVertices(entity)) {
    tags.word(0, 'VERTEX').word(8, layer).vertex(vertex).real(30, 0).bulge(vertex);
  }
  tags.word(0, 'SEQEND').word(8, layer);
}

/** Below the last text, with its height. */
function testLine(tags: DxfTags, entities: readonly DxfEntity[]): void {
  const last = entities.findLast((entity) => entity.kind === 'text');
  if (last === undefined) return;
  const { layer, text } = last;
  const y = text.y - 2 * text.height;
  writeEntity(tags, { kind: 'text', layer, text: { ...text, text: `Test line ${TEST_LINE_MM} mm`, y } });
  const from = { x: text.x, y: y - text.height };
  writeEntity(tags, { kind: 'line', layer, from, to: { ...from, x: from.x + TEST_LINE_MM } });
}
