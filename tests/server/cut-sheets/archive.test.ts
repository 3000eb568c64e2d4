import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Entry, fromBuffer } from 'yauzl';
import { type ArchivedFile, MANIFEST_NAME, manifestOf, zipOf } from '#server/cut-sheets/files/archive.ts';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const FILES: readonly ArchivedFile[] = [
  { name: 'root.dxf', bytes: bytesOf('  0\r\nEOF\r\n'.repeat(500)) },
  { name: 'core.nc', bytes: bytesOf('G21 G90\nG93\n') },
  { name: 'templates.pdf', bytes: Uint8Array.from({ length: 70_000 }, (_, i) => (i * 7919) % 256) },
  { name: 'empty.dat', bytes: new Uint8Array(0) },
];

interface ReadEntry {
  readonly name: string;
  readonly date: number;
  readonly time: number;
  readonly method: number;
  readonly bytes: Uint8Array;
}

/** All entries in the order of the central directory; the reader checks sizes and, as told, the CRC. */
function unzip(zip: Uint8Array): Promise<ReadEntry[]> {
  return new Promise((resolve, reject) => {
    fromBuffer(Buffer.from(zip), { lazyEntries: true, strictFileNames: true }, (failed, archive) => {
      if (failed) return reject(failed);
      const read: ReadEntry[] = [];
      archive.on('entry', (entry: Entry) => {
        archive.openReadStream(entry, (refused, stream) => {
          if (refused) return reject(refused);
          const chunks: Buffer[] = [];
          stream.on('data', (chunk: Buffer) => chunks.push(chunk));
          stream.on('error', reject);
          stream.on('end', () => {
            const bytes = new Uint8Array(Buffer.concat(chunks));
            const { lastModFileDate: date, lastModFileTime: time, compressionMethod: method } = entry;
            read.push({ name: entry.fileName, date, time, method, bytes });
            archive.readEntry();
          });
        });
      });
      archive.on('error', reject);
      archive.on('end', () => resolve(read));
      archive.readEntry();
    });
  });
}

test('an independent reader finds every file with its bytes, ordered by name, compressed, at one time', async () => {
  const entries = await unzip(zipOf(FILES));
  expect(entries.map(({ name }) => name)).toEqual(['core.nc', 'empty.dat', 'root.dxf', 'templates.pdf']);
  for (const { name, bytes, date, time, method } of entries) {
    expect(bytes, name).toEqual(FILES.find((file) => file.name === name)?.bytes);
    // 1 January 1980, 00:00: year 0, month 1, day 1 (the DOS date that zip files carry).
    expect([date, time, method]).toEqual([(0 << 9) | (1 << 5) | 1, 0, 8]);
  }
  expect(zipOf(FILES).length).toBeLessThan(FILES.reduce((sum, { bytes }) => sum + bytes.length, 0));
});

test('the same files give the same bytes in whatever order they come', () => {
  const reference = Buffer.from(zipOf(FILES));
  const manifest = manifestOf(FILES);
  fc.assert(
    fc.property(fc.shuffledSubarray([...FILES], { minLength: FILES.length }), (files) => {
      expect(Buffer.from(zipOf(files)).equals(reference)).toBe(true);
      expect(manifestOf(files)).toBe(manifest);
    }),
    { numRuns: 8 },
  );
});

test('nothing of the zone stands in the bytes', () => {
  const zone = process.env['TZ'];
  const inZone = (name: string) => {
    process.env['TZ'] = name;
    return Buffer.from(zipOf(FILES));
  };
  try {
    expect(inZone('Pacific/Auckland').equals(inZone('America/Los_Angeles'))).toBe(true);
  } finally {
    if (zone === undefined) delete process.env['TZ'];
    else process.env['TZ'] = zone;
  }
});

test('the manifest names the SHA-256 of every file as sha256sum writes it', async () => {
  const manifest = manifestOf(FILES);
  const digestOf = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
  expect(manifest).toMatch(/^(?:[0-9a-f]{64} {2}[a-z.]+\n){4}$/);
  // The digest of no bytes at all, from memory.
  expect(manifest).toContain('e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855  empty.dat\n');
  const entries = await unzip(zipOf([...FILES, { name: MANIFEST_NAME, bytes: bytesOf(manifest) }]));
  const read = entries.find(({ name }) => name === MANIFEST_NAME);
  const lines = new TextDecoder().decode(read?.bytes).trimEnd().split('\n');
  const digests = new Map(lines.map((line) => [line.slice(66), line.slice(0, 64)]));
  const others = entries.filter(({ name }) => name !== MANIFEST_NAME);
  expect([...digests.keys()]).toEqual(others.map(({ name }) => name));
  for (const { name, bytes } of others) expect(digests.get(name), name).toBe(digestOf(bytes));
});

test.each(['../root.dxf', 'a/b.dxf', 'a\\b.dxf', '', '.hidden', 'two\nlines.dxf', 'root dxf'])(
  'a name that is not plain is refused: %j',
  (name) => {
    const files = [{ name, bytes: bytesOf('x') }];
    expect(() => zipOf(files)).toThrow(RangeError);
    expect(() => manifestOf(files)).toThrow(RangeError);
  },
);

test('two files of one name are refused, none is lost in silence', () => {
  const twice = [...FILES, { name: 'root.dxf', bytes: bytesOf('other') }];
  expect(() => zipOf(twice)).toThrow('the same name: root.dxf');
  expect(() => manifestOf(twice)).toThrow('the same name: root.dxf');
});
