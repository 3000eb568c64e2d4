import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { makeSamples, type Samples } from '../support/requests.ts';
import { cheapWorks, samplePlan } from '../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let builder: Client;
let designer: Client;
let samples: Samples;
let params: { sheetId: string };
beforeAll(async () => {
  api = await startApi({ works: cheapWorks });
  marsh = await api.addWorkshop('marsh');
  builder = await api.signIn(marsh, 'builder');
  designer = await api.signIn(marsh, 'designer');
  samples = await makeSamples(api, marsh);
  params = { sheetId: samples.sheetId };
});
afterAll(() => api.close());

describe('an unsaved plan', () => {
  it('is kept as it stands in the form, wrong values too, for its person alone', async () => {
    const values = { spanMm: 'about 600', features: [{ widthMm: '' }], panel: { root: null }, deep: [[1]] };
    const kept = await builder.call('keepSheetDraft', { params, body: { basedOn: 2, values } });
    expect(kept.status).toBe(200);
    const found = await builder.call('getSheetDraft', { params });
    expect(found.reply).toMatchObject({ basedOn: 2, values });
    expect(Date.parse(found.reply.updatedAt)).toBeGreaterThan(Date.now() - 60_000);
    expect((await designer.call('getSheetDraft', { params })).reply.values).toEqual({ quantity: 'six' });
  });

  it('is refused when it stands on a version that is not there, or is no record', async () => {
    for (const [body, path] of [
      [{ basedOn: 3, values: {} }, 'basedOn'],
      [{ basedOn: 2, values: 'text' }, 'values'],
      [{ basedOn: 2 }, 'values'],
    ] as const) {
      const answer = await builder.call('keepSheetDraft', { params, body });
      expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
    }
  });

  it('goes when the same is saved, and stays when it holds more', async () => {
    const plan = { ...samplePlan(samples), quantity: 10 };
    const keep = (client: Client, values: unknown) =>
      client.call('keepSheetDraft', { params, body: { basedOn: 2, values } });
    await keep(builder, plan);
    await keep(designer, plan);
    await builder.call('saveSheetVersion', { params, body: { basedOn: 2, plan } });
    expect((await builder.call('getSheetDraft', { params })).status).toBe(404);
    expect((await designer.call('getSheetDraft', { params })).status).toBe(200);
    await keep(designer, { ...plan, quantity: '12' });
    await designer.call('saveSheetVersion', { params, body: { basedOn: 3, plan, note: 'again' } });
    expect((await designer.call('getSheetDraft', { params })).status).toBe(200);
  });

  it('can be discarded, twice as well as once', async () => {
    for (let i = 0; i < 2; i += 1) {
      expect((await designer.call('dropSheetDraft', { params })).status).toBe(204);
      expect((await designer.call('getSheetDraft', { params })).status).toBe(404);
    }
  });
});
