import type { DxfDocument } from './dxf-document.ts';
import { CENTER } from './dxf-layers.ts';
import type { DxfTags } from './dxf-tags.ts';

/** Handles that other sections refer to: the block records, which own the entities, and the plot style that every layer names. */
export interface TableHandles {
  readonly modelSpace: string;
  readonly paperSpace: string;
  readonly plotStyle: string;
}

const SOLID_LINE = 65;
const DEFAULT_LINE_WEIGHT = -3;

/** The nine symbol tables of an AC1015 file, in the order of the DXF reference, each with the records that are referred to. */
export function writeTables(tags: DxfTags, document: DxfDocument): TableHandles {
  tags.word(0, 'SECTION').word(2, 'TABLES');
  const plotStyle = tags.handle();
  table(tags, 'VPORT', 1, (owner) => viewport(tags, owner, document));
  table(tags, 'LTYPE', 4, (owner) => lineTypes(tags, owner));
  table(tags, 'LAYER', document.layers.length + 1, (owner) => layers(tags, owner, plotStyle, document));
  table(tags, 'STYLE', 1, (owner) => {
    record(tags, 'STYLE', owner, 'AcDbTextStyleTableRecord', 'Standard').real(40, 0).real(41, 1).real(50, 0);
    tags.whole(71, 0).real(42, 2.5).word(3, 'txt').word(4, '');
  });
  table(tags, 'VIEW', 0);
  table(tags, 'UCS', 0);
  table(tags, 'APPID', 1, (owner) => record(tags, 'APPID', owner, 'AcDbRegAppTableRecord', 'ACAD'));
  dimensionStyles(tags);
  let modelSpace = '';
  let paperSpace = '';
  table(tags, 'BLOCK_RECORD', 2, (owner) => {
    modelSpace = blockRecord(tags, owner, '*Model_Space');
    paperSpace = blockRecord(tags, owner, '*Paper_Space');
  });
  tags.word(0, 'ENDSEC');
  return { modelSpace, paperSpace, plotStyle };
}

function table(tags: DxfTags, name: string, count: number, records?: (owner: string) => unknown): void {
  const handle = tags.handle();
  tags
    .word(0, 'TABLE')
    .word(2, name)
    .word(5, handle)
    .word(330, '0')
    .word(100, 'AcDbSymbolTable')
    .whole(70, count);
  records?.(handle);
  tags.word(0, 'ENDTAB');
}

function record(tags: DxfTags, type: string, owner: string, subclass: string, name: string): DxfTags {
  tags.word(0, type).word(5, tags.handle()).word(330, owner).word(100, 'AcDbSymbolTableRecord');
  return tags.word(100, subclass).word(2, name).whole(70, 0);
}

/** The view in which the drawing opens: the whole outline with some room about it. */
function viewport(tags: DxfTags, owner: string, { extents }: DxfDocument): void {
  const width = extents.maxX - extents.minX;
  record(tags, 'VPORT', owner, 'AcDbViewportTableRecord', '*Active');
  tags.point(10, 0, 0, true).point(11, 1, 1, true);
  tags.point(12, (extents.minX + extents.maxX) / 2, (extents.minY + extents.maxY) / 2, true);
  tags.point(13, 0, 0, true).point(14, 10, 10, true).point(15, 10, 10, true);
  tags.real(16, 0).real(26, 0).real(36, 1).point(17, 0, 0);
  tags
    .real(40, width * 0.75)
    .real(41, 1.5)
    .real(42, 50)
    .real(43, 0)
    .real(44, 0)
    .real(50, 0)
    .real(51, 0);
  tags
    .whole(71, 0)
    .whole(72, 1000)
    .whole(73, 1)
    .whole(74, 3)
    .whole(75, 0)
    .whole(76, 0)
    .whole(77, 0)
    .whole(78, 0);
}

function lineTypes(tags: DxfTags, owner: string): void {
  for (const name of ['ByBlock', 'ByLayer', 'Continuous']) lineType(tags, owner, name, '', [], 0);
  lineType(tags, owner, CENTER.name, CENTER.description, CENTER.pattern, CENTER.length);
}

function lineType(
  tags: DxfTags,
  owner: string,
  name: string,
  description: string,
  pattern: readonly number[],
  length: number,
): void {
  record(tags, 'LTYPE', owner, 'AcDbLinetypeTableRecord', name).word(3, description);
  tags.whole(72, SOLID_LINE).whole(73, pattern.length).real(40, length);
  for (const dash of pattern) tags.real(49, dash).whole(74, 0);
}

function layers(tags: DxfTags, owner: string, plotStyle: string, document: DxfDocument): void {
  const layer = (name: string, color: number, lineTypeName: string, lineWeight: number) =>
    record(tags, 'LAYER', owner, 'AcDbLayerTableRecord', name)
      .whole(62, color)
      .word(6, lineTypeName)
      .whole(370, lineWeight)
      .word(390, plotStyle);
  layer('0', 7, 'Continuous', DEFAULT_LINE_WEIGHT);
  for (const { name, color, centerLine, lineWeight } of document.layers) {
    layer(name, color, centerLine ? CENTER.name : 'Continuous', lineWeight);
  }
}

/** Its records carry their handle under 105, and the table a second subclass: the one table that differs. */
function dimensionStyles(tags: DxfTags): void {
  const handle = tags.handle();
  tags
    .word(0, 'TABLE')
    .word(2, 'DIMSTYLE')
    .word(5, handle)
    .word(330, '0')
    .word(100, 'AcDbSymbolTable')
    .whole(70, 1);
  tags.word(100, 'AcDbDimStyleTable');
  tags.word(0, 'DIMSTYLE').word(105, tags.handle()).word(330, handle).word(100, 'AcDbSymbolTableRecord');
  tags.word(100, 'AcDbDimStyleTableRecord').word(2, 'Standard').whole(70, 0);
  tags.word(0, 'ENDTAB');
}

function blockRecord(tags: DxfTags, owner: string, name: string): string {
  const handle = tags.handle();
  tags.word(0, 'BLOCK_RECORD').word(5, handle).word(330, owner).word(100, 'AcDbSymbolTableRecord');
  tags.word(100, 'AcDbBlockTableRecord').word(2, name);
  return handle;
}
