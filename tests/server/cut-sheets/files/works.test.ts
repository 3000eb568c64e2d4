import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { resolvePlan } from '#server/contracts/sheet-plan.ts';
import { extrudedFoam, wireBench } from '#server/contracts/shop-samples.ts';
import { type SheetOrder } from '#server/cut-sheets/files/make.ts';
import { recently } from '#server/cut-sheets/files/recent.ts';
import { threadedWorks } from '#server/cut-sheets/files/threaded-works.ts';
import { worksInPlace } from '#server/cut-sheets/files/works.ts';
import { Refusal } from '#server/refusal.ts';
import { naca4 } from '../../support/shapes.ts';
import { samplePlan } from '../../support/sheets.ts';

const id = '0190a5b0-1111-7222-8333-444455556666';
const plan = {
  ...resolvePlan(samplePlan({ sectionId: id, machineId: id, materialId: id }), {
    root: naca4(),
    tip: naca4(),
    machine: { name: 'Bench', settings: wireBench },
    material: { name: 'Foam', settings: extrudedFoam },
  }),
  template: {
    wireDiameterMm: 0.4,
    ticks: 20,
    rampFraction: 0.15,
    pinDiameterMm: 3,
    pinStations: [0.25, 0.6] as [number, number],
  },
};
const end = { sectionName: 'Marsh', versionNumber: 1, checksum: 'b'.repeat(64), designation: 'NACA 2412' };
const order: SheetOrder = {
  plan,
  paper: 'A4',
  owner: 'Marsh works',
  identity: {
    sheetName: 'Marsh panel',
    versionNumber: 1,
    status: 'draft',
    checksum: 'a'.repeat(64),
    shortCode: '7K3M-Q9XD',
    address: 'https://marsh.example/cut-sheets/1/versions/1',
    root: end,
    tip: end,
    author: 'builder',
    createdAt: '2026-02-01T09:00:00.000Z',
    releasedBy: null,
    releasedAt: null,
    machineName: 'Bench',
    materialName: 'Foam',
    ribMaterialName: null,
  },
};

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'works-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

/** A thread of another make. */
function script(name: string, text: string): URL {
  const file = join(folder, `${name}.mjs`);
  writeFileSync(file, `import { parentPort } from 'node:worker_threads';\n${text}`);
  return pathToFileURL(file);
}
const ready = "parentPort.postMessage('ready');";

describe('works in a thread', () => {
  it('give the very bytes that work in place gives, while the caller goes on', async () => {
    const works = threadedWorks();
    await works.count(plan);
    let turns = 0;
    const ticking = setInterval(() => (turns += 1), 1);
    const made = await works.make(order);
    clearInterval(ticking);
    expect(turns).toBeGreaterThan(5);
    const inPlace = await worksInPlace.make(order);
    expect(made.files.map(({ name }) => name)).toEqual(inPlace.files.map(({ name }) => name));
    expect(made.files.map(({ name }) => name)).toContain('templates.pdf');
    for (const [i, { name, bytes }] of made.files.entries()) {
      expect(Buffer.compare(bytes, inPlace.files[i]!.bytes), name).toBe(0);
    }
    expect(made.findings).toEqual(inPlace.findings);
    const [one, other] = [await works.archive(made.files), await worksInPlace.archive(inPlace.files)];
    expect(Buffer.compare(one, other)).toBe(0);
    expect(await works.count(plan)).toEqual(await worksInPlace.count(plan));
  });

  it('throw what the work throws, and go on after it', async () => {
    const works = threadedWorks();
    const bad = works.archive([{ downloadName: '../up', bytes: new Uint8Array() }]);
    await expect(bad).rejects.toThrow('Not a plain name');
    expect(await works.count(plan)).toMatchObject({ errors: 0 });
  });

  it('end what takes too long, with a refusal that names the plan, and begin anew', async () => {
    const slow = script('slow', `parentPort.on('message', () => { for (;;) {} });${ready}`);
    const works = threadedWorks({ script: slow, timeLimitMs: 60 });
    for (let i = 0; i < 2; i += 1) {
      const refusal: unknown = await works.count(plan).catch((error: unknown) => error);
      expect(refusal).toBeInstanceOf(Refusal);
      expect((refusal as Refusal).details.errors?.[0]?.path).toBe('plan');
    }
  });

  it('say when the thread dies at work, and begin anew', async () => {
    const count = 'let n = 0;';
    const dying = script('dying', `${count}parentPort.on('message', () => process.exit(1));${ready}`);
    const works = threadedWorks({ script: dying });
    await expect(works.count(plan)).rejects.toThrow('has ended');
    await expect(works.count(plan)).rejects.toThrow('has ended');
    const throwing = script(
      'throwing',
      `parentPort.on('message', () => { throw new Error('no room'); });${ready}`,
    );
    await expect(threadedWorks({ script: throwing }).count(plan)).rejects.toThrow('no room');
  });

  it('are done in place where no thread can be begun', async () => {
    const broken = script('broken', "throw new Error('no thread');");
    expect(await threadedWorks({ script: broken }).count(plan)).toEqual(await worksInPlace.count(plan));
  });

  it('take no more than may wait, and say when to come back', async () => {
    const echo = script(
      'echo',
      `parentPort.on('message', () => parentPort.postMessage({ done: 'yes' }));${ready}`,
    );
    const works = threadedWorks({ script: echo, mostWaiting: 2 });
    const answers = await Promise.allSettled([works.count(plan), works.count(plan), works.count(plan)]);
    expect(answers.map(({ status }) => status)).toEqual(['fulfilled', 'fulfilled', 'rejected']);
    expect((answers[2] as PromiseRejectedResult).reason).toMatchObject({ code: 'unavailable' });
    expect(await works.count(plan)).toBe('yes');
  });
});

describe('what was made recently', () => {
  it('is made once, forgotten in the order of asking, and made again after a failure', async () => {
    const made: string[] = [];
    const keep = recently<string>(2);
    const ask = (key: string) =>
      keep(key, async () => {
        made.push(key);
        return key;
      });
    for (const key of ['a', 'b', 'a', 'c', 'a', 'b']) expect(await ask(key)).toBe(key);
    expect(made).toEqual(['a', 'b', 'c', 'b']);
    await expect(keep('d', () => Promise.reject(new Error('no')))).rejects.toThrow('no');
    expect(await ask('d')).toBe('d');
  });
});
