import { createHash } from 'node:crypto';
import { crc32, deflateSync } from 'node:zlib';
import sharp, { type Sharp } from 'sharp';
import { describe, expect, it } from 'vitest';
import { encodePhoto, LONGEST_SIDE_PX, MOST_PIXELS } from '#server/inspections/photos/encode.ts';
import { Refusal } from '#server/refusal.ts';

const red = { r: 200, g: 30, b: 30 };
const blue = { r: 20, g: 40, b: 200 };

/** Red on its left half, blue on its right. */
function picture(width: number, height: number): Sharp {
  const left = { create: { width: width / 2, height, channels: 3 as const, background: red } };
  return sharp({ create: { width, height, channels: 3, background: blue } }).composite([
    { input: left, left: 0, top: 0 },
  ]);
}

async function colourAt(bytes: Buffer, left: number, top: number): Promise<number[]> {
  const pixel = sharp(bytes).extract({ left, top, width: 1, height: 1 }).removeAlpha().raw();
  return [...(await pixel.toBuffer())];
}
const isNear = (found: number[], { r, g, b }: typeof red) =>
  [r, g, b].every((value, i) => Math.abs(value - (found[i] ?? NaN)) <= 6);

async function refusalOf(bytes: Buffer): Promise<string> {
  const error: unknown = await encodePhoto(bytes).catch((e: unknown) => e);
  if (!(error instanceof Refusal)) throw new Error('not refused');
  expect(error.code).toBe('invalid');
  expect(error.details.errors?.map(({ path }) => path)).toEqual(['file']);
  return error.details.errors?.[0]?.message ?? '';
}

/** A PNG of one colour, as large as its header says, from a few hundred bytes for each megapixel. */
function png(width: number, height: number, rows = height): Buffer {
  const chunk = (type: string, data: Buffer) => {
    const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
    const out = Buffer.alloc(body.length + 8);
    out.writeUInt32BE(data.length);
    body.copy(out, 4);
    out.writeUInt32BE(crc32(body), body.length + 4);
    return out;
  };
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width);
  header.writeUInt32BE(height, 4);
  header[8] = 8;
  const data = deflateSync(Buffer.alloc(rows * (width + 1)));
  const parts = [chunk('IHDR', header), chunk('IDAT', data), chunk('IEND', Buffer.alloc(0))];
  return Buffer.concat([Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'), ...parts]);
}

describe('a photograph', () => {
  it.each(['jpeg', 'png', 'webp'] as const)('as %s comes out as a JPEG with its sum', async (format) => {
    const photo = await encodePhoto(await picture(64, 48).toFormat(format).toBuffer());
    const { format: made, width, height } = await sharp(photo.bytes).metadata();
    expect([made, width, height]).toEqual(['jpeg', 64, 48]);
    expect([photo.width, photo.height]).toEqual([64, 48]);
    expect(photo.checksum).toBe(createHash('sha256').update(photo.bytes).digest('hex'));
    expect(isNear(await colourAt(photo.bytes, 8, 24), red)).toBe(true);
    expect(isNear(await colourAt(photo.bytes, 56, 24), blue)).toBe(true);
  });

  it('loses position, time, names, comments and colour profile', async () => {
    const sent = await picture(64, 48)
      .withExif({
        IFD0: { Artist: 'Somebody of the shop', Make: 'A telephone' },
        IFD2: { DateTimeOriginal: '2026:11:30 10:11:12' },
        IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '52/1 34/1 12/1', GPSLongitudeRef: 'E' },
      })
      .withXmp('<x:xmpmeta xmlns:x="adobe:ns:meta/"><place>The yard</place></x:xmpmeta>')
      .withIccProfile('p3')
      .jpeg()
      .toBuffer();
    const before = await sharp(sent).metadata();
    expect([before.exif, before.icc, before.xmp].every((part) => part !== undefined)).toBe(true);
    expect(sent.includes('Somebody of the shop')).toBe(true);
    // JPEG comment and something behind the end of the picture.
    const comment = Buffer.from('\xff\xfe\x00\x10a comment here', 'latin1');
    const dressed = Buffer.concat([
      sent.subarray(0, 2),
      comment,
      sent.subarray(2),
      Buffer.from('behind the end'),
    ]);
    const { bytes } = await encodePhoto(dressed);
    const after = await sharp(bytes).metadata();
    expect([after.exif, after.icc, after.xmp, after.iptc, after.comments]).toEqual(Array(5).fill(undefined));
    for (const text of ['Somebody', 'telephone', '2026:11:30', 'Exif', 'yard', 'comment', 'behind']) {
      expect(bytes.includes(text), text).toBe(false);
    }
  });

  it('is turned as its orientation says', async () => {
    // 6: the camera's left is the top of the picture (Exif 2.32, tag 0x0112: row 0 is the right-hand side).
    const sent = await picture(60, 20).withMetadata({ orientation: 6 }).jpeg().toBuffer();
    const { bytes, width, height } = await encodePhoto(sent);
    expect([width, height]).toEqual([20, 60]);
    expect(isNear(await colourAt(bytes, 10, 4), red)).toBe(true);
    expect(isNear(await colourAt(bytes, 10, 56), blue)).toBe(true);
    expect((await sharp(bytes).metadata()).orientation).toBeUndefined();
  });

  it('is made smaller on its long side, never larger', async () => {
    const wide = await encodePhoto(await picture(4000, 1000).jpeg().toBuffer());
    expect([wide.width, wide.height]).toEqual([LONGEST_SIDE_PX, LONGEST_SIDE_PX / 4]);
    const tall = await encodePhoto(await picture(1000, 3000).webp().toBuffer());
    expect([tall.width, tall.height]).toEqual([853, LONGEST_SIDE_PX]);
    const small = await encodePhoto(await picture(2, 2).png().toBuffer());
    expect([small.width, small.height]).toEqual([2, 2]);
  });

  it('stands on white where it is transparent', async () => {
    const clear = { r: 0, g: 0, b: 0, alpha: 0 };
    const sent = sharp({ create: { width: 16, height: 16, channels: 4, background: clear } });
    const { bytes } = await encodePhoto(await sent.png().toBuffer());
    expect(await colourAt(bytes, 8, 8)).toEqual([255, 255, 255]);
  });
});

