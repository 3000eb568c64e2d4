import type { DxfDocument, DxfEntity } from './dxf-document.ts';
import { writeTables, type TableHandles } from './dxf-r2000-tables.ts';
import { type DxfPolyline, DxfTags, dxfVertices } from './dxf-tags.ts';

const MILLIMETRE = 4;
const METRIC = 1;
const CLOSED = 1;
const PATTERN_OVER_VERTICES = 128;

/** The header states the first handle that is still free, so it is written last and put in front. */
export function writeR2000(document: DxfDocument): string {
  const body = new DxfTags();
  const handles = writeTables(body, document);
  writeBlocks(body, handles);
  body.word(0, 'SECTION').word(2, 'ENTITIES');
  for (const entity of document.entities) writeEntity(body, entity, handles.modelSpace);
  body.word(0, 'ENDSEC');
  writeObjects(body, handles);

  const file = new DxfTags();
  for (const line of document.comments) file.text(999, line);
  writeHeader(file, document, body.handle());
  return file.append(body).word(0, 'EOF').toString();
}

function writeHeader(tags: DxfTags, { extents }: DxfDocument, nextHandle: string): void {
  tags.word(0, 'SECTION').word(2, 'HEADER');
  tags.word(9, '$ACADVER').word(1, 'AC1015');
  tags.word(9, '$DWGCODEPAGE').word(3, 'ANSI_1252');
  tags.word(9, '$HANDSEED').word(5, nextHandle);
  tags.word(9, '$INSUNITS').whole(70, MILLIMETRE);
  tags.word(9, '$MEASUREMENT').whole(70, METRIC);
  tags.word(9, '$INSBASE').point(10, 0, 0);
  tags.word(9, '$EXTMIN').point(10, extents.minX, extents.minY);
  tags.word(9, '$EXTMAX').point(10, extents.maxX, extents.maxY);
  tags.word(9, '$LTSCALE').real(40, 1);
  tags.word(0, 'ENDSEC');
  tags.word(0, 'SECTION').word(2, 'CLASSES');
  classRecord(tags, 'ACDBDICTIONARYWDFLT', 'AcDbDictionaryWithDefault');
  classRecord(tags, 'ACDBPLACEHOLDER', 'AcDbPlaceHolder');
  tags.word(0, 'ENDSEC');
}

function classRecord(tags: DxfTags, name: string, className: string): void {
  tags.word(0, 'CLASS').word(1, name).word(2, className).word(3, 'ObjectDBX Classes');
  tags.whole(90, 0).whole(280, 0).whole(281, 0);
}

function writeBlocks(tags: DxfTags, handles: TableHandles): void {
  tags.word(0, 'SECTION').word(2, 'BLOCKS');
  block(tags, '*Model_Space', handles.modelSpace);
  block(tags, '*Paper_Space', handles.paperSpace);
  tags.word(0, 'ENDSEC');
}

function block(tags: DxfTags, name: string, record: string): void {
  beginRecord(tags, 'BLOCK', record, '0').word(100, 'AcDbBlockBegin');
  tags.word(2, name).whole(70, 0).point(10, 0, 0).word(3, name).word(1, '');
  beginRecord(tags, 'ENDBLK', record, '0').word(100, 'AcDbBlockEnd');
}

function beginRecord(tags: DxfTags, type: string, owner: string, layer: string): DxfTags {
  return tags.word(0, type).word(5, tags.handle()).word(330, owner).word(100, 'AcDbEntity').word(8, layer);
}

function writeEntity(tags: DxfTags, entity: DxfEntity, owner: string): void {
  switch (entity.kind) {
    case 'polyline':
      polyline(tags, owner, entity);
      break;
    case 'line':
      beginRecord(tags, 'LINE', owner, entity.layer).word(100, 'AcDbLine');
      tags.point(10, entity.from.x, entity.from.y).point(11, entity.to.x, entity.to.y);
      break;
    case 'circle':
      beginRecord(tags, 'CIRCLE', owner, entity.layer).word(100, 'AcDbCircle');
      tags.point(10, entity.center.x, entity.center.y).real(40, entity.radius);
      break;
    case 'text': {
      const { text, x, y, height } = entity.text;
      beginRecord(tags, 'TEXT', owner, entity.layer).word(100, 'AcDbText');
      tags.point(10, x, y).real(40, height).text(1, text);
      tags.word(7, 'Standard').word(100, 'AcDbText');
    }
  }
}

function polyline(tags: DxfTags, owner: string, entity: DxfPolyline): void {
  const vertices = dxfVertices(entity);
  beginRecord(tags, 'LWPOLYLINE', owner, entity.layer).word(100, 'AcDbPolyline').whole(90, vertices.length);
  tags.whole(70, entity.closed ? CLOSED : PATTERN_OVER_VERTICES).real(43, 0);
  for (const vertex of vertices) tags.vertex(vertex).bulge(vertex);
}

/**
 * The root dictionary with the two entries that readers of this release insist on: groups, and the plot styles, without which
 * layers are refused. All layers use the style `Normal`.
 */
function writeObjects(tags: DxfTags, { plotStyle }: TableHandles): void {
  const root = tags.handle();
  const groups = tags.handle();
  const plotStyles = tags.handle();
  tags.word(0, 'SECTION').word(2, 'OBJECTS');
  dictionary(tags, 'DICTIONARY', root, '0');
  tags.word(3, 'ACAD_GROUP').word(350, groups).word(3, 'ACAD_PLOTSTYLENAME').word(350, plotStyles);
  dictionary(tags, 'DICTIONARY', groups, root);
  dictionary(tags, 'ACDBDICTIONARYWDFLT', plotStyles, root).word(3, 'Normal').word(350, plotStyle);
  tags.word(100, 'AcDbDictionaryWithDefault').word(340, plotStyle);
  tags.word(0, 'ACDBPLACEHOLDER').word(5, plotStyle).word(330, plotStyles);
  tags.word(0, 'ENDSEC');
}

function dictionary(tags: DxfTags, type: string, handle: string, owner: string): DxfTags {
  return tags.word(0, type).word(5, handle).word(330, owner).word(100, 'AcDbDictionary').whole(281, 1);
}
