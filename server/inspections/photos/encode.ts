import { createHash } from 'node:crypto';
import sharp, { type SharpOptions } from 'sharp';
import { type Refusal, refuseField } from '#server/refusal.ts';
import { photoTypeOf } from './type.ts';

/** A photograph encoded anew: nothing of the file that came in is left but what it shows. */
export interface EncodedPhoto {
  readonly bytes: Buffer;
  readonly width: number;
  readonly height: number;
  /** SHA-256 of the bytes, in hexadecimal. */
  readonly checksum: string;
}

/** Before anything is decoded the header must not announce more: a small file can unpack to gigabytes. */
export const MOST_PIXELS = 40_000_000;
export const LONGEST_SIDE_PX = 2560;
const QUALITY = 82;
const LONGEST_SECONDS = 20;

const options: SharpOptions = { limitInputPixels: MOST_PIXELS, failOn: 'error', pages: 1 };

function refused(message: string): Refusal {
  return refuseField('file', message);
}

/** @throws Refusal naming `file` when the header cannot be read, is of another type than the first bytes, or announces too much */
async function checkHeader(bytes: Buffer, type: string): Promise<void> {
  const header = await sharp(bytes, { ...options, limitInputPixels: false })
    .metadata()
    .catch(() => {
      throw refused('The photograph is damaged.');
    });
  if (header.format !== type) throw refused('The photograph is damaged.');
  if (header.width * header.height > MOST_PIXELS) {
    throw refused(`A photograph may have at most ${MOST_PIXELS / 1e6} million pixels.`);
  }
}

let last: Promise<unknown> = Promise.resolve();

/** One photograph after the other: a large one takes some hundred megabytes while it is unpacked. */
function inTurn<Result>(work: () => Promise<Result>): Promise<Result> {
  const turn = last.then(work);
  last = turn.catch(() => undefined);
  return turn;
}

/**
 * Encodes a photograph as a JPEG of at most {@link LONGEST_SIDE_PX} on its long side: turned as its orientation says, in sRGB, on
 * white where it was transparent, and without position, time, names or any other metadata. What it is decides its content alone.
 *
 * @throws Refusal naming `file` for any other type, too many pixels, and for a file that is damaged or broken off
 */
export async function encodePhoto(bytes: Buffer): Promise<EncodedPhoto> {
  const type = photoTypeOf(bytes);
  if (type === null) throw refused('A photograph is a JPEG, PNG or WebP file.');
  await checkHeader(bytes, type);
  const { data, info } = await inTurn(() => encoded(bytes));
  return {
    bytes: data,
    width: info.width,
    height: info.height,
    checksum: createHash('sha256').update(data).digest('hex'),
  };
}

function encoded(bytes: Buffer) {
  return sharp(bytes, options)
    .timeout({ seconds: LONGEST_SECONDS })
    .autoOrient()
    .resize({ width: LONGEST_SIDE_PX, height: LONGEST_SIDE_PX, fit: 'inside', withoutEnlargement: true })
    .flatten({ background: 'white' })
    .jpeg({ quality: QUALITY })
    .toBuffer({ resolveWithObject: true })
    .catch(() => {
      throw refused('The photograph is damaged or broken off.');
    });
}
