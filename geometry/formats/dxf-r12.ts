import type { Chain, Drawing, DrawingText } from './drawing.ts';
import { CENTER, LAYER_STYLES } from './dxf-layers.ts';
import { DxfTags, dxfVertices } from './dxf-tags.ts';
import type { Layer } from './options.ts';

const CLOSED = 1;
const PATTERN_OVER_VERTICES = 128;
const SOLID_LINE = 65;
/** R12 states no unit in its data, so the drawing carries a line of known length. */
const TEST_LINE_MM = 100;

export function writeR12(drawing: Drawing): string {
  const tags = new DxfTags();
  for (const line of drawing.header) tags.text(999, line);
  tags.word(999, 'All lengths in millimetres');
  header(tags, drawing);
  tables(tags, drawing.layers);
  tags.word(0, 'SECTION').word(2, 'BLOCKS').word(0, 'ENDSEC');
  tags.word(0, 'SECTION').word(2, 'ENTITIES');
  if (drawing.layers.includes('OUTLINE')) polyline(tags, 'OUTLINE', drawing.outline, true);
  if (drawing.layers.includes('CHORD')) {
    const [nose, edge] = drawing.chordLine;
    line(tags, 'CHORD', nose.x, nose.y, edge.x, edge.y);
  }
  if (drawing.layers.includes('CAMBER')) polyline(tags, 'CAMBER', drawing.camberLine, false);
  if (drawing.layers.includes('TEXT')) texts(tags, drawing.texts);
  return tags.word(0, 'ENDSEC').word(0, 'EOF').toString();
}

function header(tags: DxfTags, { extents }: Drawing): void {
  tags.word(0, 'SECTION').word(2, 'HEADER');
  tags.word(9, '$ACADVER').word(1, 'AC1009');
  tags.word(9, '$INSBASE').point(10, 0, 0);
  tags.word(9, '$EXTMIN').point(10, extents.minX, extents.minY);
  tags.word(9, '$EXTMAX').point(10, extents.maxX, extents.maxY);
  tags.word(9, '$LTSCALE').real(40, 1);
  tags.word(0, 'ENDSEC');
}

function tables(tags: DxfTags, layers: readonly Layer[]): void {
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
  for (const layer of layers) {
    const style = LAYER_STYLES[layer];
    layerRecord(tags, layer, style.color, style.centerLine ? CENTER.name : 'CONTINUOUS');
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

function polyline(tags: DxfTags, layer: Layer, chain: Chain, closed: boolean): void {
  tags.word(0, 'POLYLINE').word(8, layer).whole(66, 1).point(10, 0, 0);
  tags.whole(70, closed ? CLOSED : PATTERN_OVER_VERTICES);
  for (const vertex of dxfVertices(chain, closed)) {
    tags.word(0, 'VERTEX').word(8, layer).vertex(vertex).real(30, 0).bulge(vertex);
  }
  tags.word(0, 'SEQEND').word(8, layer);
}

function line(tags: DxfTags, layer: Layer, x1: number, y1: number, x2: number, y2: number): void {
  tags.word(0, 'LINE').word(8, layer).point(10, x1, y1).point(11, x2, y2);
}

function text(tags: DxfTags, { text: words, x, y, height }: DrawingText): void {
  tags.word(0, 'TEXT').word(8, 'TEXT').point(10, x, y).real(40, height).text(1, words).word(7, 'STANDARD');
}

function texts(tags: DxfTags, lines: readonly DrawingText[]): void {
  for (const words of lines) text(tags, words);
  const last = lines.at(-1);
  if (last === undefined) return;
  const y = last.y - 2 * last.height;
  text(tags, { ...last, text: `Test line ${TEST_LINE_MM} mm`, y });
  line(tags, 'TEXT', last.x, y - last.height, last.x + TEST_LINE_MM, y - last.height);
}