describe('what is no photograph', () => {
  it.each([
    ['HTML', '<!doctype html><script>alert(1)</script>'],
    ['SVG', '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>'],
    ['SVG behind a declaration', '<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg"/>'],
    ['PDF', '%PDF-1.7\n1 0 obj<<>>endobj'],
    ['GIF', 'GIF89a\x01\0\x01\0\x80\0\0\0\0\0\xff\xff\xff,\0\0\0\0\x01\0\x01\0\0\x02\x02D\x01\0;'],
    ['nothing', ''],
  ])('is refused by its content: %s', async (_name, content) => {
    expect(await refusalOf(Buffer.from(content, 'latin1'))).toBe('A photograph is a JPEG, PNG or WebP file.');
  });

  it('is refused when only the first bytes are right', async () => {
    for (const start of ['\xff\xd8\xff\xe0', '\x89PNG\r\n\x1a\n', 'RIFF\x40\0\0\0WEBPVP8 ']) {
      const bytes = Buffer.from(`${start}<script>alert(1)</script>${'x'.repeat(200)}`, 'latin1');
      expect(await refusalOf(bytes)).toBe('The photograph is damaged.');
    }
  });

  it.each(['jpeg', 'png', 'webp'] as const)('is refused when it breaks off: %s', async (format) => {
    const noise = { noise: { type: 'gaussian' as const, mean: 128, sigma: 60 } };
    const grain = sharp({ create: { width: 640, height: 480, channels: 3, background: red, ...noise } });
    const whole = await grain.toFormat(format).toBuffer();
    for (const share of [0.3, 0.6, 0.9]) {
      expect(await refusalOf(whole.subarray(0, Math.floor(whole.length * share)))).toMatch(/damaged/);
    }
  });

  it('is refused before it is unpacked when it has too many pixels', async () => {
    const side = Math.ceil(Math.sqrt(MOST_PIXELS)) + 1;
    const bomb = png(side, side);
    expect(bomb.length).toBeLessThan(100_000);
    expect(await refusalOf(bomb)).toBe('A photograph may have at most 40 million pixels.');
    // A header that announces far more than the file holds, and sides beyond what a picture can have.
    for (const [width, height] of [
      [60_000, 60_000],
      [0x7fffffff, 1],
    ] as const) {
      expect(await refusalOf(png(width, height, 0))).not.toBe('');
    }
  });

  it('is taken up to that limit', async () => {
    const photo = await encodePhoto(png(8000, 5000));
    expect([photo.width, photo.height]).toEqual([2560, 1600]);
  });
});
