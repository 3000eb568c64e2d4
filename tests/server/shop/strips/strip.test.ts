import { createHash } from 'node:crypto';
import DxfParser from 'dxf-parser';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { STRIP_WIDTHS_MM } from '#geometry/cutting/test-strip.ts';
import { balsa, extrudedFoam, handBow, laser, router, wireBench } from '#server/contracts/shop-samples.ts';
import { Refusal } from '#server/refusal.ts';
import { stripFile, type StripName, type StripOrder } from '#server/shop/strips/strip.ts';
import { createItem, machines, materials } from '#server/shop/store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { makeShop } from '../../support/requests.ts';

const order = (
  machine: StripOrder['machine']['settings'],
  material: StripOrder['material']['settings'],
): StripOrder => ({
  machine: { name: 'Long bench', settings: machine },
  material: { name: 'XPS 32, blue', settings: material },
  kerfMm: 0.8,
});

function refusal(name: StripName, asked: StripOrder): Refusal {
  try {
    stripFile(name, asked);
  } catch (error) {
    if (error instanceof Refusal) return error;
    throw error;
  }
  throw new Error('not refused');
}

describe('the foam of a strip', () => {
  it.each([
    [20, '20 x 90'],
    [60, '60 x 90'],
    [89.9, '89.9 x 90'],
    [90, '100 x 90'],
    [120, '100 x 120'],
  ])('%d mm high is cut into all the pieces as %s mm', (blockHeightMm, size) => {
    const { text } = stripFile('strip.nc', order(wireBench, { ...extrudedFoam, blockHeightMm }));
    expect(text).toContain(`, ${size} mm)`);
    expect(text).toContain(`(Pieces: ${STRIP_WIDTHS_MM.join(', ')} mm, from the top)`);
    expect(text.match(/\(Part: Cut \d/g)).toHaveLength(STRIP_WIDTHS_MM.length + 1);
  });
});

describe('the file of a strip', () => {
  it('is a program for a wire machine, with its cautions, the same each time', () => {
    const file = stripFile('strip.nc', order(wireBench, extrudedFoam));
    expect(file.fileName).toBe('test-strip_long-bench_xps-32-blue.nc');
    expect(file.text).toContain('(Caution: hot wire and styrene vapour, cut with ventilation)');
    expect(file.text).toContain('200 mm per min');
    expect(stripFile('strip.nc', order(wireBench, extrudedFoam))).toEqual(file);
  });

  it.each([laser, router])('is a drawing for a $kind, squares of the widths', (machine) => {
    const file = stripFile('strip.dxf', order(machine, balsa));
    const drawing = new DxfParser().parseSync(file.text);
    const closed = (drawing?.entities ?? []).filter(({ layer }) => layer === 'CUT') as unknown as {
      vertices: { x: number }[];
    }[];
    const widthOf = ({ vertices }: (typeof closed)[number]) =>
      Math.max(...vertices.map(({ x }) => x)) - Math.min(...vertices.map(({ x }) => x));
    const widths = closed.map(widthOf).slice(0, -1);
    expect(widths.map((width) => Number(width.toFixed(6)))).toEqual(STRIP_WIDTHS_MM);
  });

  it.each<[string, StripName, StripOrder]>([
    ['a program of a laser', 'strip.nc', order(laser, balsa)],
    ['a drawing for a wire', 'strip.dxf', order(wireBench, extrudedFoam)],
    ['a wire in sheet', 'strip.nc', order(wireBench, balsa)],
    ['a laser in foam', 'strip.dxf', order(laser, extrudedFoam)],
    ['a hand bow', 'strip.nc', order(handBow, extrudedFoam)],
  ])('is not there for %s', (_name, name, asked) => {
    const { code, details } = refusal(name, asked);
    expect(code).toBe('not-found');
    expect(details.detail).toMatch(/no such test strip|no program/);
  });

  it('is refused with its field where it cannot be cut', () => {
    const foam = { ...extrudedFoam, blockHeightMm: 60, blockLengthMm: 80 };
    const little = refusal('strip.nc', order(wireBench, foam));
    expect(little.details.errors?.map(({ path }) => path)).toEqual(['block.heightMm']);
    const short = refusal('strip.nc', order({ ...wireBench, travelXMm: 120 }, extrudedFoam));
    expect(short.code).toBe('invalid');
    expect(short.details.errors?.length).toBeGreaterThan(0);
    const small = refusal('strip.dxf', order({ ...laser, sheetWidthMm: 60 }, balsa));
    expect(small.details.errors?.map(({ path }) => path)).toEqual(['sheet.widthMm']);
  });
});

describe('asking for a strip', () => {
  let api: TestApi;
  let marsh: TestWorkshop;
  let technician: Client;
  beforeAll(async () => {
    api = await startApi();
    marsh = await api.addWorkshop('marsh');
    technician = await api.signIn(marsh, 'technician');
  });
  afterAll(() => api.close());

  it('gives the program with its sum', async () => {
    const params = await makeShop(api, marsh);
    const answer = await technician.call('kerfStripFile', { params: { ...params, name: 'strip.nc' } });
    expect(answer.status).toBe(200);
    expect(answer.text).toContain('(Pieces: 10, 20, 40 mm, from the top)');
    const sum = createHash('sha256').update(answer.text).digest('hex');
    expect(answer.headers.get('x-checksum-sha256')).toBe(sum);
    expect(answer.headers.get('content-disposition')).toMatch(
      /^attachment; filename="?test-strip_marsh-[0-9a-z_-]+\.nc"?$/,
    );
  });

  it('gives none by another name, nor of a pair that is put away', async () => {
    const params = await makeShop(api, marsh);
    const drawing = await technician.call('kerfStripFile', { params: { ...params, name: 'strip.dxf' } });
    const other = await technician.call('kerfStripFile', { params: { ...params, name: 'strip.svg' } });
    expect([drawing.status, other.status]).toEqual([404, 404]);
    const builder = await api.signIn(marsh, 'builder');
    const body = { revision: 1, archived: true };
    await builder.call('changeMaterial', { params, body });
    const away = await technician.call('kerfStripFile', { params: { ...params, name: 'strip.nc' } });
    expect([away.status, away.problem.code]).toEqual([409, 'archived']);
    expect(away.problem.detail).toMatch(/^“Marsh .*” is in the archive; take it back first\.$/);
  });

  it('needs no kerf beforehand', async () => {
    const author = marsh.author('builder');
    const name = 'Marsh without kerf';
    const machine = await createItem(api.knex, author, machines, { name, settings: laser });
    const material = await createItem(api.knex, author, materials, { name, settings: balsa });
    const params = { machineId: machine.id, materialId: material.id, name: 'strip.dxf' };
    const answer = await technician.call('kerfStripFile', { params });
    expect([answer.status, answer.headers.get('content-type')]).toEqual([200, 'image/vnd.dxf']);
  });
});
