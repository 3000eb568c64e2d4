import { expect, test } from 'vitest';
import { readDxf } from '#geometry/imports/dxf-entities.ts';
import { dxf, refusalOf } from './files.ts';

test('the entities that can be part of an outline, with layer, line and what says where they lie', () => {
  const { entities, others, unitCode } = readDxf(
    dxf(
      [
        [0, 'LINE', 5, 'A1', 8, 'OUTLINE', 62, 1, 10, 0, 20, 0, 11, 1, 21, 0],
        [0, 'TEXT', 8, 'TEXT', 10, 3, 20, 4, 1, 'words'],
        [0, 'POLYLINE', 8, 'P', 70, 1, 10, 0, 20, 0],
        [0, 'VERTEX', 8, 'V', 10, 5, 20, 6],
        [0, 'VERTEX', 8, 'V', 10, 7, 20, 8],
        [0, 'SEQEND', 8, 'P'],
        [0, 'CIRCLE', 10, 0, 20, 0, 40, 1],
        [0, 'TEXT', 10, 3, 20, 4],
      ],
      ['9', '$ACADVER', '1', 'AC1015', '9', '$INSUNITS', '70', '4'],
    ),
  );
  expect(unitCode).toBe(4);
  expect(entities.map(({ type, layer }) => [type, layer])).toEqual([['LINE', 'OUTLINE'], ['POLYLINE', 'P']]); // prettier-ignore
  expect(entities[0]!.groups.map(({ code }) => code)).toEqual([8, 10, 20, 11, 21]);
  expect(entities[0]!.line).toBe(19);
  expect(entities[1]!.vertices.map((groups) => groups.map(({ value }) => value))).toEqual([['V', '5', '6'], ['V', '7', '8']]); // prettier-ignore
  expect([...others]).toEqual([['TEXT', 2], ['CIRCLE', 1]]); // prettier-ignore
});

test('entities of blocks are not taken, and a unit that is not stated is none', () => {
  const text = '0\nSECTION\n2\nBLOCKS\n0\nLINE\n10\n1\n0\nENDSEC\n0\nSECTION\n2\nENTITIES\n0\nENDSEC\n0\nEOF';
  expect(readDxf(text)).toMatchObject({ entities: [], unitCode: null });
});

test('text without sections is no DXF, and too many values are refused', () => {
  expect(refusalOf(() => readDxf('0\nLINE\n')).code).toBe('wrong-type');
  expect(
    refusalOf(() => readDxf(dxf([[0, 'SPLINE', ...Array.from({ length: 200_002 }, () => 40)]]))).code,
  ).toBe('too-many-points');
});
