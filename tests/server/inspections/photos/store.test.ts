import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MOST_PHOTOS } from '#server/inspections/rules.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { makeInspection, photo } from '../../support/floor.ts';
import { makeSection, makeShop } from '../../support/requests.ts';
import { makeSheet } from '../../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let technician: Client;
let designer: Client;
let cut: { readonly sheetId: string; readonly machineId: string };
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  technician = await api.signIn(marsh, 'technician');
  designer = await api.signIn(marsh, 'designer');
  const parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
  cut = { sheetId: await makeSheet(api, marsh, parts), machineId: parts.machineId };
});
afterAll(() => api.close());

/** An inspection with one photograph. */
const inspected = async () => (await makeInspection(api, marsh, cut)).inspectionId;

describe('a photograph', () => {
  const rows = () => api.knex('photos').orderBy('id');

  it('is stored as it was encoded anew, and shown with its sum', async () => {
    const inspectionId = await inspected();
    const sent = await sharp({ create: { width: 3000, height: 1500, channels: 3, background: 'olive' } })
      .withExif({ IFD0: { Artist: 'Somebody of the shop' } })
      .png()
      .toBuffer();
    const added = await technician.call('addPhoto', { params: { inspectionId }, file: sent });
    expect([added.status, added.reply.width, added.reply.height]).toEqual([201, 2560, 1280]);
    const { reply } = await technician.call('getInspection', { params: { inspectionId } });
    expect(reply.photos).toHaveLength(2);
    expect(reply.photos).toContainEqual(added.reply);
    const shown = await designer.fetch(`/api/photos/${added.reply.id}`);
    const bytes = Buffer.from(await shown.arrayBuffer());
    expect(bytes.length).toBe(added.reply.bytes);
    expect(bytes.includes('Somebody')).toBe(false);
    expect((await sharp(bytes).metadata()).format).toBe('jpeg');
    const { headers } = shown;
    expect(headers.get('content-type')).toBe('image/jpeg');
    expect(headers.get('content-disposition')).toBe('inline');
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('cache-control')).toBe('private, no-cache, no-transform');
    expect(headers.get('etag')).toBe(`"${createHash('sha256').update(bytes).digest('hex')}"`);
    const again = await designer.fetch(`/api/photos/${added.reply.id}`, {
      headers: { 'if-none-match': headers.get('etag') ?? '' },
    });
    expect(again.status).toBe(304);
  });

  it.each<[string, Buffer]>([
    ['HTML', Buffer.from('<!doctype html><script>alert(1)</script>')],
    ['SVG', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>')],
    ['PDF', Buffer.from('%PDF-1.7\n')],
    ['GIF', Buffer.from('GIF89a\x01\0\x01\0', 'latin1')],
    ['half a photograph', photo.subarray(0, photo.length / 2)],
  ])('is refused although it is called one: %s', async (_name, file) => {
    const inspectionId = await inspected();
    const before = await rows();
    const answer = await technician.call('addPhoto', { params: { inspectionId }, file });
    expect([answer.status, answer.problem.errors?.map(({ path }) => path)]).toEqual([422, ['file']]);
    expect(await rows()).toEqual(before);
    expect(api.errors).toEqual([]);
  });

  it('is refused before it is read when it is too large, of no inspection, or of nobody', async () => {
    const inspectionId = await inspected();
    const large = await technician.call('addPhoto', {
      params: { inspectionId },
      file: Buffer.alloc(12_000_001),
    });
    expect([large.status, large.problem.code]).toEqual([413, 'too-large']);
    const params = { inspectionId: '0190a5b0-1111-7222-8333-444455556666' };
    expect((await technician.call('addPhoto', { params, file: photo })).status).toBe(404);
    const json = await technician.call('addPhoto', { params: { inspectionId }, body: {} });
    expect([json.status, json.problem.code]).toEqual([415, 'unsupported-type']);
    const nobody = await api.anonymous().call('addPhoto', { params: { inspectionId }, file: photo });
    expect(nobody.status).toBe(401);
  });

  it('finds room for so many and no more, at the same moment too', async () => {
    const inspectionId = await inspected();
    const params = { inspectionId };
    const answers = await Promise.all(
      Array.from({ length: MOST_PHOTOS + 1 }, () => technician.call('addPhoto', { params, file: photo })),
    );
    const statuses = answers.map(({ status }) => status).sort();
    expect(statuses).toEqual([...Array(MOST_PHOTOS - 1).fill(201), 422, 422]);
    expect(await rows().where({ inspection_id: inspectionId })).toHaveLength(MOST_PHOTOS);
  });

  it('takes no photograph whose sum is not of its bytes', async () => {
    const inspectionId = await inspected();
    const [row] = (await api
      .knex('photos')
      .where({ inspection_id: inspectionId })
      .select(
        'workshop_id',
        'inspection_id',
        'bytes',
        'width',
        'height',
        'person_id',
        'created_at',
      )) as object[];
    const insert = api.knex('photos').insert({ ...row, id: uuid(), checksum: 'a'.repeat(64) });
    await expect(insert).rejects.toThrow('photos_checksum');
  });
});
